import type { ReactNode } from "react";

interface DrawingFrameProps {
  /** What is drawn; the caption of the figure. */
  caption: ReactNode;
  /** Scale, units and the like, at the right of the caption. */
  remark?: ReactNode;
  children: ReactNode;
}

const columns = ["1", "2", "3", "4", "5", "6", "7", "8"];
const rows = ["A", "B", "C", "D"];

/** The border of a drawing sheet with its zone marks. It goes around the drawing and nothing else. */
export function DrawingFrame({ caption, remark, children }: DrawingFrameProps) {
  return (
    <figure className="border border-edge bg-sheet">
      <div className="grid grid-cols-[1.25rem_1fr_1.25rem] grid-rows-[1.25rem_1fr_1.25rem]">
        <Zones marks={columns} className="col-start-2 row-start-1 flex" />
        <Zones marks={rows} className="col-start-1 row-start-2 flex flex-col" />
        <div className="col-start-2 row-start-2 min-w-0 border-2 border-ink">{children}</div>
        <Zones marks={rows} className="col-start-3 row-start-2 flex flex-col" />
        <Zones marks={columns} className="col-start-2 row-start-3 flex" />
      </div>
      <figcaption className="flex flex-wrap justify-between gap-x-6 border-t border-edge px-3 py-1.5 text-sm">
        <span>{caption}</span>
        {remark !== undefined && <span className="numerals text-iron">{remark}</span>}
      </figcaption>
    </figure>
  );
}

function Zones({ marks, className }: { marks: string[]; className: string }) {
  const upright = className.includes("flex-col");
  return (
    <div aria-hidden="true" className={className}>
      {marks.map((mark, index) => (
        <span
          key={mark}
          className={`flex flex-1 items-center justify-center font-condensed text-xs font-semibold text-iron ${
            index === 0 ? "" : upright ? "border-t border-edge" : "border-l border-edge"
          }`}
        >
          {mark}
        </span>
      ))}
    </div>
  );
}
