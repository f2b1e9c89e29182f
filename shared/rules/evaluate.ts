import type { Build } from "../catalogue/build.ts";
import { priceBuild } from "../pricing/price-build.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import type { Assignment } from "./problem.ts";
import type { ChoiceState, Evaluation, EvaluationContext, OptionEffect } from "./evaluation.ts";
import { figuresOf, findingsOf } from "./findings.ts";
import { openOptions } from "./open-options.ts";
import { createTotals, daysBetween, type Totals } from "./totals.ts";

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
  const totalsOf = createTotals(context, compiled, build.numbers);
  const totals = totalsOf(assignment);
  const open = openOptions(compiled, assignment, build.numbers);
  const findings = findingsOf(compiled, assignment, reading);
  const unanswered = unansweredChoices(compiled, assignment);
  return {
    build,
    choices: choiceStates(compiled, assignment, open, (trial) => effectOf(totals, totalsOf(trial))),
    figures: figuresOf(compiled, reading, totals?.weight ?? null),
    findings,
    price:
      totals === null
        ? null
        : priceBuild(context.priceList, context.catalogue, knownBuild(compiled, assignment, build)),
    weight: totals?.weight ?? null,
    shipsOn: totals?.shipsOn ?? null,
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

/** Unanswered choices in the order of the steps; a choice of no step comes last. */
function unansweredChoices(compiled: CompiledCatalogue, assignment: Assignment): string[] {
  const stepped = compiled.catalogue.steps.flatMap((step) => step.choices);
  const order = new Set([...stepped, ...compiled.choices.map((choice) => choice.id)]);
  return [...order].filter((id) => {
    const index = compiled.choiceIndex.get(id);
    return index !== undefined && assignment[index] === -1;
  });
}

function effectOf(now: Totals | null, then: Totals | null): OptionEffect {
  if (now === null || then === null) return { priceCents: null, weight: null, days: null };
  return {
    priceCents: then.priceCents - now.priceCents,
    weight: then.weight - now.weight,
    days: daysBetween(now.shipsOn, then.shipsOn),
  };
}

function choiceStates(
  compiled: CompiledCatalogue,
  assignment: Assignment,
  open: Uint8Array,
  effect: (trial: Assignment) => OptionEffect,
): ChoiceState[] {
  const family = compiled.families[assignment[compiled.familyChoice] ?? -1];
  return compiled.choices.map((choice, index) => {
    const trial = assignment.slice();
    const options = choice.options.flatMap((option, at) => {
      if (family !== undefined && option.families?.includes(family.id) === false) return [];
      trial[index] = at;
      const counted = index === compiled.familyChoice ? existingOnly(compiled, trial) : trial;
      return [
        {
          option: option.id,
          chosen: assignment[index] === at,
          open: open[(compiled.offsets[index] ?? 0) + at] === 1,
          effect: effect(counted),
        },
      ];
    });
    return { choice: choice.id, options };
  });
}

/** The assignment without the answers that its family does not have. */
export function existingOnly(compiled: CompiledCatalogue, assignment: Assignment): Assignment {
  const family = compiled.families[assignment[compiled.familyChoice] ?? -1];
  if (family === undefined) return assignment;
  return assignment.map((at, index) => {
    const option = compiled.choices[index]?.options[at];
    return option?.families?.includes(family.id) === false ? -1 : at;
  });
}
