import { amountsOf } from "./amounts.ts";
import type { CompiledCatalogue } from "./compile.ts";
import type { EvaluationContext } from "./evaluation.ts";
import { isPossible, openFlags } from "./open-options.ts";
import type { Assignment } from "./problem.ts";
import type { Numbers } from "./rule-table.ts";
import { totalsOf, type Totals } from "./totals.ts";

/** A mend as answers. */
export interface Candidate {
  assignment: Assignment;
  /** Indices of the changed or dropped choices, in catalogue order. */
  changed: number[];
  totals: Totals | null;
}

export interface Filling {
  context: EvaluationContext;
  compiled: CompiledCatalogue;
  /** The answers with the wanted option in place. */
  target: Assignment;
  /** The same in the family that is tried, without the answers that it does not have. */
  start: Assignment;
  /** Choices to answer anew. */
  freed: readonly number[];
  numbers: Numbers;
}

/** The cheapest way to answer the freed choices anew, or the best known if that is cheaper. */
export function cheapestFilling(filling: Filling, known: Candidate | null): Candidate | null {
  const { context, compiled, target, start, freed, numbers } = filling;
  const given = start.slice();
  for (const choice of freed) given[choice] = -1;
  if (freed.length === 0) {
    const candidate = candidateOf(filling, given);
    const better = known === null || compareCandidates(candidate, known) < 0;
    return better && isPossible(compiled, given, numbers) ? candidate : known;
  }
  const amounts = amountsBy(filling);
  const leastAfter = leastAmounts(compiled, freed, amounts);
  let best = known;
  const fill = (at: number, spent: number): void => {
    const choice = freed[at];
    if (choice === undefined) {
      const candidate = candidateOf(filling, given);
      if (best === null || compareCandidates(candidate, best) < 0) best = candidate;
      return;
    }
    const open = openFlags(compiled, given, numbers);
    const from = compiled.offsets[choice] ?? 0;
    for (let option = 0; from + option < (compiled.offsets[choice + 1] ?? from); option += 1) {
      if (open[from + option] !== 1 || option === target[choice]) continue;
      const price = spent + (amounts?.[from + option] ?? 0);
      const tooDear =
        amounts !== null &&
        best?.totals !== null &&
        best !== null &&
        price + (leastAfter[at + 1] ?? 0) > best.totals.priceCents;
      if (tooDear) continue;
      given[choice] = option;
      fill(at + 1, price);
    }
    given[choice] = -1;
  };
  fill(0, totalsOf(context, compiled, given, numbers)?.priceCents ?? 0);
  return best;
}

/** By flat option index: amounts of the family that is tried; null without a family. */
function amountsBy({ context, compiled, start }: Filling): Float64Array | null {
  const family = start[compiled.familyChoice] ?? -1;
  return family < 0 ? null : amountsOf(compiled, context.priceList, family).options;
}

/** By place in the freed choices: the least that it and those after it can come to. */
function leastAmounts(
  compiled: CompiledCatalogue,
  freed: readonly number[],
  amounts: Float64Array | null,
): number[] {
  const least = [0];
  for (const choice of [...freed].reverse()) {
    const own = amounts?.slice(compiled.offsets[choice], compiled.offsets[choice + 1]) ?? [0];
    least.unshift((least[0] ?? 0) + Math.min(...own));
  }
  return least;
}

function candidateOf({ context, compiled, target, numbers }: Filling, given: Assignment): Candidate {
  return {
    assignment: given.slice(),
    changed: [...target.keys()].filter((choice) => target[choice] !== given[choice]),
    totals: totalsOf(context, compiled, given, numbers),
  };
}

/** Negative where a is the better mend: number of changes, then price, then days, then catalogue order. */
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
