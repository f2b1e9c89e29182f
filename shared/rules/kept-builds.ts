import type { Assignment, Problem } from "./problem.ts";

/** Valid builds that searches have found, kept as witnesses for later questions; the oldest go first. */
const most = 400;
const kept = new WeakMap<Problem, Assignment[]>();

export function keepBuild(problem: Problem, build: Assignment): void {
  const builds = kept.get(problem) ?? [];
  kept.set(problem, builds);
  builds.push(build);
  if (builds.length > most) builds.splice(0, most / 4);
}

/** As `markBuild` for every kept build; true where some kept build extends the answers. */
export function markKept(
  problem: Problem,
  given: Assignment,
  offsets: readonly number[],
  open: Uint8Array,
): boolean {
  let extended = false;
  for (const build of kept.get(problem) ?? []) {
    if (markBuild(build, given, offsets, open)) extended = true;
  }
  return extended;
}

/**
 * Marks the options that a valid build proves open: all of them where it extends the answers (true then), and where it differs
 * in a single answer that one alone.
 */
export function markBuild(
  build: Assignment,
  given: Assignment,
  offsets: readonly number[],
  open: Uint8Array,
): boolean {
  let where = -1;
  for (let choice = 0; choice < given.length; choice += 1) {
    const answer = given[choice] ?? -1;
    if (answer < 0 || answer === build[choice]) continue;
    if (where >= 0) return false;
    where = choice;
  }
  if (where >= 0) {
    open[(offsets[where] ?? 0) + (build[where] ?? 0)] = 1;
    return false;
  }
  for (let choice = 0; choice < build.length; choice += 1) {
    open[(offsets[choice] ?? 0) + (build[choice] ?? 0)] = 1;
  }
  return true;
}
