import { OrderEvent } from "#server/models/order-event.ts";
import type { Order } from "#server/models/order.ts";

/** Writes one row of an order's history at its present state, within the caller's transaction. */
export async function addHistory(order: Order, text: string, personId: string | null): Promise<void> {
  await OrderEvent.create({ orderId: order.id, state: order.state, text, personId });
}
