import type { Choice } from "#shared/catalogue/catalogue.ts";
import type { ChoiceState } from "#shared/rules/evaluation.ts";
import { OptionList, type OptionRow } from "#web/components/option-list.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { ChoiceHelp } from "./choice-help.tsx";
import { ClosedReason, MendButton } from "./closed-option.tsx";
import { optionEffects } from "./option-effects.ts";
import { SizeChart } from "./size-chart.tsx";

/** Above so many sizes, options that are named by nothing else, a choice is shown as a chart. */
const mostRows = 24;
const isSize = (name: string): boolean => /^\d+\.\d+ in$/.test(name);

interface ChoiceQuestionProps {
  choice: Choice;
  state: ChoiceState;
}

/** One choice of a step: every option with its effect, closed ones with their reason and mend. */
export function ChoiceQuestion({ choice, state }: ChoiceQuestionProps) {
  const { current, choose } = useBuildDesk();
  if (state.options.length > mostRows && choice.options.every(({ name }) => isSize(name)))
    return <SizeChart choice={choice} state={state} />;
  const chosen = state.options.find((option) => option.chosen)?.option ?? null;
  const rows = state.options.map((option): OptionRow => {
    const described = choice.options.find(({ id }) => id === option.option);
    const effects = optionEffects(current, choice.id, option);
    const wanted = { choice: choice.id, option: option.option };
    return {
      value: option.option,
      name: described?.name ?? option.option,
      description: described?.description === "" ? undefined : described?.description,
      effects: effects.length === 0 ? undefined : <EffectParts parts={effects} />,
      // What is chosen in a build that breaks a rule is answered for by the notice above the step.
      closed:
        option.open || option.chosen
          ? undefined
          : { reason: <ClosedReason {...wanted} />, mend: <MendButton {...wanted} /> },
    };
  });
  return (
    <OptionList
      legend={choice.question}
      hint={<ChoiceHelp choice={choice} single={state.options.length === 1} />}
      name={choice.id}
      options={rows}
      value={chosen}
      onChoose={(option) => {
        choose(choice.id, option);
      }}
    />
  );
}

function EffectParts({ parts }: { parts: string[] }) {
  return parts.map((part) => (
    <span key={part} className="whitespace-nowrap">
      {part}
    </span>
  ));
}
