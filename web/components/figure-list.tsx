import type { ReactNode } from "react";

export interface FigureRow {
  id: string;
  name: ReactNode;
  /** The number with its unit, or null while it is undecided. */
  value: ReactNode | null;
  /** How it is worked out, in words; opens under the row. */
  formula?: ReactNode;
  /** The limit it is held against, such as "at least 0.1500 in". */
  limit?: ReactNode;
}

interface FigureListProps {
  figures: FigureRow[];
  /** Shown for a figure without a value. */
  undecided?: string;
}

/** Engineering figures, one a line with a dotted leader, each with its formula behind it. */
export function FigureList({ figures, undecided = "to be confirmed" }: FigureListProps) {
  return (
    <dl className="border-t border-rule">
      {figures.map((figure) => (
        <div
          key={figure.id}
          className="grid grid-cols-[1fr_auto] items-baseline gap-x-2 border-b border-rule py-2"
        >
          <dt className="flex items-baseline gap-2 after:mb-1 after:min-w-4 after:grow after:border-b after:border-dotted after:border-edge">
            {figure.name}
          </dt>
          <dd className="text-right text-lg numerals">
            {figure.value ?? <span className="font-sans text-sm font-normal text-iron">{undecided}</span>}
          </dd>
          {(figure.limit !== undefined || figure.formula !== undefined) && (
            <dd className="col-span-2 flex flex-wrap justify-between gap-x-4 text-sm text-iron">
              {figure.formula === undefined ? <span /> : <Formula>{figure.formula}</Formula>}
              {figure.limit !== undefined && <span className="numerals">{figure.limit}</span>}
            </dd>
          )}
        </div>
      ))}
    </dl>
  );
}

function Formula({ children }: { children: ReactNode }) {
  return (
    <details className="min-w-0">
      <summary className="inline-flex min-h-6 cursor-pointer items-center text-dye underline underline-offset-4">
        Formula
      </summary>
      <p className="mt-1 max-w-text">{children}</p>
    </details>
  );
}
