import type { Build } from "../catalogue/build.ts";
import { priceBuild } from "../pricing/price-build.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import type { Assignment } from "./problem.ts";
import type { ChoiceState, Evaluation, EvaluationContext, OptionEffect } from "./evaluation.ts";
import { figuresOf, findingsOf } from "./findings.ts";
import { openFlags } from "./open-options.ts";
import { createEffects } from "./totals.ts";

/**
 * Everything about a partial build: for every option whether it is open and what it changes; figures, findings, price, weight,
 * ship date. Pure: the same context and build give the same answer. Answers that the catalogue does not have, or that do not
 * exist in the chosen family, count as not given. Throws RangeError on a catalogue that is not sound or a price list with a gap.
 */
export function evaluate(context: EvaluationContext, build: Build): Evaluation {
  const compiled = compileCatalogue(context.catalogue);
  const assignment = compiled.assignment(build.answers);
  const family = assignment[compiled.familyChoice] ?? -1;
  const reading = compiled.reading(family, (choice) => assignment[choice] ?? -1, build.numbers);
  const { totals, effectOf } = createEffects(context, compiled, assignment, build.numbers);
  const open = openFlags(compiled, assignment, build.numbers);
  const findings = findingsOf(compiled, assignment, build.numbers);
  const unanswered = unansweredChoices(compiled, assignment);
  return {
    build,
    choices: choiceStates(compiled, assignment, open, effectOf),
    figures: figuresOf(compiled, reading, totals?.weight ?? null),
    findings,
    price:
      totals === null
        ? null
        : priceBuild(context.priceList, context.catalogue, knownBuild(compiled, assignment, build)),
    weight: totals?.weight ?? null,
    shipsOn: totals?.ships.date ?? null,
    minutes: totals?.minutes ?? {},
    leadDays: totals?.leadDays ?? 0,
    unanswered,
    orderable: unanswered.length === 0 && findings.every(({ severity }) => severity !== "stop"),
  };
}

/** The build with the answers that count. */
function knownBuild(compiled: CompiledCatalogue, assignment: Assignment, build: Build): Build {
  const answers = compiled.choices.flatMap((choice, index) => {
    const option = choice.options[assignment[index] ?? -1];
    return option === undefined ? [] : [[choice.id, option.id] as const];
  });
  return { ...build, answers: Object.fromEntries(answers) };
}

/** Unanswered choices in the order of the steps. */
function unansweredChoices(compiled: CompiledCatalogue, assignment: Assignment): string[] {
  return compiled.order.filter((id) => assignment[compiled.choiceIndex.get(id) ?? -1] === -1);
}

function choiceStates(
  compiled: CompiledCatalogue,
  assignment: Assignment,
  open: Uint8Array,
  effectOf: (choice: number, at: number) => OptionEffect,
): ChoiceState[] {
  const family = assignment[compiled.familyChoice] ?? -1;
  return compiled.choices.map((choice, index) => {
    const from = compiled.offsets[index] ?? 0;
    const options: ChoiceState["options"] = [];
    choice.options.forEach((option, at) => {
      if (!compiled.exists(family, index, at)) return;
      options.push({
        option: option.id,
        chosen: assignment[index] === at,
        open: open[from + at] === 1,
        effect: effectOf(index, at),
      });
    });
    return { choice: choice.id, options };
  });
}
