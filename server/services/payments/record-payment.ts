import { enqueue } from "#server/jobs/queue.ts";
import { Cart } from "#server/models/cart.ts";
import { OrderLine } from "#server/models/order-line.ts";
import type { Order } from "#server/models/order.ts";
import { Payment } from "#server/models/payment.ts";
import { Refund } from "#server/models/refund.ts";
import type { CheckoutSession } from "#server/gateways/stripe.ts";
import { queueOrderEmail } from "#server/services/orders/queue-order-email.ts";
import { addHistory } from "#server/services/orders/add-history.ts";
import { lockOrder, moveOrder } from "#server/services/orders/lock-order.ts";

/** What came of a session that Stripe calls complete. Everything but "placed" and "surplus" changed nothing. */
export type PaymentOutcome = "placed" | "surplus" | "known already" | "not paid yet" | "does not match";

/**
 * Takes note of a paid checkout session: the order is placed, or, when its cart was paid already or the order has
 * ended, the money goes back. Runs within the caller's transaction; safe to call any number of times.
 */
export async function recordPayment(
  session: CheckoutSession,
): Promise<{ outcome: PaymentOutcome; paymentId: string | null }> {
  if (session.paymentId === null || session.orderId === null)
    return { outcome: "does not match", paymentId: null };
  const found = await Payment.findByPk(session.paymentId);
  if (!found || found.orderId !== session.orderId) return { outcome: "does not match", paymentId: null };
  // Cart, then order, then payment: every function that touches money locks in this order.
  const cart = await Cart.findByPk(found.cartId, { lock: true, rejectOnEmpty: true });
  const order = await lockOrder({ id: found.orderId });
  const payment = await found.reload({ lock: true });
  const paymentId = payment.id;
  if (payment.state === "paid" || payment.state === "surplus") return { outcome: "known already", paymentId };
  if (session.paymentStatus !== "paid" || session.paymentIntentId === null)
    return { outcome: "not paid yet", paymentId };
  if (!matches(payment, session)) return { outcome: "does not match", paymentId };

  const taken = { checkoutSession: session.id, paymentIntent: session.paymentIntentId, paidAt: new Date() };
  if (order.state === "awaiting-payment" && cart.closedAt === null) {
    await payment.update({ ...taken, state: "paid" });
    await cart.update({ closedAt: new Date() });
    await place(order);
    return { outcome: "placed", paymentId };
  }
  await payment.update({ ...taken, state: "surplus" });
  await returnSurplus(order, payment);
  return { outcome: "surplus", paymentId };
}

function matches(payment: Payment, session: CheckoutSession): boolean {
  return (
    session.amountCents === payment.amountCents &&
    session.currency.toUpperCase() === payment.currency &&
    (payment.checkoutSession === null || payment.checkoutSession === session.id)
  );
}

async function place(order: Order): Promise<void> {
  await moveOrder(order, "placed", { placedAt: new Date() });
  await addHistory(order, "Paid in full; the shop has the order.", null);
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] });
  await queueOrderEmail("order-placed", order, lines, `order-placed:${order.id}`);
}

async function returnSurplus(order: Order, payment: Payment): Promise<void> {
  const refund = await Refund.create({
    paymentId: payment.id,
    amountCents: payment.amountCents,
    reason: "paid-twice",
    state: "requested",
  });
  await enqueue("refund-payment", { refundId: refund.id });
  await addHistory(
    order,
    "This payment came although the cart was paid or closed already; it goes back by itself.",
    null,
  );
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] });
  await queueOrderEmail("payment-returned", order, lines, `payment-returned:${payment.id}`);
}
