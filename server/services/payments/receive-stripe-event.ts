import { transaction } from "#server/database/transaction.ts";
import type { StripeEvent } from "#server/gateways/stripe.ts";
import { Payment } from "#server/models/payment.ts";
import { StripeEventRecord } from "#server/models/stripe-event.ts";
import { expirePayment } from "./expire-payment.ts";
import { NEVER_PAID } from "./payment-session.ts";
import { recordPayment } from "./record-payment.ts";
import { recordRefund } from "./record-refund.ts";

/**
 * Acts on a verified event of Stripe, once: the event's id and all that it causes are one transaction.
 * @returns what came of it, for the log
 */
export async function receiveStripeEvent(event: StripeEvent): Promise<string> {
  return transaction(async () => {
    const isNew = await StripeEventRecord.claim(event.id, event.type);
    if (!isNew) return "known already";
    const { outcome, paymentId } = await act(event);
    await StripeEventRecord.update({ outcome, paymentId }, { where: { id: event.id } });
    return outcome;
  });
}

async function act(event: StripeEvent): Promise<{ outcome: string; paymentId: string | null }> {
  switch (event.kind) {
    case "checkout-completed":
      return recordPayment(event.session);
    case "checkout-expired": {
      const payment = await Payment.findOne({ where: { checkoutSession: event.session.id } });
      if (!payment) return { outcome: "does not match", paymentId: null };
      const changed = await expirePayment(payment.id, NEVER_PAID);
      return { outcome: changed ? "expired" : "known already", paymentId: payment.id };
    }
    case "refund-changed":
      return recordRefund(event.refund);
    case "payment-failed":
      // The buyer sees the refusal on the payment page and may try another card there.
      return { outcome: "noted", paymentId: null };
    case "other":
      return { outcome: "not used", paymentId: null };
  }
}
