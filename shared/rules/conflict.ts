import type { Assignment, CompiledCatalogue } from "./compile.ts";
import { findInAnyFamily } from "./open-options.ts";

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
  numbers: Readonly<Record<string, string>>;
  /** Choices whose answers are held in any case, such as the wanted option's; they are not named in the conflict. */
  held: ReadonlySet<number>;
  heldNumber?: string;
}

/**
 * A minimal conflict: stop rules, answers and typed numbers that leave no valid build, while leaving out any one of them does.
 * Null when there is a valid build. Deletion filter: each element is left out in turn for good if the rest still conflicts;
 * sound because leaving out a rule, an answer or a number (unknown then) never closes anything.
 */
export function minimalConflict(question: ConflictQuestion): Conflict | null {
  const { compiled, held, heldNumber } = question;
  const given = question.given.slice();
  const numbers = { ...question.numbers };
  const without = new Uint8Array(compiled.stops.length);
  const blocked = (): boolean => findInAnyFamily(compiled, given, numbers, { without }) === null;
  if (!blocked()) return null;

  const stops: number[] = [];
  for (let stop = compiled.stops.length - 1; stop >= 0; stop -= 1) {
    without[stop] = 1;
    if (blocked()) continue;
    without[stop] = 0;
    stops.unshift(stop);
  }
  const choices: number[] = [];
  for (let choice = compiled.choices.length - 1; choice >= 0; choice -= 1) {
    const answer = given[choice] ?? -1;
    if (answer < 0 || held.has(choice)) continue;
    given[choice] = -1;
    if (blocked()) continue;
    given[choice] = answer;
    choices.unshift(choice);
  }
  const kept: string[] = [];
  for (const [id, text] of Object.entries(question.numbers)) {
    if (id === heldNumber) continue;
    delete numbers[id];
    if (blocked()) continue;
    numbers[id] = text;
    kept.push(id);
  }
  return { stops, choices, numbers: kept };
}
