import type { ReactNode } from "react";

export interface TimelineEntry {
  id: string;
  /** When, in words. */
  when: ReactNode;
  title: ReactNode;
  text?: ReactNode;
  /** The last thing that happened, or where it stands now. */
  current?: boolean;
  /** Still to come. */
  ahead?: boolean;
}

/** What happened, in order, along one line. */
export function Timeline({ entries }: { entries: TimelineEntry[] }) {
  return (
    <ol>
      {entries.map((entry) => (
        <li
          key={entry.id}
          aria-current={entry.current === true ? "step" : undefined}
          className="relative grid grid-cols-[1.5rem_1fr] pb-5 last:pb-0 before:absolute before:top-2 before:bottom-0 before:left-[0.4375rem] before:w-px before:bg-edge last:before:hidden"
        >
          <span
            aria-hidden="true"
            className={`relative mt-1 size-[0.9375rem] border-2 ${
              entry.current === true
                ? "border-dye bg-dye"
                : entry.ahead === true
                  ? "border-edge bg-paper"
                  : "border-ink bg-ink"
            }`}
          />
          <div className="pl-2">
            <p className="flex flex-wrap items-baseline justify-between gap-x-4">
              <span className={entry.ahead === true ? "text-iron" : "font-semibold"}>{entry.title}</span>
              <span className="text-sm numerals text-iron">{entry.when}</span>
            </p>
            {entry.text !== undefined && <div className="mt-0.5 max-w-text">{entry.text}</div>}
          </div>
        </li>
      ))}
    </ol>
  );
}
