import { workCentreSchema, type Family, type Option } from "../catalogue/catalogue.ts";
import { blockWeight } from "../geometry/weight.ts";
import { amountsOf } from "./amounts.ts";
import type { CompiledCatalogue } from "./compile.ts";
import type { EvaluationContext, OptionEffect } from "./evaluation.ts";
import type { Assignment } from "./problem.ts";
import type { Numbers } from "./rule-table.ts";
import { shipDateOf, type Minutes, type ShipDate } from "./ship-dates.ts";

/** What a partial build with a family comes to. */
export interface Totals {
  priceCents: number;
  weight: number;
  minutes: Minutes;
  leadDays: number;
  ships: ShipDate;
}

/** Totals of a partial build; null without a family. */
export function totalsOf(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  assignment: Assignment,
  numbers: Numbers,
): Totals | null {
  const familyIndex = assignment[compiled.familyChoice] ?? -1;
  const family = compiled.families[familyIndex];
  if (family === undefined) return null;
  const amounts = amountsOf(compiled, context.priceList, familyIndex);
  let priceCents = amounts.base;
  let optionWeight = 0;
  let leadDays = family.leadDays;
  const minutes: Minutes = { ...family.minutes };
  for (let choice = 0; choice < assignment.length; choice += 1) {
    const at = assignment[choice] ?? -1;
    const option = compiled.choices[choice]?.options[at];
    if (option === undefined || choice === compiled.familyChoice) continue;
    priceCents += amounts.options[(compiled.offsets[choice] ?? 0) + at] ?? 0;
    optionWeight += option.weight;
    leadDays = Math.max(leadDays, option.leadDays);
    addMinutes(minutes, option, 1);
  }
  return {
    priceCents,
    weight:
      optionWeight +
      ironWeight(compiled, family, compiled.ironWeights(familyIndex, numbers), assignment, numbers),
    minutes,
    leadDays,
    ships: shipDateOf(context.load, context.today, minutes, leadDays),
  };
}

/** Effects of other options against a build as it stands; one instance serves one build. */
export function createEffects(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  assignment: Assignment,
  numbers: Numbers,
): { totals: Totals | null; effectOf: (choice: number, at: number) => OptionEffect } {
  const totals = totalsOf(context, compiled, assignment, numbers);
  const familyIndex = assignment[compiled.familyChoice] ?? -1;
  const family = compiled.families[familyIndex];
  if (totals === null || family === undefined) {
    return { totals, effectOf: () => ({ priceCents: null, weight: null, days: null }) };
  }
  const { options: amounts } = amountsOf(compiled, context.priceList, familyIndex);
  const weights = compiled.ironWeights(familyIndex, numbers);
  const iron = ironWeight(compiled, family, weights, assignment, numbers);
  const leadWithout = leadsWithout(compiled, family, assignment);
  const trial = assignment.slice();

  /** Days by what changes: the work of the option, that of the answer it replaces, and the longest lead. */
  const known = new Map<string, number>();
  const daysOf = (choice: number, option: Option, at: number): number => {
    const from = compiled.offsets[choice] ?? 0;
    const answer = assignment[choice] ?? -1;
    const work = compiled.works[from + at] ?? 0;
    const before = answer < 0 ? 0 : (compiled.works[from + answer] ?? 0);
    const leadDays = Math.max(leadWithout(choice), option.leadDays);
    if (work === before && leadDays === totals.leadDays) return 0;
    const key = `${work} ${before} ${leadDays}`;
    const found = known.get(key);
    if (found !== undefined) return found;
    const minutes = { ...totals.minutes };
    addMinutes(minutes, option, 1);
    const replaced = compiled.choices[choice]?.options[answer];
    if (replaced !== undefined) addMinutes(minutes, replaced, -1);
    const days = shipDateOf(context.load, context.today, minutes, leadDays).day - totals.ships.day;
    known.set(key, days);
    return days;
  };

  const effectOf = (choice: number, at: number): OptionEffect => {
    const answer = assignment[choice] ?? -1;
    if (at === answer) return { priceCents: 0, weight: 0, days: 0 };
    trial[choice] = at;
    try {
      if (choice === compiled.familyChoice) {
        const then = totalsOf(context, compiled, existingOnly(compiled, trial), numbers);
        return then === null ? { priceCents: null, weight: null, days: null } : differenceOf(totals, then);
      }
      const { options = [] } = compiled.choices[choice] ?? {};
      const option = options[at];
      const before = options[answer];
      const from = compiled.offsets[choice] ?? 0;
      const lighter =
        compiled.borings[choice] === 1 ? ironWeight(compiled, family, weights, trial, numbers) - iron : 0;
      return {
        priceCents: (amounts[from + at] ?? 0) - (answer < 0 ? 0 : (amounts[from + answer] ?? 0)),
        weight: (option?.weight ?? 0) - (before?.weight ?? 0) + lighter,
        days: option === undefined ? 0 : daysOf(choice, option, at),
      };
    } finally {
      trial[choice] = answer;
    }
  };
  return { totals, effectOf };
}

function differenceOf(now: Totals, then: Totals): OptionEffect {
  return {
    priceCents: then.priceCents - now.priceCents,
    weight: then.weight - now.weight,
    days: then.ships.day - now.ships.day,
  };
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

/** The longest lead of the family and of all answers but one choice's. */
function leadsWithout(
  compiled: CompiledCatalogue,
  family: Family,
  assignment: Assignment,
): (choice: number) => number {
  let longest = family.leadDays;
  let holder = -1;
  let second = family.leadDays;
  for (let choice = 0; choice < assignment.length; choice += 1) {
    const option = compiled.choices[choice]?.options[assignment[choice] ?? -1];
    if (option === undefined || choice === compiled.familyChoice) continue;
    if (option.leadDays > longest) {
      second = longest;
      longest = option.leadDays;
      holder = choice;
    } else second = Math.max(second, option.leadDays);
  }
  return (choice) => (choice === holder ? second : longest);
}

function addMinutes(sum: Minutes, { minutes }: Option, times: 1 | -1): void {
  for (const centre of workCentreSchema.options) {
    const own = minutes[centre];
    if (own !== undefined) sum[centre] = (sum[centre] ?? 0) + times * own;
  }
}

/** Weight of the family's iron, lb; kept, since an option is weighed for every build in which it might be chosen. */
function ironWeight(
  compiled: CompiledCatalogue,
  family: Family,
  known: Map<number, number>,
  assignment: Assignment,
  numbers: Numbers,
): number {
  let cell = 0;
  for (let choice = 0; choice < assignment.length; choice += 1) {
    if (compiled.borings[choice] !== 1) continue;
    const size = (compiled.choices[choice]?.options.length ?? 0) + 1;
    cell = cell * size + (assignment[choice] ?? -1) + 1;
  }
  const weight = known.get(cell) ?? weighIron(compiled, family, assignment, numbers);
  known.set(cell, weight);
  return weight;
}

/**
 * Weight of the family's iron, lb. The bore as delivered counts, the finish bore while the finish is not chosen, the base bore
 * while no bore is; the family's lowest deck while none is chosen.
 */
function weighIron(
  compiled: CompiledCatalogue,
  family: Family,
  assignment: Assignment,
  numbers: Numbers,
): number {
  const { baseBore, barrelBottom, baseDeckHeight, cylinders } = family.values;
  const familyIndex = assignment[compiled.familyChoice] ?? -1;
  const reading = compiled.reading(familyIndex, (choice) => assignment[choice] ?? -1, numbers);
  const deckHeight = reading.value("deckHeight") ?? baseDeckHeight;
  if (
    baseBore === undefined ||
    barrelBottom === undefined ||
    deckHeight === undefined ||
    cylinders === undefined
  ) {
    return family.weight;
  }
  return blockWeight({
    familyWeight: family.weight,
    optionWeights: [],
    baseBore,
    deliveredBore: reading.figure("deliveredBore") ?? reading.value("bore") ?? baseBore,
    barrelLength: deckHeight - barrelBottom,
    cylinders,
  });
}
