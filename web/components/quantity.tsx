import type { ReactNode } from "react";

interface QuantityProps {
  /** Already in the digits that the shop holds, such as "4.1250". */
  value: ReactNode;
  unit?: string;
}

/** A number with its unit that never breaks over two lines. */
export function Quantity({ value, unit }: QuantityProps) {
  return (
    <span className="whitespace-nowrap numerals">
      {value}
      {unit !== undefined && <span className="text-[0.85em] text-iron"> {unit}</span>}
    </span>
  );
}
