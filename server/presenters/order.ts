import type { Order } from "#server/models/order.ts";
import type { OrderRow } from "#server/services/orders/list-orders.ts";
import { OPEN_FOR } from "#server/services/orders/open-order.ts";
import type { OrderRecord } from "#server/services/orders/read-order.ts";
import type { Delivery } from "#shared/contracts/address.ts";
import type { MyOrders, OrderReview, OrderSummary, OrderView } from "#shared/contracts/orders.ts";
import { priceOrder } from "#shared/pricing/price-order.ts";
import type { OrderState } from "#shared/orders/order-state.ts";

/** An order as its buyer sees it: no names of staff. */
export function presentOrder(record: OrderRecord): OrderView {
  const { order } = record;
  return {
    number: order.number,
    state: order.state,
    placedAt: order.placedAt?.toISOString() ?? null,
    estimatedShipOn: order.estimatedShipOn,
    promisedShipOn: order.promisedShipOn,
    declineReason: order.declineReason,
    contact: { name: order.contactName, email: order.contactEmail, phone: order.contactPhone },
    delivery: deliveryOf(order),
    lines: record.lines.map((line) => ({
      id: line.id,
      quantity: line.quantity,
      engraving: line.engraving,
      specialRequest: line.specialRequest,
      specialRequestAnswer: line.specialRequestAnswer,
      build: line.build,
      totalCents: line.totalCents,
    })),
    totals: totalsOf(record),
    paidCents: record.paidCents,
    returnedCents: record.returnedCents,
    history: record.history.map(({ event }) => ({
      id: event.id,
      at: event.at.toISOString(),
      text: event.text,
      state: event.state,
    })),
    next: nextSteps[order.state],
  };
}

/** An order as the planner sees it: who has it open, who did what, today's estimate. */
export function presentOrderReview(
  record: OrderRecord,
  proposedShipOn: string,
  readerId: string,
): OrderReview {
  const { order, openedByName } = record;
  return {
    ...presentOrder(record),
    openedBy:
      isOpen(order) && openedByName !== null && order.openedAt !== null
        ? { name: openedByName, at: order.openedAt.toISOString(), me: order.openedBy === readerId }
        : null,
    proposedShipOn,
    history: record.history.map(({ event, by }) => ({
      id: event.id,
      at: event.at.toISOString(),
      text: event.text,
      state: event.state,
      by,
    })),
  };
}

/** A row of the shop's queue. */
export function presentOrderSummary(row: OrderRow): OrderSummary {
  const { order, lines } = row;
  return {
    ...presentMyOrder(row),
    cautions: new Set(
      lines.flatMap((line) =>
        line.build.findings.filter((finding) => finding.severity !== "note").map((finding) => finding.rule),
      ),
    ).size,
    openedBy: isOpen(order) ? row.openedByName : null,
  };
}

/** A row of a buyer's own orders. */
export function presentMyOrder({ order, lines }: OrderRow): MyOrders["orders"][number] {
  return {
    number: order.number,
    state: order.state,
    placedAt: order.placedAt?.toISOString() ?? null,
    contactName: order.contactName,
    summary: summaryOf(lines),
    blocks: lines.reduce((sum, line) => sum + line.quantity, 0),
    totalCents: order.totalCents,
    hasSpecialRequest: lines.some((line) => line.specialRequest !== ""),
    shipsOn: order.promisedShipOn ?? order.estimatedShipOn,
  };
}

function summaryOf(lines: OrderRow["lines"]): string {
  const first = lines[0]?.build.summary ?? "";
  return lines.length > 1 ? `${first} and ${lines.length - 1} more` : first;
}

function isOpen(order: Order): boolean {
  return order.openedAt !== null && Date.now() - order.openedAt.getTime() < OPEN_FOR;
}

function deliveryOf(order: Order): Delivery {
  return order.deliveryAddress === null
    ? { method: "pick-up" }
    : { method: "freight", address: order.deliveryAddress };
}

function totalsOf({ order, lines }: OrderRecord): OrderView["totals"] {
  return priceOrder({
    lines: lines.map((line) => ({
      label: line.build.summary,
      quantity: line.quantity,
      unitCents: line.unitCents,
    })),
    delivery: deliveryOf(order),
    freightCents: order.freightCents,
    tax: { label: order.taxLabel, cents: order.taxCents },
  });
}

const nextSteps: Record<OrderState, string> = {
  "awaiting-payment": "The order waits for its payment; the shop sees it once it is paid.",
  placed: "The shop looks the order over and answers by e-mail with the date it can keep.",
  accepted:
    "The shop schedules the machining. You hear from us when the block ships, or before if the date has to move.",
  "in-work": "The block is being machined and measured.",
  ready: "The block is packed and waits for the carrier.",
  "part-shipped": "Some blocks are on their way; the others follow.",
  shipped: "The block is on its way. Have a hoist or fork truck ready to unload the pallet.",
  delivered: "Wash and oil the block before assembly; the cylinders may need their final hone.",
  "on-hold": "The shop has a question; the order goes on when it is answered.",
  declined:
    "The shop could not take this order on. What was paid goes back to the card, which takes the bank 5 to 10 days.",
  cancelled: "This order has ended; nothing more happens to it.",
};
