import Stripe from "stripe";
import { asCheckoutSession, type CheckoutSession, idOf, metadataNames } from "./checkout.ts";
import { WebhookSignatureError } from "./errors.ts";
import { asChangedRefund, type ChangedRefund } from "./refunds.ts";

/** A payment that did not go through; the customer may try again on the same page. */
interface FailedPayment {
  paymentIntentId: string | null;
  orderId: string | null;
  paymentId: string | null;
  amountCents: number;
  /** `card_declined`, `expired_card` ... */
  code: string | null;
  declineCode: string | null;
}

/** What the payment service tells us, in our own words. `type` is Stripe's name for it. */
export type StripeEvent = { id: string; type: string; createdAt: Date } & (
  | { kind: "checkout-completed"; session: CheckoutSession }
  | { kind: "checkout-expired"; session: CheckoutSession }
  | { kind: "payment-failed"; payment: FailedPayment }
  | { kind: "refund-changed"; refund: ChangedRefund }
  | { kind: "other" }
);

/** Never 0: the SDK takes that as "any age". */
const TOLERANCE_SECONDS = 300;

/**
 * Checks the signature over the bytes as they came, then reads the event.
 * "checkout-completed" may still be unpaid (`session.paymentStatus`); when a late payment comes
 * through, the event comes again with another id and is then paid.
 * @param receivedAt when the request came; now, if left out
 * @throws WebhookSignatureError when the signature does not fit or is older than 300 s
 */
export function readWebhook(
  stripe: Stripe,
  webhookSecret: string,
  rawBody: Buffer,
  signature: string,
  receivedAt?: Date,
): StripeEvent {
  const event = verified(stripe, webhookSecret, rawBody, signature, receivedAt);
  const told = { id: event.id, type: event.type, createdAt: new Date(event.created * 1000) };
  if (
    event.type === "checkout.session.completed" ||
    event.type === "checkout.session.async_payment_succeeded"
  ) {
    return { ...told, kind: "checkout-completed", session: asCheckoutSession(event.data.object) };
  }
  if (event.type === "checkout.session.expired") {
    return { ...told, kind: "checkout-expired", session: asCheckoutSession(event.data.object) };
  }
  if (event.type === "checkout.session.async_payment_failed") {
    return { ...told, kind: "payment-failed", payment: latePaymentFailed(event.data.object) };
  }
  if (event.type === "payment_intent.payment_failed") {
    return { ...told, kind: "payment-failed", payment: paymentFailed(event.data.object) };
  }
  if (event.type === "refund.created" || event.type === "refund.updated" || event.type === "refund.failed") {
    return { ...told, kind: "refund-changed", refund: asChangedRefund(event.data.object) };
  }
  return { ...told, kind: "other" };
}

function verified(
  stripe: Stripe,
  webhookSecret: string,
  rawBody: Buffer,
  signature: string,
  receivedAt: Date | undefined,
): Stripe.Event {
  try {
    return stripe.webhooks.constructEvent(
      rawBody,
      signature,
      webhookSecret,
      TOLERANCE_SECONDS,
      undefined,
      receivedAt?.getTime(),
    );
  } catch (error) {
    if (error instanceof Stripe.errors.StripeSignatureVerificationError) {
      throw new WebhookSignatureError(error.message, { cause: error });
    }
    throw error;
  }
}

function paymentFailed(intent: Stripe.PaymentIntent): FailedPayment {
  return {
    paymentIntentId: intent.id,
    orderId: intent.metadata[metadataNames.orderId] ?? null,
    paymentId: intent.metadata[metadataNames.paymentId] ?? null,
    amountCents: intent.amount,
    code: intent.last_payment_error?.code ?? null,
    declineCode: intent.last_payment_error?.decline_code ?? null,
  };
}

function latePaymentFailed(session: Stripe.Checkout.Session): FailedPayment {
  const { orderId, paymentId, amountCents } = asCheckoutSession(session);
  return {
    paymentIntentId: idOf(session.payment_intent),
    orderId,
    paymentId,
    amountCents,
    code: null,
    declineCode: null,
  };
}
