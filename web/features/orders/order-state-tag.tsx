import type { StateKind } from "#web/components/state-mark.tsx";
import { StatusTag } from "#web/components/status-tag.tsx";
import { orderStateNames, type OrderState } from "#shared/orders/order-state.ts";

const kinds: Record<OrderState, StateKind> = {
  "awaiting-payment": "waiting",
  placed: "waiting",
  accepted: "note",
  "in-work": "note",
  ready: "note",
  "part-shipped": "note",
  shipped: "note",
  delivered: "pass",
  "on-hold": "caution",
  declined: "stop",
  cancelled: "stop",
};

/** An order's state in its word and shape. */
export function OrderStateTag({ state }: { state: OrderState }) {
  return <StatusTag kind={kinds[state]}>{orderStateNames[state]}</StatusTag>;
}
