import { useEffect, useRef } from "react";
import { Button } from "#web/components/button.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk, type Changed } from "./build-desk.tsx";
import { choiceName, optionName } from "./build-words.ts";

/** Mends that focus has followed: another step, or a redo, shows the same strip again and leaves the focus alone. */
const focusMoved = new WeakSet<Changed>();

/** After a mend: what it changed besides the wanted option, each with the way to it. Focus goes to what changed. */
export function WhatChanged() {
  const { current, changed, search, undo, forgetChanged } = useBuildDesk();
  const { catalogue } = current;
  const strip = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (changed === null || focusMoved.has(changed)) return;
    focusMoved.add(changed);
    const onThisStep = changed.changes
      .map(({ choice, to }) => (to === null ? null : document.getElementById(`${choice}-${to}`)))
      .find((control) => control !== null);
    (onThisStep ?? strip.current)?.focus();
  }, [changed]);
  if (changed === null) return null;
  return (
    <div
      ref={strip}
      tabIndex={-1}
      role="group"
      aria-label="What changed with it"
      className="flex flex-wrap items-center gap-x-4 gap-y-1 border-2 border-b-0 border-dye bg-dye-wash px-3 py-1.5"
    >
      <ul className="flex min-w-0 grow flex-wrap gap-x-6 text-sm">
        {changed.changes.map(({ choice, from, to }) => {
          const step = catalogue.steps.find(({ choices }) => choices.includes(choice));
          const name = choiceName(catalogue, choice);
          return (
            <li key={choice}>
              {step === undefined ? (
                name
              ) : (
                <TextLink
                  to={{ pathname: stepPath(step.id), search }}
                  className="inline-flex min-h-6 items-center"
                >
                  {name}
                </TextLink>
              )}
              : <s className="text-iron">{optionName(catalogue, choice, from)}</s>{" "}
              <span className="font-medium">
                {to === null ? "not answered" : optionName(catalogue, choice, to)}
              </span>
            </li>
          );
        })}
      </ul>
      {undo !== null && (
        <Button look="quiet" onClick={undo}>
          Undo
        </Button>
      )}
      <Button look="quiet" onClick={forgetChanged}>
        Close
      </Button>
    </div>
  );
}
