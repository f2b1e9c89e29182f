import { Order } from "#server/models/order.ts";
import { OrderEvent } from "#server/models/order-event.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { Payment } from "#server/models/payment.ts";
import { Person } from "#server/models/person.ts";
import { Refund } from "#server/models/refund.ts";
import { Refusal } from "#server/services/refusal.ts";

/** An order with all that stands on its page. */
export interface OrderRecord {
  order: Order;
  lines: OrderLine[];
  history: { event: OrderEvent; by: string }[];
  paidCents: number;
  returnedCents: number;
  openedByName: string | null;
}

/** Reads an order by its number; null when there is none. */
async function findOrder(number: string): Promise<Order | null> {
  return Order.findOne({ where: { number } });
}

/**
 * Reads all that stands on an order's page.
 * @throws Refusal not-found
 */
export async function readOrder(number: string): Promise<OrderRecord> {
  const order = await findOrder(number);
  if (!order) throw new Refusal("not-found", "There is no such order.");
  const [lines, events, payments] = await Promise.all([
    OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] }),
    OrderEvent.findAll({ where: { orderId: order.id }, order: [["sequence", "ASC"]] }),
    Payment.findAll({ where: { orderId: order.id, state: ["paid", "surplus"] } }),
  ]);
  const refunds = await Refund.findAll({
    where: { paymentId: payments.map((payment) => payment.id), state: "succeeded" },
  });
  const names = await namesOf([order.openedBy, ...events.map((event) => event.personId)]);
  return {
    order,
    lines,
    history: events.map((event) => ({ event, by: names.get(event.personId ?? "") ?? "Blockwright" })),
    paidCents: payments.reduce((sum, payment) => sum + payment.amountCents, 0),
    returnedCents: refunds.reduce((sum, refund) => sum + refund.amountCents, 0),
    openedByName: order.openedBy === null ? null : (names.get(order.openedBy) ?? null),
  };
}

async function namesOf(ids: (string | null)[]): Promise<Map<string, string>> {
  const wanted = [...new Set(ids.filter((id) => id !== null))];
  if (wanted.length === 0) return new Map();
  const people = await Person.findAll({ where: { id: wanted }, attributes: ["id", "name"] });
  return new Map(people.map((person) => [person.id, person.name]));
}
