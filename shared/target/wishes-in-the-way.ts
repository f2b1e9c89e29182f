import { formatCents } from "../money/cents.ts";
import type { EvaluationContext } from "../rules/evaluation.ts";
import { findCandidates, type Candidate } from "./candidates.ts";
import type { Target } from "./target.ts";

/** A wish that, left out alone, gives answers. */
interface WishInTheWay {
  /** Its path in the target, as "budgetCents" or "have.answers.mainSize". */
  wish: string;
  /** What is possible without it, in one plain line. */
  sentence: string;
}

/** Which single wishes stand in the way of a target that nothing fits; empty where at least two must give way. */
export function wishesInTheWay(context: EvaluationContext, target: Target): WishInTheWay[] {
  return wishesOf(context, target).flatMap(({ wish, without, say }) => {
    const { found } = findCandidates(context, without);
    return found.length === 0 ? [] : [{ wish, sentence: say(found) }];
  });
}

interface Wish {
  wish: string;
  without: Target;
  say: (found: readonly Candidate[]) => string;
}

const leastPrice = (found: readonly Candidate[]): string =>
  formatCents(found.reduce((least, { priceCents }) => Math.min(least, priceCents), Number.POSITIVE_INFINITY));

function wishesOf({ catalogue }: EvaluationContext, target: Target): Wish[] {
  const { displacement, power, rpm, budgetCents, shipBy, have, ...rest } = target;
  const all = { displacement, power, rpm, budgetCents, shipBy, have };
  const without = (left: Partial<typeof all>): Target => ({ ...rest, ...all, ...left });
  const wishes: Wish[] = [];
  if (displacement !== undefined) {
    wishes.push({
      wish: "displacement",
      without: without({ displacement: undefined }),
      say: (found) =>
        `With another displacement there are builds: the nearest has ${nearest(found, displacement)}.`,
    });
  }
  if (power !== undefined) {
    wishes.push({
      wish: "power",
      without: without({ power: undefined }),
      say: (found) => `Without the power aimed at there are builds from ${leastPrice(found)}.`,
    });
  }
  if (rpm !== undefined) {
    wishes.push({
      wish: "rpm",
      without: without({ rpm: undefined }),
      say: (found) => `Without the engine speed aimed at there are builds from ${leastPrice(found)}.`,
    });
  }
  if (budgetCents !== undefined) {
    wishes.push({
      wish: "budgetCents",
      without: without({ budgetCents: undefined }),
      say: (found) => `The budget is too small: such builds start at ${leastPrice(found)}.`,
    });
  }
  if (shipBy !== undefined) {
    wishes.push({
      wish: "shipBy",
      without: without({ shipBy: undefined }),
      say: (found) => `The date is too early: the soonest such build ships on ${soonest(found)}.`,
    });
  }
  if (have === undefined) return wishes;
  for (const id of Object.keys(have.answers)) {
    const choice = catalogue.choices.find((candidate) => candidate.id === id);
    const option = choice?.options.find((candidate) => candidate.id === have.answers[id]);
    wishes.push({
      wish: `have.answers.${id}`,
      without: without({ have: { ...have, answers: omit(have.answers, id) } }),
      say: (found) =>
        `Without ${choice?.name ?? id}: ${option?.name ?? ""} there are builds from ${leastPrice(found)}.`,
    });
  }
  for (const id of Object.keys(have.numbers)) {
    const field = catalogue.numbers.find((candidate) => candidate.id === id);
    wishes.push({
      wish: `have.numbers.${id}`,
      without: without({ have: { ...have, numbers: omit(have.numbers, id) } }),
      say: (found) =>
        `Without ${field?.name ?? id}: ${have.numbers[id] ?? ""} ${field?.unit ?? ""} there are builds from ${leastPrice(found)}.`,
    });
  }
  return wishes;
}

function omit(record: Readonly<Record<string, string>>, id: string): Record<string, string> {
  return Object.fromEntries(Object.entries(record).filter(([key]) => key !== id));
}

function soonest(found: readonly Candidate[]): string {
  return found.map(({ ships }) => ships.date).reduce((first, date) => (date < first ? date : first));
}

function nearest(
  found: readonly Candidate[],
  { least = 0, most = Infinity }: NonNullable<Target["displacement"]>,
): string {
  const off = (cubicInches: number): number => Math.max(least - cubicInches, cubicInches - most, 0);
  const best = found
    .flatMap(({ displacement }) => displacement ?? [])
    .reduce<number | null>((near, one) => (near === null || off(one) < off(near) ? one : near), null);
  return best === null ? "an unknown one" : `${best.toFixed(1)} cu in`;
}
