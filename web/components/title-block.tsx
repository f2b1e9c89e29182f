import type { ReactNode } from "react";
import { classNames } from "./class-names.ts";

export interface TitleBlockCell {
  label: string;
  value: ReactNode;
  /** Takes the room of two cells: names, spec codes. */
  wide?: boolean;
  /** The cell that the eye should find first, such as the price. */
  strong?: boolean;
}

interface TitleBlockProps {
  cells: TitleBlockCell[];
  /** What the strip describes, for those who listen. */
  label: string;
}

/** The strip at the foot of a working drawing: labelled cells within thin rules. */
export function TitleBlock({ cells, label }: TitleBlockProps) {
  return (
    <section aria-label={label} className="overflow-hidden border-2 border-ink bg-sheet">
      <dl className="-mt-px -ml-px flex flex-wrap">
        {cells.map((cell) => (
          <div
            key={cell.label}
            className={classNames(
              "flex min-w-0 grow flex-col border-t border-l border-edge px-3 pt-1 pb-1.5",
              cell.wide === true ? "basis-72" : "basis-32",
            )}
          >
            <dt className="cell-label">{cell.label}</dt>
            <dd className={classNames("numerals break-words", cell.strong === true ? "text-xl" : "text-lg")}>
              {cell.value}
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
