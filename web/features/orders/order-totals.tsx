import { AmountList, type AmountRow } from "#web/components/amount-list.tsx";
import { money } from "#web/lib/format.ts";
import type { OrderView } from "#shared/contracts/orders.ts";

/** What the order costs line by line, what was paid, and what went back. */
export function OrderTotals({ order }: { order: OrderView }) {
  const rows: AmountRow[] = [
    ...order.totals.lines.map((line, index) => ({
      id: `${line.kind} ${index}`,
      label: line.label,
      ...(line.kind === "block" && line.quantity > 1 ? { reason: `${line.quantity} blocks` } : {}),
      amount: money(line.amountCents),
    })),
    { id: "total", label: "Total", amount: money(order.totals.totalCents), sum: true },
    { id: "paid", label: "Paid", amount: money(order.paidCents) },
  ];
  if (order.returnedCents > 0) {
    rows.push({ id: "returned", label: "Returned", amount: money(order.returnedCents) });
  }
  return <AmountList label="What the order costs" rows={rows} />;
}
