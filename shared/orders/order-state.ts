import { z } from "zod";

export const orderStateSchema = z.enum([
  "awaiting-payment",
  "placed",
  "accepted",
  "in-work",
  "ready",
  "part-shipped",
  "shipped",
  "delivered",
  "on-hold",
  "declined",
  "cancelled",
]);
export type OrderState = z.infer<typeof orderStateSchema>;

/** What may follow each state. Each arrow is one function of the server with its guard, permission, history row and e-mail. */
export const orderTransitions: Readonly<Record<OrderState, readonly OrderState[]>> = {
  "awaiting-payment": ["placed", "cancelled"],
  placed: ["accepted", "declined", "on-hold", "cancelled"],
  accepted: ["in-work", "on-hold", "cancelled"],
  "in-work": ["ready", "on-hold", "cancelled"],
  ready: ["part-shipped", "shipped", "on-hold", "cancelled"],
  "part-shipped": ["shipped", "on-hold"],
  shipped: ["delivered"],
  delivered: [],
  "on-hold": ["placed", "accepted", "in-work", "ready", "part-shipped", "cancelled", "declined"],
  declined: [],
  cancelled: [],
};

/** Whether an order may go from one state to another. */
export function mayFollow(from: OrderState, to: OrderState): boolean {
  return orderTransitions[from].includes(to);
}

export const orderStateNames: Readonly<Record<OrderState, string>> = {
  "awaiting-payment": "Awaiting payment",
  placed: "Placed",
  accepted: "Accepted",
  "in-work": "In work",
  ready: "Ready",
  "part-shipped": "Part shipped",
  shipped: "Shipped",
  delivered: "Delivered",
  "on-hold": "On hold",
  declined: "Declined",
  cancelled: "Cancelled",
};
