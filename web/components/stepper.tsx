import { useState } from "react";
import { Link, type To } from "react-router-dom";
import { StateMark } from "./state-mark.tsx";
import { classNames } from "./class-names.ts";

export interface Step {
  id: string;
  name: string;
  to: To;
  /** done: answered. attention: breaks a rule. open: not answered yet. */
  state: "done" | "attention" | "open";
  /** The answer so far, in a few words. */
  answer?: string;
}

interface StepperProps {
  /** Name of the landmark, such as "Steps of the build". */
  label: string;
  steps: Step[];
  /** Id of the step on the screen. */
  current: string;
}

const stateWords = { done: "answered", attention: "has a stop", open: "not answered" } as const;

/** Steps down the side on wide screens; on phones one line with the count, opening to the list. Any step may be opened. */
export function Stepper({ label, steps, current }: StepperProps) {
  const [open, setOpen] = useState(false);
  const index = steps.findIndex((step) => step.id === current);
  const [before, here, after] = [steps[index - 1], steps[index], steps[index + 1]];
  return (
    <nav aria-label={label}>
      <div className="flex items-stretch border-2 border-ink bg-sheet lg:hidden">
        <Turn step={before} word="Back to" sign="m9 1-7 7 7 7" />
        <button
          type="button"
          aria-expanded={open}
          onClick={() => {
            setOpen(!open);
          }}
          className="min-h-12 min-w-0 grow px-3 py-1.5 text-left"
        >
          <span className="block cell-label">
            Step {index + 1} of {steps.length}
          </span>
          <span className="block truncate font-semibold">{here?.name}</span>
        </button>
        <Turn step={after} word="On to" sign="m2 1 7 7-7 7" />
      </div>
      <ol
        className={classNames(
          "border-ink max-lg:border-x-2 max-lg:border-b-2 lg:border-t-2",
          !open && "max-lg:hidden",
        )}
      >
        {steps.map((step, position) => (
          <li key={step.id} className="border-b border-rule">
            <Link
              to={step.to}
              aria-current={step.id === current ? "step" : undefined}
              onClick={() => {
                setOpen(false);
              }}
              className={classNames(
                "grid min-h-target grid-cols-[1.75rem_1fr_auto] items-center gap-x-1 py-1.5 pr-2 pl-2 no-underline hover:bg-wash",
                step.id === current && "bg-dye-wash shadow-[inset_4px_0_0_var(--dye)]",
              )}
            >
              <span className="text-lg numerals text-iron">{position + 1}</span>
              <span className="min-w-0">
                <span className={classNames("block", step.id === current && "font-semibold")}>
                  {step.name}
                </span>
                {step.answer !== undefined && (
                  <span className="block truncate text-sm text-iron">{step.answer}</span>
                )}
              </span>
              <StateMark
                kind={step.state === "done" ? "pass" : step.state === "attention" ? "stop" : "waiting"}
                className="size-3.5"
              />
              <span className="sr-only">, {stateWords[step.state]}</span>
            </Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}

function Turn({ step, word, sign }: { step: Step | undefined; word: string; sign: string }) {
  if (step === undefined) return null;
  return (
    <Link
      to={step.to}
      aria-label={`${word} ${step.name}`}
      className="flex min-w-12 items-center justify-center border-rule first:border-r last:border-l hover:bg-wash"
    >
      <svg viewBox="0 0 11 16" aria-hidden="true" className="h-4">
        <path d={sign} fill="none" stroke="currentColor" strokeWidth="2" />
      </svg>
    </Link>
  );
}
