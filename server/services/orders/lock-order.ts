import { Order } from "#server/models/order.ts";
import { Refusal } from "#server/services/refusal.ts";
import { mayFollow, orderStateNames, type OrderState } from "#shared/orders/order-state.ts";

/**
 * Reads an order and locks its row until the end of the caller's transaction.
 * @throws Refusal not-found
 */
export async function lockOrder(where: { number: string } | { id: string }): Promise<Order> {
  const order = await Order.findOne({ where, lock: true });
  if (!order) throw new Refusal("not-found", "There is no such order.");
  return order;
}

/**
 * Sets the state of a locked order when it may follow the present one.
 * @throws Refusal conflict, naming both states
 */
export async function moveOrder(order: Order, to: OrderState, values: Partial<Order> = {}): Promise<void> {
  if (!mayFollow(order.state, to)) {
    throw new Refusal(
      "conflict",
      `Order ${order.number} is ${orderStateNames[order.state].toLowerCase()} and cannot become ${orderStateNames[to].toLowerCase()}. Reload to see how it stands.`,
    );
  }
  await order.update({ ...values, state: to });
}
