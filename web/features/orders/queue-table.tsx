import { MessageSquareText } from "lucide-react";
import { DataTable, type Column } from "#web/components/data-table.tsx";
import { StatusTag } from "#web/components/status-tag.tsx";
import { date, dateTime, money } from "#web/lib/format.ts";
import type { OrderSummary } from "#shared/contracts/orders.ts";
import type { ReactNode } from "react";

interface QueueTableProps {
  orders: OrderSummary[];
  timeZone: string;
  empty: ReactNode;
}

/** The shop's queue, oldest first. */
export function QueueTable({ orders, timeZone, empty }: QueueTableProps) {
  return (
    <DataTable
      caption="Orders, oldest first"
      captionHidden
      rows={orders}
      rowId={(order) => order.number}
      rowLink={(order) => `/floor/orders/${order.number}`}
      columns={columns(timeZone)}
      empty={empty}
    />
  );
}

function columns(timeZone: string): Column<OrderSummary>[] {
  return [
    {
      id: "number",
      header: "Order",
      cell: (order) => <span className="text-lg whitespace-nowrap numerals">{order.number}</span>,
    },
    {
      id: "placed",
      header: "Placed",
      cell: (order) => (order.placedAt === null ? "\u2013" : dateTime(order.placedAt, timeZone)),
    },
    { id: "customer", header: "Customer", cell: (order) => order.contactName },
    {
      id: "build",
      header: "Build",
      cell: (order) => (
        <>
          {order.summary}
          {order.openedBy !== null && (
            <span className="mt-1 block">
              <StatusTag kind="note">{order.openedBy} has it open</StatusTag>
            </span>
          )}
        </>
      ),
    },
    { id: "blocks", header: "Blocks", numeric: true, cell: (order) => order.blocks },
    { id: "marks", header: "To look at", cell: (order) => <Marks order={order} /> },
    {
      id: "ships",
      header: "Ships",
      cell: (order) => <span className="whitespace-nowrap">{date(order.shipsOn)}</span>,
    },
    { id: "total", header: "Total", numeric: true, cell: (order) => money(order.totalCents) },
  ];
}

/** What wants the planner's eye: cautions of the rules, a special request. */
function Marks({ order }: { order: OrderSummary }) {
  if (order.cautions === 0 && !order.hasSpecialRequest) return "\u2013";
  return (
    <span className="inline-flex flex-col items-start gap-1 max-sm:items-end">
      {order.cautions > 0 && (
        <StatusTag kind="caution">
          {order.cautions === 1 ? "1 caution" : `${order.cautions} cautions`}
        </StatusTag>
      )}
      {order.hasSpecialRequest && (
        <span className="inline-flex items-center gap-1.5 font-condensed font-semibold whitespace-nowrap">
          <MessageSquareText aria-hidden="true" className="size-3.5 shrink-0 text-dye" />
          Special request
        </span>
      )}
    </span>
  );
}
