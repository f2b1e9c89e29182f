import { Notice } from "#web/components/notice.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { choiceName, stopCount } from "./build-words.ts";

/** What still stands between the build and the cart, each with the way to it; nothing when it may be ordered. */
export function WhatIsMissing() {
  const { current, evaluation, search } = useBuildDesk();
  const { catalogue } = current;
  const { unanswered, findings } = evaluation;
  if (evaluation.orderable) return null;
  const stops = findings.filter(({ severity }) => severity === "stop");
  return (
    <div className="space-y-3">
      {stopCount(evaluation) > 0 && (
        <Notice kind="stop" title="Cannot be made as it stands">
          <ul>
            {stops.map(({ rule, sentence, step }) => (
              <li key={rule}>
                {sentence}{" "}
                <TextLink to={{ pathname: stepPath(step), search }} className="inline-block py-0.5">
                  Mend it
                </TextLink>
              </li>
            ))}
          </ul>
        </Notice>
      )}
      {unanswered.length > 0 && (
        <Notice
          kind="waiting"
          title={
            unanswered.length === 1
              ? "One choice left to answer"
              : `${unanswered.length} choices left to answer`
          }
        >
          <ul className="flex flex-wrap gap-x-5">
            {unanswered.map((choice) => (
              <li key={choice}>
                <TextLink
                  to={{ pathname: stepPath(stepOf(choice, catalogue.steps)), search, hash: `#${choice}` }}
                  className="inline-block py-0.5"
                >
                  {choiceName(catalogue, choice)}
                </TextLink>
              </li>
            ))}
          </ul>
        </Notice>
      )}
    </div>
  );
}

/** The step in which a choice is made; the first where no step has it. */
export function stepOf(choice: string, steps: readonly { id: string; choices: string[] }[]): string {
  return (steps.find(({ choices }) => choices.includes(choice)) ?? steps[0])?.id ?? "";
}
