import type Stripe from "stripe";
import { z } from "zod";
import { idOf } from "./checkout.ts";
import { callStripe } from "./errors.ts";

export interface RefundRequest {
  paymentIntentId: string;
  amountCents: number;
  reason: "requested_by_customer" | "duplicate" | "fraudulent";
  idempotencyKey: string;
  /** Comes back with the refund's webhooks. */
  metadata: Record<string, string>;
}

const refundStatus = z.enum(["pending", "requires_action", "succeeded", "failed", "canceled"]);

export interface RefundAnswer {
  refundId: string;
  status: z.infer<typeof refundStatus>;
}

/** A refund as a webhook tells of it. */
export interface ChangedRefund extends RefundAnswer {
  amountCents: number;
  currency: string;
  paymentIntentId: string | null;
  failureReason: string | null;
  metadata: Record<string, string>;
}

/**
 * Returns money of one payment, all or part of it.
 * @throws GatewayUnavailable; GatewayRefused (code `charge_already_refunded` when nothing is left to return)
 */
export async function refund(stripe: Stripe, request: RefundRequest): Promise<RefundAnswer> {
  const made = await callStripe(() =>
    stripe.refunds.create(
      {
        payment_intent: request.paymentIntentId,
        amount: request.amountCents,
        reason: request.reason,
        metadata: request.metadata,
      },
      { idempotencyKey: request.idempotencyKey },
    ),
  );
  return { refundId: made.id, status: refundStatus.parse(made.status) };
}

/** Our shape of Stripe's refund. */
export function asChangedRefund(changed: Stripe.Refund): ChangedRefund {
  return {
    refundId: changed.id,
    status: refundStatus.parse(changed.status),
    amountCents: changed.amount,
    currency: changed.currency,
    paymentIntentId: idOf(changed.payment_intent),
    failureReason: changed.failure_reason ?? null,
    metadata: changed.metadata ?? {},
  };
}
