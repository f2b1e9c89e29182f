import { transaction } from "#server/database/transaction.ts";
import { Order } from "#server/models/order.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { findToken } from "#server/services/tokens/find-token.ts";
import { readOrderNumber } from "#shared/orders/order-number.ts";
import { queueOrderEmail } from "./queue-order-email.ts";

/** The order that a mailed link opens; null when the link was revoked or never was one. */
export async function orderOfLink(token: string): Promise<Order | null> {
  const access = await transaction(() => findToken("order-link", token));
  return access?.orderId ? Order.findByPk(access.orderId) : null;
}

/**
 * Mails a new link to an order's own address when number and address belong together. It says nothing of whether
 * they do. At most one an hour for an order: more asking within the hour mails nothing more.
 */
export async function sendOrderLink(typedNumber: string, email: string): Promise<void> {
  const number = readOrderNumber(typedNumber);
  if (number === null) return;
  await transaction(async () => {
    const order = await Order.findOne({ where: { number } });
    if (!order || order.placedAt === null || order.contactEmail.toLowerCase() !== email.toLowerCase()) return;
    const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] });
    const hour = new Date().toISOString().slice(0, 13);
    await queueOrderEmail("order-link", order, lines, `order-link:${order.id}:${hour}`);
  });
}
