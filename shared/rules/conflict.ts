import type { CompiledCatalogue } from "./compile.ts";
import { problemsFor } from "./open-options.ts";
import type { Assignment } from "./problem.ts";
import type { Numbers } from "./rule-table.ts";
import { findExtension } from "./search.ts";

/** What together leaves no valid build. */
export interface Conflict {
  /** Indices of stop rules. */
  stops: number[];
  /** Indices of choices whose answers take part. */
  choices: number[];
  /** Typed numbers that take part. */
  numbers: string[];
}

export interface ConflictQuestion {
  compiled: CompiledCatalogue;
  given: Assignment;
  numbers: Numbers;
  /** Choices whose answers are held in any case, such as the wanted option's; they are not named in the conflict. */
  held: ReadonlySet<number>;
  heldNumber?: string;
}

/**
 * The elements of a conflict of which no proper subset is one; null where all of them together are none. What comes later is left
 * out rather than what comes first. (U. Junker, QuickXplain, AAAI 2004.)
 * @param conflicts whether these elements, with what is held in any case, conflict; more elements never stop conflicting
 */
export function quickXplain<Element>(
  elements: readonly Element[],
  conflicts: (among: readonly Element[]) => boolean,
): Element[] | null {
  if (!conflicts(elements)) return null;
  if (conflicts([])) return [];
  return narrow([], elements, conflicts);
}

/** Those of the elements that the base needs to become a conflict; the base alone is none. */
function narrow<Element>(
  base: readonly Element[],
  elements: readonly Element[],
  conflicts: (among: readonly Element[]) => boolean,
): Element[] {
  if (elements.length === 1) return [...elements];
  const half = Math.ceil(elements.length / 2);
  const first = elements.slice(0, half);
  const withFirst = [...base, ...first];
  const second = conflicts(withFirst) ? [] : narrow(withFirst, elements.slice(half), conflicts);
  const withSecond = [...base, ...second];
  return conflicts(withSecond) ? second : [...narrow(withSecond, first, conflicts), ...second];
}

type Part = { number: string } | { choice: number } | { stop: number };

/**
 * A minimal conflict: stop rules, answers and typed numbers that leave no valid build, while leaving out any one of them does.
 * Null when there is a valid build. Sound because leaving out a rule, an answer or a number (unknown then) never closes anything.
 */
export function minimalConflict(question: ConflictQuestion): Conflict | null {
  const { compiled, given, numbers, held, heldNumber } = question;
  const typed = Object.keys(numbers).filter((id) => id !== heldNumber);
  const answered = [...given.keys()].filter((choice) => given[choice] !== -1 && !held.has(choice));
  const parts: Part[] = [
    ...typed.map((number) => ({ number })).reverse(),
    ...answered.map((choice) => ({ choice })),
    ...compiled.stops.map((_, stop) => ({ stop })),
  ];
  const found = quickXplain(parts, (among) => {
    const without = new Uint8Array(compiled.stops.length).fill(1);
    const kept = given.slice();
    for (const choice of answered) kept[choice] = -1;
    const known = Object.fromEntries(
      Object.entries(numbers).filter(
        ([id]) => id === heldNumber || among.some((part) => "number" in part && part.number === id),
      ),
    );
    for (const part of among) {
      if ("stop" in part) without[part.stop] = 0;
      else if ("choice" in part) kept[part.choice] = given[part.choice] ?? -1;
    }
    return problemsFor(compiled, kept, known).every(
      (problem) => findExtension(compiled, problem, kept, { without }) === null,
    );
  });
  if (found === null) return null;
  return {
    stops: found.flatMap((part) => ("stop" in part ? [part.stop] : [])),
    choices: found.flatMap((part) => ("choice" in part ? [part.choice] : [])),
    numbers: found.flatMap((part) => ("number" in part ? [part.number] : [])).reverse(),
  };
}
