import type { ReactNode } from "react";
import { classNames } from "./class-names.ts";

export interface AmountRow {
  id: string;
  label: ReactNode;
  /** Why it costs that; smaller, under the label. */
  reason?: ReactNode;
  amount: ReactNode;
  /** A sum: ruled off above and set larger. */
  sum?: boolean;
}

interface AmountListProps {
  rows: AmountRow[];
  /** What is added up, for those who listen. */
  label: string;
  /** The amounts are being worked out anew: they stay in place, paler. */
  stale?: boolean;
}

/** Amounts one under the other with their reasons, and the sum below a double rule. */
export function AmountList({ rows, label, stale = false }: AmountListProps) {
  return (
    <div
      role="group"
      aria-label={label}
      aria-busy={stale || undefined}
      className={classNames("transition-opacity", stale && "opacity-60")}
    >
      <dl>
        {rows.map((row) => (
          <div
            key={row.id}
            className={classNames(
              "flex items-baseline justify-between gap-6 py-2",
              row.sum === true
                ? "border-t-4 border-double border-ink"
                : "border-t border-rule first:border-t-0",
            )}
          >
            <dt className={classNames("min-w-0", row.sum === true && "text-lg font-semibold")}>
              {row.label}
              {row.reason !== undefined && <span className="block text-sm text-iron">{row.reason}</span>}
            </dt>
            <dd
              className={classNames("shrink-0 text-right numerals", row.sum === true ? "text-xl" : "text-lg")}
            >
              {row.amount}
            </dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
