import { useState } from "react";
import { classNames } from "#web/components/class-names.ts";
import { FigureList, type FigureRow } from "#web/components/figure-list.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { figureRows } from "./figure-rows.ts";
import { useLengthUnit, type LengthUnit } from "./length-unit.ts";

const units: { unit: LengthUnit; name: string }[] = [
  { unit: "in", name: "inches" },
  { unit: "mm", name: "millimetres" },
];

/** The engineering figures of the build in inches or millimetres; formulas and limits on demand. */
export function FiguresPanel() {
  const { figures } = useBuildDesk().evaluation;
  const [unit, setUnit] = useLengthUnit();
  const [explained, setExplained] = useState(false);
  const rows = figureRows(figures, unit).map(({ id, name, value, formula, limit }): FigureRow => ({
    id,
    name,
    value,
    ...(explained ? { formula, ...(limit === undefined ? {} : { limit }) } : {}),
  }));
  return (
    <section aria-labelledby="figures">
      <div className="flex items-end justify-between gap-4">
        <h2 id="figures" className="text-xl">
          Figures
        </h2>
        <div role="group" aria-label="Unit of lengths" className="flex border border-edge">
          {units.map((entry) => (
            <button
              key={entry.unit}
              type="button"
              aria-pressed={unit === entry.unit}
              onClick={() => {
                setUnit(entry.unit);
              }}
              className={classNames(
                "min-h-8 px-2.5 numerals not-first:border-l not-first:border-edge",
                unit === entry.unit ? "bg-dye text-on-dye" : "bg-sheet hover:bg-wash",
              )}
            >
              {entry.name}
            </button>
          ))}
        </div>
      </div>
      <div className="mt-2">
        <FigureList figures={rows} undecided="not known yet" />
      </div>
      <button
        type="button"
        aria-pressed={explained}
        onClick={() => {
          setExplained(!explained);
        }}
        className="mt-2 min-h-target text-dye underline underline-offset-4"
      >
        {explained ? "Hide formulas and limits" : "Show formulas and limits"}
      </button>
      <p className="text-sm text-iron">
        The block makes no power; heads, cam and fuel decide. Clearances check the block against the sizes
        entered: mock up and measure every assembly.
      </p>
    </section>
  );
}
