import type { Assignment, CompiledCatalogue, Constraint, Problem } from "./compile.ts";

export interface SearchWishes {
  /** By flat option index: options to try last (they have a witness already). */
  seen?: Uint8Array;
  /** By stop rule: 1 = leave this rule out. */
  without?: Uint8Array;
}

/** Open choices and their remaining options while a search runs; undone by the trail. */
interface State {
  alive: Uint8Array;
  sizes: Int16Array;
  values: Int16Array;
  trail: number[];
}

/**
 * A full assignment of one family that extends the answers given and breaks no stop rule, or null if there is none.
 * Depth-first with forward checking: a rule is asked as soon as at most one of its choices is undecided. Choices that no rule
 * joins are decided apart. Complete: null means that none exists.
 */
export function findExtension(
  compiled: CompiledCatalogue,
  problem: Problem,
  given: Assignment,
  wishes: SearchWishes = {},
): Assignment | null {
  const { offsets, choices } = compiled;
  const state: State = {
    alive: problem.exists.slice(),
    sizes: new Int16Array(choices.length),
    values: new Int16Array(choices.length).fill(-1),
    trail: [],
  };
  const decided: number[] = [];
  for (let choice = 0; choice < choices.length; choice += 1) {
    const from = offsets[choice] ?? 0;
    const to = offsets[choice + 1] ?? from;
    const answer = choice === compiled.familyChoice ? problem.family : (given[choice] ?? -1);
    let size = 0;
    let last = -1;
    for (let at = from; at < to; at += 1) {
      if (answer >= 0 && at !== from + answer) state.alive[at] = 0;
      if (state.alive[at] === 1) {
        size += 1;
        last = at - from;
      }
    }
    if (size === 0) return null;
    state.sizes[choice] = size;
    if (size === 1) {
      state.values[choice] = last;
      decided.push(choice);
    }
  }
  const search: Search = { compiled, problem, state, wishes };
  for (const constraint of problem.constraints) {
    if (constraint.scope.length === 0 && wishes.without?.[constraint.stop] !== 1 && !constraint.allows(0))
      return null;
  }
  const every = choices.map((_, choice) => choice);
  return propagate(search, decided) && decideAll(search, every) ? state.values : null;
}

interface Search {
  compiled: CompiledCatalogue;
  problem: Problem;
  state: State;
  wishes: SearchWishes;
}

/** Asks every rule of the newly decided choices; false when a choice runs out of options. */
function propagate(search: Search, decided: number[]): boolean {
  const { problem, wishes } = search;
  for (let next = decided.pop(); next !== undefined; next = decided.pop()) {
    for (const constraint of problem.constraintsOf[next] ?? []) {
      if (wishes.without?.[constraint.stop] === 1) continue;
      if (!check(search, constraint, decided)) return false;
    }
  }
  return true;
}

function check(search: Search, constraint: Constraint, decided: number[]): boolean {
  const { sizes, values } = search.state;
  const { scope, strides } = constraint;
  let undecided = -1;
  let cell = 0;
  for (let at = 0; at < scope.length; at += 1) {
    const choice = scope[at] ?? 0;
    if (sizes[choice] === 1) cell += (values[choice] ?? 0) * (strides[at] ?? 0);
    else if (undecided >= 0) return true;
    else undecided = at;
  }
  if (undecided < 0) return constraint.allows(cell);
  return filter(search, constraint, undecided, cell, decided);
}

/** Takes away the options of the one undecided choice that the rule does not allow. */
function filter(
  search: Search,
  constraint: Constraint,
  undecided: number,
  base: number,
  decided: number[],
): boolean {
  const { state, compiled } = search;
  const choice = constraint.scope[undecided] ?? 0;
  const stride = constraint.strides[undecided] ?? 0;
  const from = compiled.offsets[choice] ?? 0;
  const to = compiled.offsets[choice + 1] ?? from;
  let last = -1;
  for (let at = from; at < to; at += 1) {
    if (state.alive[at] !== 1) continue;
    if (constraint.allows(base + (at - from) * stride)) last = at - from;
    else remove(state, choice, at);
  }
  if (last < 0) return false;
  if (state.sizes[choice] === 1) {
    state.values[choice] = last;
    decided.push(choice);
  }
  return true;
}

function remove(state: State, choice: number, at: number): void {
  state.alive[at] = 0;
  state.sizes[choice] = (state.sizes[choice] ?? 0) - 1;
  state.trail.push(choice, at);
}

function undo(state: State, length: number): void {
  while (state.trail.length > length) {
    const at = state.trail.pop() ?? 0;
    const choice = state.trail.pop() ?? 0;
    state.alive[at] = 1;
    state.sizes[choice] = (state.sizes[choice] ?? 0) + 1;
  }
}

/**
 * Decides the given choices. They fall into groups that no rule joins any more; each group is decided by itself, and if one cannot
 * be, no other answer elsewhere would help.
 */
function decideAll(search: Search, among: readonly number[]): boolean {
  for (const choice of among) {
    if (search.state.sizes[choice] !== 1 && !decideGroup(search, groupOf(search, choice))) return false;
  }
  return true;
}

/** The undecided choices that rules join, directly or through each other, with this one. */
function groupOf(search: Search, first: number): number[] {
  const { problem, state, wishes } = search;
  const group = [first];
  for (let next = 0; next < group.length; next += 1) {
    for (const constraint of problem.constraintsOf[group[next] ?? first] ?? []) {
      if (wishes.without?.[constraint.stop] === 1) continue;
      for (const other of constraint.scope) {
        if (state.sizes[other] !== 1 && !group.includes(other)) group.push(other);
      }
    }
  }
  return group;
}

/** Decides one group: the choice with the fewest options left first, options without a witness before the others. */
function decideGroup(search: Search, group: readonly number[]): boolean {
  const { state, compiled, wishes } = search;
  const choice = group.reduce((best, other) =>
    (state.sizes[other] ?? 0) < (state.sizes[best] ?? 0) ? other : best,
  );
  const from = compiled.offsets[choice] ?? 0;
  const to = compiled.offsets[choice + 1] ?? from;
  const candidates: number[] = [];
  for (const seen of [0, 1]) {
    for (let at = from; at < to; at += 1) {
      if (state.alive[at] === 1 && (wishes.seen?.[at] ?? 0) === seen) candidates.push(at);
    }
  }
  for (const at of candidates) {
    const mark = state.trail.length;
    for (const other of candidates) if (other !== at) remove(state, choice, other);
    state.values[choice] = at - from;
    if (propagate(search, [choice]) && decideAll(search, group)) return true;
    undo(state, mark);
  }
  return false;
}
