import type Stripe from "stripe";
import { z } from "zod";
import { callStripe, GatewayRefused } from "./errors.ts";

export interface CheckoutRequest {
  orderNumber: string;
  orderId: string;
  paymentId: string;
  email: string;
  /** `amountCents` is the price of one; the line's total is amountCents x quantity. */
  lines: { name: string; description?: string | undefined; amountCents: number; quantity: number }[];
  currency: string;
  /** May hold `{CHECKOUT_SESSION_ID}`, which Stripe fills in. */
  successUrl: string;
  cancelUrl: string;
  /** From 30 minutes to 24 hours ahead, counted when Stripe gets it: leave a minute to spare at either end. */
  expiresAt: Date;
  idempotencyKey: string;
}

export interface OpenedCheckoutSession {
  sessionId: string;
  url: string;
  expiresAt: Date;
}

const sessionStatus = z.enum(["open", "complete", "expired"]);
const paymentStatus = z.enum(["paid", "unpaid", "no_payment_required"]);

export interface CheckoutSession {
  id: string;
  status: z.infer<typeof sessionStatus>;
  paymentStatus: z.infer<typeof paymentStatus>;
  /** The total that the customer pays, in cents. */
  amountCents: number;
  /** Lower case, as Stripe writes it: "usd". */
  currency: string;
  orderId: string | null;
  paymentId: string | null;
  paymentIntentId: string | null;
  /** Where to pay; null once it is paid or expired. */
  url: string | null;
}

export type CheckoutExpiry = "expired" | "already-complete" | "already-expired";

/** What our own metadata is called at Stripe, on the session and on its payment. */
export const metadataNames = { orderId: "order_id", orderNumber: "order_number", paymentId: "payment_id" };

/**
 * Opens a hosted payment page for one order. The same key gives the same session.
 * @throws GatewayUnavailable, GatewayRefused
 */
export async function openCheckoutSession(
  stripe: Stripe,
  request: CheckoutRequest,
): Promise<OpenedCheckoutSession> {
  const metadata = {
    [metadataNames.orderId]: request.orderId,
    [metadataNames.orderNumber]: request.orderNumber,
    [metadataNames.paymentId]: request.paymentId,
  };
  const session = await callStripe(() =>
    stripe.checkout.sessions.create(
      {
        mode: "payment",
        // Cards alone: their result is known at once.
        allowed_payment_method_types: ["card"],
        client_reference_id: request.orderId,
        customer_email: request.email,
        line_items: request.lines.map((line) => ({
          quantity: line.quantity,
          price_data: {
            currency: request.currency,
            unit_amount: line.amountCents,
            product_data: {
              name: line.name,
              ...(line.description ? { description: line.description } : {}),
            },
          },
        })),
        metadata,
        payment_intent_data: { metadata, description: `Order ${request.orderNumber}` },
        success_url: request.successUrl,
        cancel_url: request.cancelUrl,
        expires_at: Math.floor(request.expiresAt.getTime() / 1000),
      },
      { idempotencyKey: request.idempotencyKey },
    ),
  );
  if (session.url === null) throw new Error(`checkout session ${session.id} came back without an address`);
  return { sessionId: session.id, url: session.url, expiresAt: new Date(session.expires_at * 1000) };
}

/**
 * Reads a session as it stands now.
 * @throws GatewayUnavailable, GatewayRefused (code `resource_missing` for an unknown id)
 */
export async function readCheckoutSession(stripe: Stripe, sessionId: string): Promise<CheckoutSession> {
  return asCheckoutSession(await callStripe(() => stripe.checkout.sessions.retrieve(sessionId)));
}

/**
 * Closes a session so that it can no longer be paid; says so when it was paid or expired before.
 * @throws GatewayUnavailable, GatewayRefused
 */
export async function expireCheckoutSession(stripe: Stripe, sessionId: string): Promise<CheckoutExpiry> {
  try {
    await callStripe(() => stripe.checkout.sessions.expire(sessionId));
    return "expired";
  } catch (error) {
    if (!(error instanceof GatewayRefused) || error.status !== 400) throw error;
    // Stripe refuses to expire what is not open and gives that no code of its own, so look.
    const { status } = await readCheckoutSession(stripe, sessionId);
    if (status === "complete") return "already-complete";
    if (status === "expired") return "already-expired";
    throw error;
  }
}

/** Our shape of Stripe's session, shared by what is read and what a webhook brings. */
export function asCheckoutSession(session: Stripe.Checkout.Session): CheckoutSession {
  if (session.amount_total === null || session.currency === null) {
    throw new Error(`checkout session ${session.id} has no amount`);
  }
  return {
    id: session.id,
    status: sessionStatus.parse(session.status),
    paymentStatus: paymentStatus.parse(session.payment_status),
    amountCents: session.amount_total,
    currency: session.currency,
    orderId: session.metadata?.[metadataNames.orderId] ?? session.client_reference_id,
    paymentId: session.metadata?.[metadataNames.paymentId] ?? null,
    paymentIntentId: idOf(session.payment_intent),
    url: session.url,
  };
}

/** Stripe gives an id, or the whole record where it was asked for. */
export function idOf(reference: string | { id: string } | null): string | null {
  return reference === null || typeof reference === "string" ? reference : reference.id;
}
