import { workCentreSchema, type Option } from "../catalogue/catalogue.ts";
import { amountsOf } from "../rules/amounts.ts";
import type { CompiledCatalogue } from "../rules/compile.ts";
import type { EvaluationContext } from "../rules/evaluation.ts";
import { classProblemOf, type ClassProblem } from "../rules/option-classes.ts";
import type { Assignment } from "../rules/problem.ts";
import type { Numbers } from "../rules/rule-table.ts";

/** Answers to some choices and what they add: cents, longest lead, minutes by work centre. */
export interface Completion {
  priceCents: number;
  leadDays: number;
  minutes: readonly number[];
  /** -1 = no answer of its own, only those of its parts. */
  choice: number;
  option: number;
  parts: readonly Completion[];
}

/** For answers to the leading choices: the best ways to answer all others. */
interface Completions {
  /** None where the answers cannot stand; else every way that no other beats in price, lead and minutes at once. */
  of(leading: Assignment): readonly Completion[];
}

interface Asked {
  family: number;
  numbers: Numbers;
  /** By flat option index: 1 where the option may be taken. */
  allowed: Uint8Array;
  /** Choices that are answered from outside. */
  leading: readonly number[];
}

/** By the sum of class x stride: the best completions of what was left out so far. */
interface Message {
  scope: readonly number[];
  strides: readonly number[];
  cells: readonly (readonly Completion[])[];
}

/** Cells of one message; no catalogue that the join trees take comes near. */
const mostCells = 1 << 18;

/** Completions kept of one cell; beyond it those between the cheapest and the quickest go. */
const mostKept = 32;

const nothing: Completion = {
  priceCents: 0,
  leadDays: 0,
  minutes: workCentreSchema.options.map(() => 0),
  choice: -1,
  option: -1,
  parts: [],
};

/**
 * Answers all choices but the leading ones as well as can be: they are left out one at a time (the one whose table is smallest
 * first), each passing on, for the classes of options still joined to it, the completions that no other beats. Exact, since price
 * and minutes add up and the lead is the longest. Throws RangeError where the rules join too many choices.
 */
export function createCompletions(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  { family, numbers, allowed, leading }: Asked,
): Completions {
  const small = classProblemOf(compiled.problem(family, numbers), compiled.offsets);
  if (small === null) throw new RangeError("the rules join too many choices for a target");
  const amounts = amountsOf(compiled, context.priceList, family).options;
  let messages = small.factors.map(({ scope, strides, table }): Message => ({
    scope,
    strides,
    cells: Array.from(table, (stands) => (stands === 1 ? [nothing] : [])),
  }));
  const left = new Set(
    [...compiled.choices.keys()].filter(
      (choice) => choice !== compiled.familyChoice && !leading.includes(choice),
    ),
  );
  while (left.size > 0) {
    const choice = smallest(left, messages, small);
    left.delete(choice);
    const own = small.sizes[choice]?.map((): Completion[] => []) ?? [];
    const from = compiled.offsets[choice] ?? 0;
    compiled.choices[choice]?.options.forEach((option, at) => {
      const list = own[small.classOf[choice]?.[at] ?? -1];
      if (allowed[from + at] === 1) list?.push(completionOf(choice, at, option, amounts[from + at] ?? 0));
    });
    const joined = messages.filter(({ scope }) => scope.includes(choice));
    messages = messages.filter(({ scope }) => !scope.includes(choice));
    messages.push(leaveOut(choice, own.map(unbeaten), joined, small));
  }
  const leadingAmount = (choice: number, at: number): number =>
    amounts[(compiled.offsets[choice] ?? 0) + at] ?? 0;
  return {
    of(given) {
      let found: readonly Completion[] = [nothing];
      for (const choice of leading) {
        const at = given[choice] ?? -1;
        const option = compiled.choices[choice]?.options[at];
        if (option === undefined || (small.classOf[choice]?.[at] ?? -1) < 0) return [];
        if (allowed[(compiled.offsets[choice] ?? 0) + at] !== 1) return [];
        found = joinedLists(found, [completionOf(choice, at, option, leadingAmount(choice, at))]);
      }
      for (const { scope, strides, cells } of messages) {
        const cell = scope.reduce(
          (sum, choice, place) =>
            sum + (small.classOf[choice]?.[given[choice] ?? -1] ?? 0) * (strides[place] ?? 0),
          0,
        );
        found = joinedLists(found, cells[cell] ?? []);
        if (found.length === 0) return found;
      }
      return unbeaten(found);
    },
  };
}

/** Writes the answers of a completion. */
export function writeAnswers({ choice, option, parts }: Completion, into: Assignment): void {
  if (choice >= 0) into[choice] = option;
  for (const part of parts) writeAnswers(part, into);
}

function completionOf(choice: number, at: number, option: Option, priceCents: number): Completion {
  const minutes = workCentreSchema.options.map((centre) => option.minutes[centre] ?? 0);
  return { priceCents, leadDays: option.leadDays, minutes, choice, option: at, parts: [] };
}

const sizeOf = (small: ClassProblem, choice: number): number => small.sizes[choice]?.length ?? 0;

const scopeWithout = (choice: number, messages: readonly Message[]): number[] =>
  [...new Set(messages.flatMap(({ scope }) => scope))].filter((other) => other !== choice);

function smallest(left: ReadonlySet<number>, messages: readonly Message[], small: ClassProblem): number {
  let best = -1;
  let least = Number.POSITIVE_INFINITY;
  for (const choice of left) {
    const joined = messages.filter(({ scope }) => scope.includes(choice));
    const cells = scopeWithout(choice, joined).reduce((product, other) => product * sizeOf(small, other), 1);
    if (cells < least) [best, least] = [choice, cells];
  }
  if (least > mostCells) throw new RangeError("the rules join too many choices for a target");
  return best;
}

function leaveOut(
  choice: number,
  own: readonly (readonly Completion[])[],
  joined: readonly Message[],
  small: ClassProblem,
): Message {
  const scope = scopeWithout(choice, joined);
  const sizes = scope.map((other) => sizeOf(small, other));
  const strides = sizes.map((_, at) => sizes.slice(0, at).reduce((product, size) => product * size, 1));
  const count = sizes.reduce((product, size) => product * size, 1);
  const cells = Array.from({ length: count }, (_, cell) => {
    const classAt = (other: number): number => {
      const place = scope.indexOf(other);
      return Math.floor(cell / (strides[place] ?? 1)) % (sizes[place] ?? 1);
    };
    const bases = joined.map((message) =>
      message.scope.reduce(
        (sum, other, at) => (other === choice ? sum : sum + classAt(other) * (message.strides[at] ?? 0)),
        0,
      ),
    );
    const found: Completion[] = [];
    own.forEach((options, of) => {
      let list = options;
      joined.forEach((message, at) => {
        const stride = message.strides[message.scope.indexOf(choice)] ?? 0;
        list = joinedLists(list, message.cells[(bases[at] ?? 0) + of * stride] ?? []);
      });
      found.push(...list);
    });
    return unbeaten(found);
  });
  return { scope, strides, cells };
}

/** Every completion of one list with every one of the other. */
function joinedLists(first: readonly Completion[], second: readonly Completion[]): readonly Completion[] {
  if (first.length === 0 || (second.length === 1 && second[0] === nothing)) return first;
  if (second.length === 0 || (first.length === 1 && first[0] === nothing)) return second;
  return unbeaten(first.flatMap((one) => second.map((other) => together(one, other))));
}

function together(one: Completion, other: Completion): Completion {
  return {
    priceCents: one.priceCents + other.priceCents,
    leadDays: Math.max(one.leadDays, other.leadDays),
    minutes: one.minutes.map((minutes, centre) => minutes + (other.minutes[centre] ?? 0)),
    choice: -1,
    option: -1,
    parts: [one, other],
  };
}

const beats = (one: Completion, other: Completion): boolean =>
  one.priceCents <= other.priceCents &&
  one.leadDays <= other.leadDays &&
  one.minutes.every((minutes, centre) => minutes <= (other.minutes[centre] ?? 0));

/** Those that no other equals or beats in every respect, the cheapest first; of equals the first. */
function unbeaten(list: readonly Completion[]): readonly Completion[] {
  if (list.length < 2) return list;
  const total = ({ minutes, leadDays }: Completion): number =>
    minutes.reduce((sum, one) => sum + one, leadDays * 1440);
  const sorted = [...list].sort((a, b) => a.priceCents - b.priceCents || total(a) - total(b));
  const kept: Completion[] = [];
  for (const one of sorted) if (!kept.some((other) => beats(other, one))) kept.push(one);
  if (kept.length <= mostKept) return kept;
  const half = mostKept / 2;
  const quick = kept.slice(half).sort((a, b) => total(a) - total(b));
  return [...kept.slice(0, half), ...quick.slice(0, half)];
}
