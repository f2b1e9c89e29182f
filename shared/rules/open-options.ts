import type { Assignment, CompiledCatalogue, Problem } from "./compile.ts";
import { findExtension, type SearchWishes } from "./search.ts";

/** The families that answers allow, as problems at the typed numbers: the chosen one, or all. */
function problemsFor(
  compiled: CompiledCatalogue,
  given: Assignment,
  numbers: Readonly<Record<string, string>>,
): Problem[] {
  const chosen = given[compiled.familyChoice] ?? -1;
  if (chosen >= 0) return [compiled.problem(chosen, numbers)];
  return compiled.families.map((_, family) => compiled.problem(family, numbers));
}

/** A full valid build that extends the answers in any family they allow, or null. */
export function findInAnyFamily(
  compiled: CompiledCatalogue,
  given: Assignment,
  numbers: Readonly<Record<string, string>>,
  wishes: SearchWishes = {},
): Assignment | null {
  for (const problem of problemsFor(compiled, given, numbers)) {
    const found = findExtension(compiled, problem, given, wishes);
    if (found !== null) return found;
  }
  return null;
}

/**
 * Open options by flat option index (1 = open): some full valid build has that option and extends the other answers, the
 * choice's own answer left out. Every build found is kept as a witness for all the options in it.
 */
export function openOptions(
  compiled: CompiledCatalogue,
  given: Assignment,
  numbers: Readonly<Record<string, string>>,
): Uint8Array {
  const { offsets, choices } = compiled;
  const open = new Uint8Array(offsets.at(-1) ?? 0);
  const keep = (witness: Assignment): void => {
    witness.forEach((option, choice) => {
      open[(offsets[choice] ?? 0) + option] = 1;
    });
  };
  for (const problem of problemsFor(compiled, given, numbers)) {
    const first = findExtension(compiled, problem, given, { seen: open });
    if (first === null) continue;
    keep(first);
    for (let choice = 0; choice < choices.length; choice += 1) {
      if (given[choice] !== -1 || choice === compiled.familyChoice) continue;
      tryOptions(compiled, choice, given, open, (trial) => {
        const found = findExtension(compiled, problem, trial, { seen: open });
        if (found !== null) keep(found);
      });
    }
  }
  for (let choice = 0; choice < choices.length; choice += 1) {
    if (given[choice] === -1) continue;
    tryOptions(compiled, choice, given, open, (trial) => {
      const found = findInAnyFamily(compiled, trial, numbers);
      if (found !== null) open[(offsets[choice] ?? 0) + (trial[choice] ?? 0)] = 1;
    });
  }
  return open;
}

function tryOptions(
  compiled: CompiledCatalogue,
  choice: number,
  given: Assignment,
  open: Uint8Array,
  attempt: (trial: Assignment) => void,
): void {
  const from = compiled.offsets[choice] ?? 0;
  const to = compiled.offsets[choice + 1] ?? from;
  const trial = given.slice();
  for (let at = from; at < to; at += 1) {
    if (open[at] === 1 || given[choice] === at - from) continue;
    trial[choice] = at - from;
    attempt(trial);
  }
}
