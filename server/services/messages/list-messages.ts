import { Op, type WhereOptions } from "sequelize";
import { Email } from "#server/models/email.ts";
import { Order } from "#server/models/order.ts";
import type { MessageListQuery } from "#shared/contracts/messages.ts";

const PAGE = 25;

/** A message with the number of the order that it is about. */
export interface MessageRecord {
  email: Email;
  orderNumber: string | null;
}

/** One page of the messages, newest first; `search` looks in address, name and order number. */
export async function listMessages(
  query: MessageListQuery,
): Promise<{ records: MessageRecord[]; total: number; pages: number }> {
  const conditions: WhereOptions<Email>[] = [];
  if (query.state !== undefined) conditions.push({ state: query.state });
  if (query.search !== "") {
    const like = { [Op.iLike]: `%${query.search.replace(/[\\%_]/g, "\\$&")}%` };
    const orders = await Order.findAll({ where: { number: like }, attributes: ["id"], limit: 200 });
    conditions.push({
      [Op.or]: [{ toAddress: like }, { toName: like }, { orderId: orders.map((order) => order.id) }],
    });
  }
  const where: WhereOptions<Email> = { [Op.and]: conditions };
  const total = await Email.count({ where });
  const emails = await Email.findAll({
    where,
    order: [
      ["createdAt", "DESC"],
      ["id", "DESC"],
    ],
    limit: PAGE,
    offset: (query.page - 1) * PAGE,
  });
  return { records: await withOrderNumbers(emails), total, pages: Math.max(1, Math.ceil(total / PAGE)) };
}

export async function withOrderNumbers(emails: Email[]): Promise<MessageRecord[]> {
  const ids = emails.map((email) => email.orderId).filter((id) => id !== null);
  const orders =
    ids.length === 0 ? [] : await Order.findAll({ where: { id: ids }, attributes: ["id", "number"] });
  const numbers = new Map(orders.map((order) => [order.id, order.number]));
  return emails.map((email) => ({
    email,
    orderNumber: email.orderId === null ? null : (numbers.get(email.orderId) ?? null),
  }));
}
