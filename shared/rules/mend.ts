import type { Build } from "../catalogue/build.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import type { Assignment } from "./problem.ts";
import { minimalConflict } from "./conflict.ts";
import type { EvaluationContext, Mend } from "./evaluation.ts";
import { withWanted, type Wanted } from "./explain.ts";
import { isPossible } from "./open-options.ts";
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

export interface MendQuestion {
  build: Build;
  /** The answers with the wanted option in place. */
  target: Assignment;
  /** The wanted option's choice, if there is one. */
  held: number | null;
  numbers: Readonly<Record<string, string>>;
}

interface Candidate {
  assignment: Assignment;
  /** Indices of the changed or dropped choices, in catalogue order. */
  changed: number[];
  totals: Totals | null;
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
  const totals = (assignment: Assignment): Totals | null => totalsOf(context, compiled, assignment, numbers);
  const now = totals(compiled.assignment(build.answers));
  let best: Candidate | null = null;
  for (const start of starts(compiled, target, mine)) {
    const dropped = differing(target, start);
    const most = best === null ? Number.POSITIVE_INFINITY : best.changed.length - dropped.length;
    for (const freed of leastRelaxations(compiled, start, numbers, { fixed: mine, most })) {
      const floor = best === null || best.changed.length > dropped.length + freed.length ? null : best;
      best = cheapestFilling({ compiled, target, start, freed, numbers, totals, now }, floor);
    }
  }
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

/**
 * All smallest sets of answers (of at most `most`) that leave a valid build when they are freed: every minimal conflict must be
 * hit, so the sets grow by one element of a conflict at a time, breadth first.
 */
function leastRelaxations(
  compiled: CompiledCatalogue,
  start: Assignment,
  numbers: Readonly<Record<string, string>>,
  limits: { fixed: ReadonlySet<number>; most: number },
): number[][] {
  const { fixed, most } = limits;
  const held = new Set([...fixed, compiled.familyChoice]);
  let layer: number[][] = [[]];
  for (let size = 0; size <= most && layer.length > 0; size += 1) {
    const found: number[][] = [];
    const next = new Map<string, number[]>();
    for (const freed of layer) {
      const given = without(start, freed);
      const conflict = minimalConflict({ compiled, given, numbers, held });
      if (conflict === null) {
        found.push(freed);
        continue;
      }
      for (const choice of conflict.choices) {
        const grown = [...freed, choice].sort((a, b) => a - b);
        next.set(grown.join(" "), grown);
      }
    }
    if (found.length > 0) return found;
    layer = [...next.values()];
  }
  return [];
}

function without(assignment: Assignment, freed: readonly number[]): Assignment {
  const given = assignment.slice();
  for (const choice of freed) given[choice] = -1;
  return given;
}

interface Filling {
  compiled: CompiledCatalogue;
  target: Assignment;
  start: Assignment;
  freed: readonly number[];
  numbers: Readonly<Record<string, string>>;
  totals: (assignment: Assignment) => Totals | null;
  now: Totals | null;
}

/** The cheapest way to answer the freed choices anew, or the best known if that is cheaper. */
function cheapestFilling(filling: Filling, known: Candidate | null): Candidate | null {
  const { compiled, target, start, freed, numbers, totals } = filling;
  let best = known;
  const given = without(start, freed);
  const fill = (at: number): void => {
    const choice = freed[at];
    if (choice === undefined) {
      const candidate = {
        assignment: given.slice(),
        changed: differing(target, given),
        totals: totals(given),
      };
      if (best !== null && compareCandidates(candidate, best) >= 0) return;
      if (isPossible(compiled, given, numbers)) best = candidate;
      return;
    }
    const options = compiled.choices[choice]?.options ?? [];
    for (const option of options.keys()) {
      if (option === target[choice]) continue;
      given[choice] = option;
      if (at + 1 === freed.length || isPossible(compiled, given, numbers)) fill(at + 1);
    }
    given[choice] = -1;
  };
  fill(0);
  return best;
}

/** Negative where a is the better mend: price, then days, then catalogue order; both change the same number of answers. */
function compareCandidates(a: Candidate, b: Candidate): number {
  const count = a.changed.length - b.changed.length;
  if (count !== 0) return count;
  if (a.totals !== null && b.totals !== null) {
    const price = a.totals.priceCents - b.totals.priceCents;
    if (price !== 0) return price;
    const days = a.totals.ships.day - b.totals.ships.day;
    if (days !== 0) return days;
  }
  for (const [at, choice] of a.changed.entries()) {
    const other = b.changed[at] ?? -1;
    if (choice !== other) return choice - other;
    const option = (a.assignment[choice] ?? -1) - (b.assignment[choice] ?? -1);
    if (option !== 0) return option;
  }
  return 0;
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
