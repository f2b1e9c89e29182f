import { transaction } from "#server/database/transaction.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { Payment } from "#server/models/payment.ts";
import { Refund } from "#server/models/refund.ts";
import { addHistory } from "./add-history.ts";
import { lockOrder, moveOrder } from "./lock-order.ts";
import { queueOrderEmail } from "./queue-order-email.ts";

/**
 * The shop declines an order; what was paid goes back by a job and the customer is told why.
 * @throws Refusal not-found, conflict when the order is no longer waiting
 */
export async function declineOrder(number: string, reason: string, personId: string): Promise<void> {
  await transaction(async () => {
    const order = await lockOrder({ number });
    await moveOrder(order, "declined", { declineReason: reason, openedBy: null, openedAt: null });
    await addHistory(order, `Declined: ${reason}`, personId);
    const payment = await Payment.findOne({
      where: { orderId: order.id, state: "paid" },
      lock: true,
      rejectOnEmpty: true,
    });
    const refund = await Refund.create({
      paymentId: payment.id,
      amountCents: payment.amountCents,
      reason: "declined",
      state: "requested",
    });
    await enqueue("refund-payment", { refundId: refund.id });
    const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] });
    await queueOrderEmail("order-declined", order, lines, `order-declined:${order.id}`);
  });
}
