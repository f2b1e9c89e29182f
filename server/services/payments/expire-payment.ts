import { Cart } from "#server/models/cart.ts";
import { Payment } from "#server/models/payment.ts";
import { addHistory } from "#server/services/orders/add-history.ts";
import { lockOrder, moveOrder } from "#server/services/orders/lock-order.ts";

/**
 * Takes note that a payment page can never be paid any more, and ends its order if that still waited for it.
 * Only to be called when Stripe has said so. Runs within the caller's transaction; safe to repeat.
 * @returns whether anything changed
 */
export async function expirePayment(paymentId: string, why: string): Promise<boolean> {
  const found = await Payment.findByPk(paymentId, { rejectOnEmpty: true });
  await Cart.findByPk(found.cartId, { lock: true });
  const order = await lockOrder({ id: found.orderId });
  const payment = await found.reload({ lock: true });
  if (payment.state !== "opening" && payment.state !== "open") return false;
  await payment.update({ state: "expired" });
  if (order.state === "awaiting-payment") {
    await moveOrder(order, "cancelled");
    await addHistory(order, why, null);
  }
  return true;
}
