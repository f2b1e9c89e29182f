import type { Build } from "../catalogue/build.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import type { EvaluationContext } from "./evaluation.ts";
import { createJoinTree, type JoinTree } from "./join-tree.ts";
import { keepBuild, markBuild, markKept } from "./kept-builds.ts";
import type { Assignment, Problem } from "./problem.ts";
import type { Numbers } from "./rule-table.ts";
import { findExtension, startSearch } from "./search.ts";

const trees = new WeakMap<Problem, JoinTree | null>();

/** The problem's join tree, made the first time it is asked for; null where its rules join too many choices. */
export function treeOf(compiled: CompiledCatalogue, problem: Problem): JoinTree | null {
  const known = trees.get(problem);
  if (known !== undefined) return known;
  const made = createJoinTree(problem, compiled.offsets, compiled.familyChoice);
  trees.set(problem, made);
  return made;
}

/** The families that answers allow, as problems at the typed numbers: the chosen one, or all. */
export function problemsFor(compiled: CompiledCatalogue, given: Assignment, numbers: Numbers): Problem[] {
  const chosen = given[compiled.familyChoice] ?? -1;
  if (chosen >= 0) return [compiled.problem(chosen, numbers)];
  return compiled.families.map((_, family) => compiled.problem(family, numbers));
}

/** Whether a full valid build extends the answers, in any family that they allow. */
export function isPossible(compiled: CompiledCatalogue, given: Assignment, numbers: Numbers): boolean {
  return problemsFor(compiled, given, numbers).some((problem) => {
    const tree = treeOf(compiled, problem);
    if (tree !== null) return tree.possible(given);
    const scratch = new Uint8Array(compiled.offsets.at(-1) ?? 0);
    if (markKept(problem, given, compiled.offsets, scratch)) return true;
    const found = findExtension(compiled, problem, given);
    if (found !== null) keepBuild(problem, found);
    return found !== null;
  });
}

/**
 * The open options of every choice, in catalogue order: some full valid build has that option and extends the other answers, the
 * choice's own answer left out. Throws RangeError on a catalogue that is not sound.
 */
export function openOptions(
  { catalogue }: Pick<EvaluationContext, "catalogue">,
  build: Build,
): Map<string, string[]> {
  const compiled = compileCatalogue(catalogue);
  const open = openFlags(compiled, compiled.assignment(build.answers), build.numbers);
  return new Map(
    compiled.choices.map(({ id, options }, choice) => [
      id,
      options.flatMap((option, at) => (open[(compiled.offsets[choice] ?? 0) + at] === 1 ? [option.id] : [])),
    ]),
  );
}

/**
 * How many valid full builds extend the answers at the present typed numbers, exactly; own numbers count as one option.
 * Throws RangeError where the rules join too many choices to be counted.
 */
export function count({ catalogue }: Pick<EvaluationContext, "catalogue">, build: Build): bigint {
  const compiled = compileCatalogue(catalogue);
  const given = compiled.assignment(build.answers);
  return problemsFor(compiled, given, build.numbers).reduce((sum, problem) => {
    const tree = treeOf(compiled, problem);
    if (tree === null) throw new RangeError("the rules join too many choices to be counted");
    return sum + tree.count(given);
  }, 0n);
}

/** Open options by flat option index (1 = open). */
export function openFlags(compiled: CompiledCatalogue, given: Assignment, numbers: Numbers): Uint8Array {
  const open = new Uint8Array(compiled.offsets.at(-1) ?? 0);
  // Every family is asked: those not chosen can be open themselves.
  for (const family of compiled.families.keys()) {
    const problem = compiled.problem(family, numbers);
    const tree = treeOf(compiled, problem);
    if (tree !== null) tree.open(given, open);
    else searchOpen(compiled, problem, given, open);
  }
  return open;
}

/** The same by search: every build found is a witness for all its options, and is kept for the questions to come. */
function searchOpen(
  compiled: CompiledCatalogue,
  problem: Problem,
  given: Assignment,
  open: Uint8Array,
): void {
  const { offsets, choices, familyChoice } = compiled;
  const seen = new Uint8Array(open.length);
  markKept(problem, given, offsets, seen);
  const keep = (found: Assignment | null): void => {
    if (found === null) return;
    keepBuild(problem, found);
    markBuild(found, given, offsets, seen);
  };
  const chosen = given[familyChoice] ?? -1;
  if (chosen >= 0 && chosen !== problem.family) {
    const trial = given.slice();
    trial[familyChoice] = problem.family;
    keep(findExtension(compiled, problem, trial));
  } else {
    const whole = startSearch(compiled, problem, given, { seen });
    choices.forEach((_, choice) => {
      const from = offsets[choice] ?? 0;
      if (given[choice] !== -1 || whole === null) return;
      for (const option of whole.left(choice)) {
        if (seen[from + option] === 0) keep(whole.attempt(choice, option));
      }
    });
    choices.forEach((_, choice) => {
      if (given[choice] === -1 || choice === familyChoice) return;
      const from = offsets[choice] ?? 0;
      const trial = given.slice();
      trial[choice] = -1;
      const freed = startSearch(compiled, problem, trial, { seen });
      for (const option of freed?.left(choice) ?? []) {
        if (seen[from + option] === 0) keep(freed?.attempt(choice, option) ?? null);
      }
    });
    if (chosen === problem.family && whole !== null && seen[(offsets[familyChoice] ?? 0) + chosen] === 0)
      keep(whole.attempt());
  }
  seen.forEach((mark, at) => {
    if (mark === 1) open[at] = 1;
  });
}
