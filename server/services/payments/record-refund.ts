import type { RefundAnswer } from "#server/gateways/stripe.ts";
import { Order } from "#server/models/order.ts";
import { Payment } from "#server/models/payment.ts";
import { Refund } from "#server/models/refund.ts";
import { addHistory } from "#server/services/orders/add-history.ts";

const stateOf = {
  pending: "pending",
  requires_action: "pending",
  succeeded: "succeeded",
  failed: "failed",
  canceled: "failed",
} as const satisfies Record<RefundAnswer["status"], Refund["state"]>;

/**
 * Takes note of how a refund of ours stands at Stripe. Runs within the caller's transaction; safe to repeat and out
 * of order: what has succeeded or failed is final but for a late failure of a success, which banks do report.
 */
export async function recordRefund(
  answer: RefundAnswer & { ourRefundId?: string | null },
): Promise<{ outcome: string; paymentId: string | null }> {
  const refund =
    (await Refund.findOne({ where: { stripeRefund: answer.refundId }, lock: true })) ??
    (answer.ourRefundId ? await Refund.findByPk(answer.ourRefundId, { lock: true }) : null);
  if (!refund) return { outcome: "does not match", paymentId: null };
  const state = stateOf[answer.status];
  const goesBackInTime = state === "pending" && refund.state !== "requested";
  if (refund.state === state || refund.state === "failed" || goesBackInTime) {
    return { outcome: "known already", paymentId: refund.paymentId };
  }
  await refund.update({ state, stripeRefund: answer.refundId });
  const payment = await Payment.findByPk(refund.paymentId, { rejectOnEmpty: true });
  const order = await Order.findByPk(payment.orderId, { rejectOnEmpty: true });
  if (state === "succeeded") await addHistory(order, "The payment was returned to the card.", null);
  if (state === "failed")
    await addHistory(order, "The bank could not return the payment; the shop settles it by hand.", null);
  return { outcome: `refund ${state}`, paymentId: payment.id };
}
