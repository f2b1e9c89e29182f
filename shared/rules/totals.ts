import { workCentreSchema, type Family, type Option, type WorkCentre } from "../catalogue/catalogue.ts";
import { blockWeight } from "../geometry/weight.ts";
import { baseAmount, optionAmount } from "../pricing/price-build.ts";
import { parseDay } from "../scheduling/calendar.ts";
import { estimateShipDate } from "../scheduling/estimate.ts";
import type { CompiledCatalogue } from "./compile.ts";
import type { Assignment } from "./problem.ts";
import type { EvaluationContext } from "./evaluation.ts";
import type { Reading } from "./reading.ts";

/** What a partial build with a family comes to. */
export interface Totals {
  priceCents: number;
  weight: number;
  minutes: Partial<Record<WorkCentre, number>>;
  leadDays: number;
  shipsOn: string;
}

/** Totals of partial builds; null without a family. One instance serves one evaluation and keeps the dates it found. */
export function createTotals(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  numbers: Readonly<Record<string, string>>,
): (assignment: Assignment) => Totals | null {
  const dates = new Map<string, string>();
  return (assignment) => {
    const familyIndex = assignment[compiled.familyChoice] ?? -1;
    const family = compiled.families[familyIndex];
    if (family === undefined) return null;
    const chosen = chosenOptions(compiled, assignment);
    let priceCents = baseAmount(context.priceList, family.id);
    let leadDays = family.leadDays;
    const minutes: Partial<Record<WorkCentre, number>> = { ...family.minutes };
    for (const [choice, option] of chosen) {
      priceCents += optionAmount(context.priceList, family.id, choice, option.id);
      leadDays = Math.max(leadDays, option.leadDays);
      addMinutes(minutes, option.minutes);
    }
    const key = `${leadDays} ${workCentreSchema.options.map((centre) => minutes[centre] ?? 0).join(" ")}`;
    const shipsOn =
      dates.get(key) ?? estimateShipDate({ minutes, load: context.load, today: context.today, leadDays });
    dates.set(key, shipsOn);
    const reading = compiled.reading(familyIndex, (choice) => assignment[choice] ?? -1, numbers);
    const weight = weightOf(
      family,
      reading,
      chosen.map(([, option]) => option.weight),
    );
    return { priceCents, weight, minutes, leadDays, shipsOn };
  };
}

/** Calendar days from one ISO date to another, signed. */
export function daysBetween(from: string, to: string): number {
  return parseDay(to) - parseDay(from);
}

function chosenOptions(compiled: CompiledCatalogue, assignment: Assignment): [string, Option][] {
  return compiled.choices.flatMap((choice, index) => {
    const option = choice.options[assignment[index] ?? -1];
    return option === undefined || index === compiled.familyChoice
      ? []
      : [[choice.id, option] as [string, Option]];
  });
}

function addMinutes(
  sum: Partial<Record<WorkCentre, number>>,
  more: Partial<Record<WorkCentre, number>>,
): void {
  for (const centre of workCentreSchema.options) {
    const minutes = more[centre];
    if (minutes !== undefined) sum[centre] = (sum[centre] ?? 0) + minutes;
  }
}

/**
 * Weight of the bare block, lb. The bore as delivered counts, the finish bore while the finish is not chosen, the base bore
 * while no bore is; the family's lowest deck while none is chosen.
 */
function weightOf(family: Family, reading: Reading, optionWeights: readonly number[]): number {
  const { baseBore, barrelBottom, baseDeckHeight, cylinders } = family.values;
  const deckHeight = reading.value("deckHeight") ?? baseDeckHeight;
  if (
    baseBore === undefined ||
    barrelBottom === undefined ||
    deckHeight === undefined ||
    cylinders === undefined
  ) {
    return family.weight + optionWeights.reduce((sum, weight) => sum + weight, 0);
  }
  const bored = reading.figure("deliveredBore") ?? reading.value("bore") ?? baseBore;
  return blockWeight({
    familyWeight: family.weight,
    optionWeights,
    baseBore,
    deliveredBore: bored,
    barrelLength: deckHeight - barrelBottom,
    cylinders,
  });
}
