import type { Build } from "../catalogue/build.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import type { EvaluationContext, Mend } from "./evaluation.ts";
import { withWanted, type Wanted } from "./explain.ts";
import { cheapestFilling, type Candidate, type Filling } from "./filling.ts";
import { isPossible } from "./open-options.ts";
import type { Assignment } from "./problem.ts";
import { leastRelaxations } from "./relaxation.ts";
import type { Numbers } from "./rule-table.ts";
import { existingOnly, totalsOf, type Totals } from "./totals.ts";

/**
 * The cheapest mend that lets a closed option in: fewest answers changed or dropped, then least net price increase, then days,
 * then catalogue order. Answers marked mine stay; typed numbers stay; an answer is dropped only where the new family does
 * not have it. Null where there is none, or nothing to mend. Throws RangeError on an unknown choice or option.
 */
export function mend(context: EvaluationContext, build: Build, wanted: Wanted): Mend | null {
  const compiled = compileCatalogue(context.catalogue);
  const { choice, assignment } = withWanted(compiled, build, wanted);
  return cheapestMend(context, compiled, { build, target: assignment, held: choice, numbers: build.numbers });
}

/**
 * The cheapest mend of a whole build that no longer stands, such as one saved under an older catalogue: as `mend`, with every
 * answer dropped that the catalogue does not have any more. Null where there is none, or nothing to mend.
 */
export function repair(context: EvaluationContext, build: Build): Mend | null {
  const compiled = compileCatalogue(context.catalogue);
  const target = compiled.known(build.answers);
  const gone = Object.entries(build.answers).flatMap(([choice, from]) => {
    const index = compiled.choiceIndex.get(choice);
    return index !== undefined && target[index] === -1 ? [{ choice, from, to: null }] : [];
  });
  if (gone.some(({ choice }) => build.mine.includes(choice))) return null;
  if (isPossible(compiled, target, build.numbers)) {
    const unchanged = (target[compiled.familyChoice] ?? -1) < 0 ? null : 0;
    return gone.length === 0 ? null : { changes: gone, priceCents: unchanged, days: unchanged };
  }
  const found = cheapestMend(context, compiled, { build, target, held: null, numbers: build.numbers });
  return found === null ? null : { ...found, changes: [...gone, ...found.changes] };
}

export interface MendQuestion {
  build: Build;
  /** The answers with the wanted option in place. */
  target: Assignment;
  /** The wanted option's choice, if there is one. */
  held: number | null;
  numbers: Numbers;
}

export function cheapestMend(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  question: MendQuestion,
): Mend | null {
  const { target, numbers, build } = question;
  if (isPossible(compiled, target, numbers)) return null;
  const mine = new Set(build.mine.flatMap((id) => compiled.choiceIndex.get(id) ?? []));
  if (question.held !== null) mine.add(question.held);
  let best: Candidate | null = null;
  for (const start of starts(compiled, target, mine)) {
    const dropped = differing(target, start).length;
    const most = best === null ? Number.POSITIVE_INFINITY : best.changed.length - dropped;
    for (const freed of leastRelaxations(compiled, start, numbers, { fixed: mine, most })) {
      const floor: Candidate | null =
        best === null || best.changed.length > dropped + freed.length ? null : best;
      const filling: Filling = { context, compiled, target, start, freed, numbers };
      best = cheapestFilling(filling, floor);
    }
  }
  const now = totalsOf(context, compiled, compiled.assignment(build.answers), numbers);
  return best === null ? null : describe(compiled, target, best, now);
}

/**
 * The answers to start from, one for each family that may be tried: the same family, or another with the answers dropped that it
 * does not have. A family is left out where it would drop an answer that stays.
 */
function starts(compiled: CompiledCatalogue, target: Assignment, mine: ReadonlySet<number>): Assignment[] {
  const { familyChoice } = compiled;
  const chosen = target[familyChoice] ?? -1;
  const families =
    chosen < 0 || mine.has(familyChoice)
      ? [chosen]
      : [chosen, ...compiled.families.keys()].filter((f, at) => at === 0 || f !== chosen);
  return families.flatMap((family) => {
    const moved = target.slice();
    moved[familyChoice] = family;
    const start = existingOnly(compiled, moved);
    const lost = start.some((at, index) => at !== moved[index] && mine.has(index));
    return lost ? [] : [start];
  });
}

/** Indices at which two assignments differ. */
function differing(before: Assignment, after: Assignment): number[] {
  return [...before.keys()].filter((index) => before[index] !== after[index]);
}

function describe(
  compiled: CompiledCatalogue,
  target: Assignment,
  best: Candidate,
  now: Totals | null,
): Mend {
  const idOf = (choice: number, at: number): string | null =>
    compiled.choices[choice]?.options[at]?.id ?? null;
  return {
    changes: best.changed.map((choice) => ({
      choice: compiled.choices[choice]?.id ?? "",
      from: idOf(choice, target[choice] ?? -1) ?? "",
      to: idOf(choice, best.assignment[choice] ?? -1),
    })),
    priceCents: now === null || best.totals === null ? null : best.totals.priceCents - now.priceCents,
    days: now === null || best.totals === null ? null : best.totals.ships.day - now.ships.day,
  };
}
