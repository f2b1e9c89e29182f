import { AmountList, type AmountRow } from "#web/components/amount-list.tsx";
import { CautionLine } from "#web/components/caution-line.tsx";
import { money } from "#web/lib/format.ts";
import type { CartView } from "#shared/contracts/cart.ts";
import type { Totals } from "#shared/contracts/checkout.ts";

interface OrderAmountsProps {
  cart: CartView;
  /** Undefined until the delivery is known. */
  totals: Totals | undefined;
  stale: boolean;
}

/** Every line that makes up the total, with its reason. Until the address is complete, only the goods. */
export function OrderAmounts({ cart, totals, stale }: OrderAmountsProps) {
  return (
    <div>
      <AmountList
        label="What the order costs"
        rows={totals === undefined ? goodsRows(cart) : totalRows(totals)}
        stale={stale}
      />
      <div className="mt-3">
        <CautionLine>Freight and tax are estimates until invoiced.</CautionLine>
      </div>
    </div>
  );
}

function goodsRows(cart: CartView): AmountRow[] {
  return [
    ...cart.lines.map((line) => ({
      id: line.id,
      label: line.build.summary,
      ...(line.quantity > 1 ? { reason: `${line.quantity} blocks` } : {}),
      amount: money(line.totalCents),
    })),
    { id: "later", label: "Freight and tax", reason: "Known once the address is complete", amount: "\u2013" },
    { id: "goods", label: "Blocks", amount: money(cart.totalCents), sum: true },
  ];
}

function totalRows(totals: Totals): AmountRow[] {
  return [
    ...totals.lines.map((line, index) => ({
      id: `${line.kind} ${index}`,
      label: line.label,
      ...(line.quantity > 1 && line.kind === "block" ? { reason: `${line.quantity} blocks` } : {}),
      amount: money(line.amountCents),
    })),
    { id: "total", label: "Total to pay", amount: money(totals.totalCents), sum: true },
  ];
}
