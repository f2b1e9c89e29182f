import { TitleBlock, type TitleBlockCell } from "#web/components/title-block.tsx";
import { date, dateTime, money, pounds } from "#web/lib/format.ts";
import type { OrderView } from "#shared/contracts/orders.ts";
import { OrderStateTag } from "./order-state-tag.tsx";

/** The strip of an order: number, state, blocks, weight, dates, price. */
export function OrderTitleBlock({ order, timeZone }: { order: OrderView; timeZone: string | undefined }) {
  const blocks = order.lines.reduce((sum, line) => sum + line.quantity, 0);
  const weight = order.lines.reduce((sum, line) => sum + line.build.weight * line.quantity, 0);
  return (
    <TitleBlock
      label={`Order ${order.number}`}
      cells={[
        { label: "Order", value: order.number, strong: true },
        { label: "State", value: <OrderStateTag state={order.state} /> },
        {
          label: "Placed",
          value:
            order.placedAt === null || timeZone === undefined ? "\u2013" : dateTime(order.placedAt, timeZone),
        },
        { label: blocks === 1 ? "Block" : "Blocks", value: String(blocks) },
        { label: "Weight", value: pounds(weight) },
        ...shippingCells(order),
        { label: "Total", value: money(order.totals.totalCents), strong: true },
      ]}
    />
  );
}

function shippingCells(order: OrderView): TitleBlockCell[] {
  if (order.state === "declined" || order.state === "cancelled") return [];
  return order.promisedShipOn === null
    ? [{ label: "Ships, estimate", value: date(order.estimatedShipOn) }]
    : [{ label: "Ships, promised", value: date(order.promisedShipOn) }];
}
