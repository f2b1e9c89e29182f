import { ButtonLink } from "#web/components/button.tsx";
import { DataTable } from "#web/components/data-table.tsx";
import { Empty } from "#web/components/empty.tsx";
import { date, dateTime, money } from "#web/lib/format.ts";
import type { MyOrders } from "#shared/contracts/orders.ts";
import { OrderStateTag } from "./order-state-tag.tsx";

interface MyOrdersTableProps {
  orders: MyOrders["orders"];
  timeZone: string;
}

/** A buyer's own orders. */
export function MyOrdersTable({ orders, timeZone }: MyOrdersTableProps) {
  return (
    <DataTable
      caption="My orders"
      captionHidden
      rows={orders}
      rowId={(order) => order.number}
      rowLink={(order) => `/orders/${order.number}`}
      columns={[
        { id: "number", header: "Order", cell: (order) => <span className="numerals">{order.number}</span> },
        { id: "state", header: "State", cell: (order) => <OrderStateTag state={order.state} /> },
        {
          id: "placed",
          header: "Placed",
          cell: (order) => (order.placedAt === null ? "\u2013" : dateTime(order.placedAt, timeZone)),
          sortBy: (order) => order.placedAt ?? "",
        },
        { id: "summary", header: "Build", cell: (order) => order.summary },
        { id: "blocks", header: "Blocks", numeric: true, cell: (order) => order.blocks },
        {
          id: "ships",
          header: "Ships",
          cell: (order) =>
            order.state === "declined" || order.state === "cancelled" ? "\u2013" : date(order.shipsOn),
          sortBy: (order) => order.shipsOn,
        },
        {
          id: "total",
          header: "Total",
          numeric: true,
          cell: (order) => money(order.totalCents),
          sortBy: (order) => order.totalCents,
        },
      ]}
      empty={
        <Empty
          title="There is no order yet"
          action={
            <ButtonLink to="/build" look="main">
              Start a build
            </ButtonLink>
          }
        >
          <p>
            An order stands here once it is paid. One that was placed as a guest appears too, when its e-mail
            address is this account's and confirmed.
          </p>
        </Empty>
      }
    />
  );
}
