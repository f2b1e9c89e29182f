import { workCentreSchema } from "../catalogue/catalogue.ts";
import { amountsOf } from "../rules/amounts.ts";
import { compileCatalogue, type CompiledCatalogue } from "../rules/compile.ts";
import type { EvaluationContext } from "../rules/evaluation.ts";
import type { Assignment } from "../rules/problem.ts";
import { shipDateOf, type Minutes, type ShipDate } from "../rules/ship-dates.ts";
import { createCompletions, writeAnswers, type Completion } from "./completions.ts";
import { powerReach, type PowerReach } from "./power-reach.ts";
import { allowedOptions, readTarget, type Question } from "./question.ts";
import type { Target } from "./target.ts";

/** A full valid build on its way to be an answer. */
export interface Candidate {
  assignment: Assignment;
  priceCents: number;
  ships: ShipDate;
  /** Cu in; null where the rotating assembly that is there does not tell. */
  displacement: number | null;
  stroke: number | null;
  power: PowerReach | null;
}

export interface Candidates {
  compiled: CompiledCatalogue;
  question: Question;
  found: Candidate[];
}

/** What decides displacement and strength, and tells answers apart; all else follows from them as cheaply as can be. */
const leadingChoices = ["bore", "rotatingAssembly", "capStyle"];

/**
 * For every family, bore, rotating assembly and cap style that can meet the target: its best complete builds, such that no other
 * with the same four beats them in price, lead and minutes. Throws RangeError as `findBuilds`.
 */
export function findCandidates(context: EvaluationContext, target: Target): Candidates {
  const compiled = compileCatalogue(context.catalogue);
  const question = readTarget(context, target);
  const wanted = question.given[compiled.familyChoice] ?? -1;
  const found = compiled.families.flatMap((_, family) =>
    wanted < 0 || wanted === family ? ofFamily(context, compiled, { target, question, family }) : [],
  );
  return { compiled, question, found };
}

interface FamilyAsked {
  target: Target;
  question: Question;
  family: number;
}

function ofFamily(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  { target, question, family }: FamilyAsked,
): Candidate[] {
  const base = amountsOf(compiled, context.priceList, family).base;
  if (target.budgetCents !== undefined && cheapestPossible(context, compiled, family) > target.budgetCents)
    return [];
  const leading = leadingChoices.flatMap((id) => compiled.choiceIndex.get(id) ?? []);
  const allowed = allowedOptions(compiled, question, family);
  const completions = createCompletions(context, compiled, {
    family,
    numbers: question.numbers,
    allowed,
    leading,
  });
  const given: Assignment = new Int16Array(compiled.choices.length).fill(-1);
  given[compiled.familyChoice] = family;
  const dates = shipDates(context, compiled, family);
  const engineOf = createEngineReader(context, compiled, { target, question, family }, given);
  const found: Candidate[] = [];
  const fill = (at: number): void => {
    const choice = leading[at];
    if (choice === undefined) {
      const engine = engineOf();
      if (engine === null) return;
      for (const completion of completions.of(given)) {
        const priceCents = base + completion.priceCents;
        if (target.budgetCents !== undefined && priceCents > target.budgetCents) continue;
        const ships = dates(completion);
        if (target.shipBy !== undefined && ships.date > target.shipBy) continue;
        const assignment = given.slice();
        writeAnswers(completion, assignment);
        found.push({ assignment, priceCents, ships, ...engine });
      }
      return;
    }
    const from = compiled.offsets[choice] ?? 0;
    for (let option = 0; from + option < (compiled.offsets[choice + 1] ?? from); option += 1) {
      if (allowed[from + option] !== 1) continue;
      given[choice] = option;
      fill(at + 1);
    }
    given[choice] = -1;
  };
  fill(0);
  return found;
}

/** A price that no build of the family is below, cents. */
function cheapestPossible(context: EvaluationContext, compiled: CompiledCatalogue, family: number): number {
  const { base, options } = amountsOf(compiled, context.priceList, family);
  return compiled.choices.reduce((sum, _, choice) => {
    let least = Number.POSITIVE_INFINITY;
    const from = compiled.offsets[choice] ?? 0;
    for (let at = from; at < (compiled.offsets[choice + 1] ?? from); at += 1) {
      if (compiled.exists(family, choice, at - from)) least = Math.min(least, options[at] ?? 0);
    }
    return sum + (Number.isFinite(least) ? least : 0);
  }, base);
}

function shipDates(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  family: number,
): (completion: Completion) => ShipDate {
  const block = compiled.families[family];
  return ({ minutes, leadDays }) => {
    const all: Minutes = { ...block?.minutes };
    workCentreSchema.options.forEach((centre, at) => {
      const own = minutes[at] ?? 0;
      if (own !== 0) all[centre] = (all[centre] ?? 0) + own;
    });
    return shipDateOf(context.load, context.today, all, Math.max(leadDays, block?.leadDays ?? 0));
  };
}

const rodOutline = "rodOutline";

type Engine = Pick<Candidate, "displacement" | "stroke" | "power">;

/**
 * Displacement and power of the leading answers given at the time; null where they miss the target. A displacement that is not
 * known is only taken where the rotating assembly is there already and none is wished for, rods without an outline, which nothing
 * is checked against, only where they are there already.
 */
function createEngineReader(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  { target, question, family }: FamilyAsked,
  given: Assignment,
): () => Engine | null {
  const reading = compiled.reading(family, (choice) => given[choice] ?? -1, question.numbers);
  const { least = 0, most = Number.POSITIVE_INFINITY } = target.displacement ?? {};
  const fixed = question.mine.includes("rotatingAssembly");
  const outlined = compiled.choices.some(({ options }) => options.some(({ words }) => rodOutline in words));
  const known = new Map<string, Engine | null>();
  const read = (): Engine | null => {
    reading.forget();
    const displacement = reading.figure("displacement");
    const stroke = reading.value("stroke");
    if (displacement === null || stroke === null)
      return fixed && target.displacement === undefined ? { displacement, stroke, power: null } : null;
    if (displacement < least || displacement > most) return null;
    if (outlined && !fixed && reading.word(rodOutline) === null) return null;
    return {
      displacement,
      stroke,
      power: powerReach(context.catalogue, target, { cubicInches: displacement, stroke }),
    };
  };
  const suppliers = ["bore", "rotatingAssembly"].flatMap((id) => compiled.choiceIndex.get(id) ?? []);
  return () => {
    const key = suppliers.map((choice) => given[choice]).join(" ");
    const engine = known.get(key);
    if (engine !== undefined) return engine;
    const made = read();
    known.set(key, made);
    return made;
  };
}
