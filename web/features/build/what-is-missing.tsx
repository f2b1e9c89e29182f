import { Notice } from "#web/components/notice.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { choiceName } from "./build-words.ts";

/** The choices left to answer, each with the way to it. */
export function WhatIsMissing() {
  const { current, evaluation, search } = useBuildDesk();
  const { catalogue } = current;
  const { unanswered } = evaluation;
  if (unanswered.length === 0) return null;
  return (
    <Notice
      kind="waiting"
      title={
        unanswered.length === 1 ? "One choice left to answer" : `${unanswered.length} choices left to answer`
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
  );
}

/** The step in which a choice is made; the first where no step has it. */
export function stepOf(choice: string, steps: readonly { id: string; choices: string[] }[]): string {
  return (steps.find(({ choices }) => choices.includes(choice)) ?? steps[0])?.id ?? "";
}
