import type { ReactNode } from "react";
import { classNames } from "#web/components/class-names.ts";
import { date, money } from "#web/lib/format.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { BuildTitleBlock } from "./build-title-block.tsx";
import { stateWords } from "./build-words.ts";
import { FiguresPanel } from "./figures-panel.tsx";
import { FindingsPanel } from "./findings-panel.tsx";
import { PriceByLine } from "./price-by-line.tsx";
import { StepList } from "./step-list.tsx";
import { useUndoKeys } from "./use-undo-keys.ts";
import { WhatChanged } from "./what-changed.tsx";

interface BuildSheetProps {
  /** Id of the step on the screen. */
  here: string;
  /** The one main action, at the end of the title block. */
  action: ReactNode;
  children: ReactNode;
}

/** The sheet of a build: its steps, what is asked, what comes of it, and the title block that stays in sight at its foot. */
export function BuildSheet({ here, action, children }: BuildSheetProps) {
  const { undo, redo, changed } = useBuildDesk();
  useUndoKeys(undo, redo);
  return (
    <>
      <div className="grid gap-x-8 gap-y-8 lg:grid-cols-[13rem_minmax(0,1fr)] xl:grid-cols-[13rem_minmax(0,1fr)_20rem]">
        <div className="lg:sticky lg:top-4 lg:self-start">
          <StepList here={here} />
        </div>
        <div className="min-w-0">{children}</div>
        <div
          className={classNames(
            "space-y-6 lg:col-start-2 xl:sticky xl:top-4 xl:col-start-3 xl:self-start xl:overflow-y-auto xl:pr-1 xl:pb-2",
            // Ends above what stays in sight at the foot, so that nothing in it takes focus behind that.
            changed === null ? "xl:max-h-[calc(100dvh-8rem)]" : "xl:max-h-[calc(100dvh-12rem)]",
          )}
        >
          <div className="xl:hidden">
            <BuildTitleBlock />
          </div>
          <FindingsPanel here={here} />
          <PriceByLine />
          <FiguresPanel />
        </div>
      </div>
      <div className="sticky bottom-0 z-20 -mx-4 mt-8 sm:mx-0 print:static">
        <WhatChanged />
        <div className="bg-paper xl:flex xl:items-stretch xl:gap-3 xl:pb-3">
          <div className="hidden grow xl:block">
            <BuildTitleBlock />
          </div>
          <PhoneStrip action={action} />
          <div className="hidden xl:flex">{action}</div>
        </div>
      </div>
    </>
  );
}

/** Price, date and the way on, where there is no room for the whole title block. */
function PhoneStrip({ action }: { action: ReactNode }) {
  const { evaluation } = useBuildDesk();
  const { price, shipsOn } = evaluation;
  return (
    <div className="flex items-center justify-between gap-3 border-2 border-ink bg-sheet px-3 py-2 xl:hidden">
      <p className="min-w-0 leading-tight">
        <span className="block text-xl numerals">
          {price === null ? "No price yet" : money(price.totalCents)}
        </span>
        <span className="block truncate text-sm text-iron">
          {shipsOn === null ? `${stateWords(evaluation)} answered` : `Ships about ${date(shipsOn)}`}
        </span>
      </p>
      {action}
    </div>
  );
}
