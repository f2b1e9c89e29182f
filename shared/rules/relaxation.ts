import type { CompiledCatalogue } from "./compile.ts";
import { quickXplain } from "./conflict.ts";
import { isPossible } from "./open-options.ts";
import type { Assignment } from "./problem.ts";
import type { Numbers } from "./rule-table.ts";

/**
 * All smallest sets of answers (of at most `most`) that leave a valid build when they are freed: every minimal conflict must be
 * hit, so the sets grow by one element of a conflict at a time, breadth first, and a conflict once found serves every set that
 * does not hit it yet. (R. Reiter, A theory of diagnosis from first principles, 1987; from memory.)
 */
export function leastRelaxations(
  compiled: CompiledCatalogue,
  start: Assignment,
  numbers: Numbers,
  { fixed, most }: { fixed: ReadonlySet<number>; most: number },
): number[][] {
  const free = [...start.keys()].filter(
    (choice) => start[choice] !== -1 && choice !== compiled.familyChoice && !fixed.has(choice),
  );
  const conflicts: (readonly number[])[] = [];
  /** Answers left that conflict among each other and with the fixed ones; null = they stand. */
  const conflictOf = (freed: readonly number[]): readonly number[] | null => {
    const known = conflicts.find((conflict) => !conflict.some((choice) => freed.includes(choice)));
    if (known !== undefined) return known;
    const left = free.filter((choice) => !freed.includes(choice));
    const found = quickXplain(left, (among) => {
      const given = start.slice();
      for (const choice of free) given[choice] = -1;
      for (const choice of among) given[choice] = start[choice] ?? -1;
      return !isPossible(compiled, given, numbers);
    });
    if (found !== null) conflicts.push(found);
    return found;
  };
  let layer: number[][] = [[]];
  for (let size = 0; size <= most && layer.length > 0; size += 1) {
    const found: number[][] = [];
    const next = new Map<string, number[]>();
    for (const freed of layer) {
      const conflict = conflictOf(freed);
      if (conflict === null) {
        found.push(freed);
        continue;
      }
      for (const choice of conflict) {
        const grown = [...freed, choice].sort((a, b) => a - b);
        next.set(grown.join(" "), grown);
      }
    }
    if (found.length > 0) return found;
    layer = [...next.values()];
  }
  return [];
}
