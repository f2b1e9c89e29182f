import type { CompiledCatalogue } from "./compile.ts";
import type { Assignment, Constraint, Problem } from "./problem.ts";

export interface SearchWishes {
  /** By flat option index: options to try last (they have a witness already). Read anew by every attempt. */
  seen?: Uint8Array;
  /** By stop rule: 1 = leave this rule out. */
  without?: Uint8Array;
}

/** What is left of every choice's options once the answers are given; asked for builds that extend them. */
export interface OpenSearch {
  /** Options of a choice that are not ruled out at once, as option indices. */
  left(choice: number): number[];
  /** A full assignment, with this option of this choice if they are given, that breaks no stop rule; null = there is none. */
  attempt(choice?: number, option?: number): Assignment | null;
}

/** A search over one problem; options left are bits, 32 to a word, and what is taken away is undone by the trail. */
interface Search {
  problem: Problem;
  wishes: SearchWishes;
  offsets: readonly number[];
  wordOffsets: readonly number[];
  words: Int32Array;
  /** By choice: how many options are left. */
  sizes: Int16Array;
  /** Word and what it held before, choice and its size before. */
  trail: number[];
  queue: number[];
  queued: Uint8Array;
  /** Decisions taken back since the attempt began. */
  setbacks: number;
}

/** Above so many decisions taken back, choices that no rule joins any more are told apart. */
const easySetbacks = 24;

/**
 * Starts a search in one family with the answers given; null where they cannot stand together at once.
 * Depth first: a rule of two choices keeps only options that the other side supports (arc consistency); a longer rule is asked
 * when at most one of its choices is undecided. Complete: null from an attempt means that no such build exists.
 */
export function startSearch(
  compiled: CompiledCatalogue,
  problem: Problem,
  given: Assignment,
  wishes: SearchWishes = {},
): OpenSearch | null {
  const search = prepare(compiled, problem, given, wishes);
  if (search === null || !propagate(search)) return null;
  const every = compiled.choices.map((_, choice) => choice);
  const root = search.trail.length;
  return {
    left: (choice) => optionsOf(search, choice),
    attempt(choice, option) {
      search.setbacks = 0;
      if (choice !== undefined && option !== undefined) decide(search, choice, option);
      const found = propagate(search) && decideAll(search, every);
      const build = found ? Int16Array.from(every, (one) => firstOf(search, one)) : null;
      undo(search, root);
      return build;
    },
  };
}

/** A full assignment of one family that extends the answers given and breaks no stop rule, or null if there is none. */
export function findExtension(
  compiled: CompiledCatalogue,
  problem: Problem,
  given: Assignment,
  wishes: SearchWishes = {},
): Assignment | null {
  return startSearch(compiled, problem, given, wishes)?.attempt() ?? null;
}

/** Offsets of each choice's first word. */
function wordOffsetsOf(offsets: readonly number[]): number[] {
  const found = [0];
  for (let choice = 0; choice + 1 < offsets.length; choice += 1) {
    const size = (offsets[choice + 1] ?? 0) - (offsets[choice] ?? 0);
    found.push((found[choice] ?? 0) + ((size + 31) >> 5));
  }
  return found;
}

function prepare(
  compiled: CompiledCatalogue,
  problem: Problem,
  given: Assignment,
  wishes: SearchWishes,
): Search | null {
  const { offsets, choices } = compiled;
  const wordOffsets = wordOffsetsOf(offsets);
  const search: Search = {
    problem,
    wishes,
    offsets,
    wordOffsets,
    words: new Int32Array(wordOffsets.at(-1) ?? 0),
    sizes: new Int16Array(choices.length),
    trail: [],
    queue: [],
    queued: new Uint8Array(choices.length),
    setbacks: 0,
  };
  for (let choice = 0; choice < choices.length; choice += 1) {
    const from = offsets[choice] ?? 0;
    const count = (offsets[choice + 1] ?? from) - from;
    const answer = given[choice] ?? -1;
    const only = choice === compiled.familyChoice ? problem.family : answer;
    if (choice === compiled.familyChoice && answer >= 0 && answer !== problem.family) return null;
    for (let option = 0; option < count; option += 1) {
      if (problem.exists[from + option] !== 1 || (only >= 0 && only !== option)) continue;
      const word = (wordOffsets[choice] ?? 0) + (option >> 5);
      search.words[word] = (search.words[word] ?? 0) | (1 << (option & 31));
      search.sizes[choice] = (search.sizes[choice] ?? 0) + 1;
    }
    if (search.sizes[choice] === 0) return null;
    enqueue(search, choice);
  }
  for (const constraint of problem.constraints) {
    if (constraint.scope.length > 1 || wishes.without?.[constraint.stop] === 1) continue;
    if (constraint.scope.length === 0 ? !constraint.allows(0) : !filter(search, constraint, 0, 0))
      return null;
  }
  return search;
}

function enqueue(search: Search, choice: number): void {
  if (search.queued[choice] === 1) return;
  search.queued[choice] = 1;
  search.queue.push(choice);
}

/** Takes options away until every rule is content; false when a choice runs out of options. */
function propagate(search: Search): boolean {
  const { problem, wishes, queue, queued } = search;
  for (let next = 0; next < queue.length; next += 1) {
    const choice = queue[next] ?? 0;
    queued[choice] = 0;
    for (const constraint of problem.constraintsOf[choice] ?? []) {
      if (wishes.without?.[constraint.stop] === 1) continue;
      const { length } = constraint.scope;
      if (length === 1 || (length === 2 ? revise(search, constraint, choice) : check(search, constraint)))
        continue;
      for (const left of queue) queued[left] = 0;
      queue.length = 0;
      return false;
    }
  }
  queue.length = 0;
  return true;
}

const popCount = (word: number): number => {
  let bits = word - ((word >>> 1) & 0x55555555);
  bits = (bits & 0x33333333) + ((bits >>> 2) & 0x33333333);
  return Math.imul((bits + (bits >>> 4)) & 0x0f0f0f0f, 0x01010101) >>> 24;
};

/** Keeps of the other choice of a two-choice rule what an option left of this one supports. */
function revise(search: Search, constraint: Constraint, choice: number): boolean {
  const { words, wordOffsets, sizes } = search;
  const here = constraint.scope[0] === choice ? 0 : 1;
  const other = constraint.scope[1 - here] ?? 0;
  const { masks, width } = supportsOf(search, constraint, here);
  const from = wordOffsets[choice] ?? 0;
  const to = wordOffsets[choice + 1] ?? from;
  const target = wordOffsets[other] ?? 0;
  let removed = 0;
  for (let at = 0; at < width; at += 1) {
    const before = words[target + at] ?? 0;
    let supported = 0;
    for (let word = from; word < to && (before & ~supported) !== 0; word += 1) {
      for (let left = words[word] ?? 0; left !== 0; left &= left - 1) {
        const option = ((word - from) << 5) + 31 - Math.clz32(left & -left);
        supported |= masks[option * width + at] ?? 0;
        if ((before & ~supported) === 0) break;
      }
    }
    const lost = before & ~supported;
    if (lost === 0) continue;
    removed += popCount(lost);
    keep(search, other, target + at, before & supported, popCount(lost));
  }
  if (removed === 0) return true;
  if ((sizes[other] ?? 0) === 0) return false;
  enqueue(search, other);
  return true;
}

interface Supports {
  /** By option x width + word: which options of the other choice it may stand with. */
  masks: Int32Array;
  width: number;
}

const supports = new WeakMap<Constraint, [Supports, Supports]>();

/** What each option of the rule's first (0) or second (1) choice supports of the other. */
function supportsOf({ offsets }: Search, constraint: Constraint, here: 0 | 1): Supports {
  const known = supports.get(constraint);
  if (known !== undefined) return known[here];
  const sizes = constraint.scope.map((choice) => (offsets[choice + 1] ?? 0) - (offsets[choice] ?? 0));
  const create = (side: 0 | 1): Supports => {
    const width = ((sizes[1 - side] ?? 0) + 31) >> 5;
    return { masks: new Int32Array((sizes[side] ?? 0) * width), width };
  };
  const made: [Supports, Supports] = [create(0), create(1)];
  for (let first = 0; first < (sizes[0] ?? 0); first += 1) {
    for (let second = 0; second < (sizes[1] ?? 0); second += 1) {
      const cell = first * (constraint.strides[0] ?? 0) + second * (constraint.strides[1] ?? 0);
      if (!constraint.allows(cell)) continue;
      const forward = first * made[0].width + (second >> 5);
      made[0].masks[forward] = (made[0].masks[forward] ?? 0) | (1 << (second & 31));
      const backward = second * made[1].width + (first >> 5);
      made[1].masks[backward] = (made[1].masks[backward] ?? 0) | (1 << (first & 31));
    }
  }
  supports.set(constraint, made);
  return made[here];
}

/** Asks a longer rule if at most one of its choices is undecided. */
function check(search: Search, constraint: Constraint): boolean {
  const { scope, strides } = constraint;
  let undecided = -1;
  let cell = 0;
  for (let at = 0; at < scope.length; at += 1) {
    const choice = scope[at] ?? 0;
    if (search.sizes[choice] === 1) cell += firstOf(search, choice) * (strides[at] ?? 0);
    else if (undecided >= 0) return true;
    else undecided = at;
  }
  return undecided < 0 ? constraint.allows(cell) : filter(search, constraint, undecided, cell);
}

/** Takes away the options of the one undecided choice that the rule does not allow. */
function filter(search: Search, constraint: Constraint, undecided: number, base: number): boolean {
  const choice = constraint.scope[undecided] ?? 0;
  const stride = constraint.strides[undecided] ?? 0;
  const before = search.sizes[choice];
  for (const option of optionsOf(search, choice)) {
    if (constraint.allows(base + option * stride)) continue;
    const word = (search.wordOffsets[choice] ?? 0) + (option >> 5);
    keep(search, choice, word, (search.words[word] ?? 0) & ~(1 << (option & 31)), 1);
  }
  if (search.sizes[choice] === 0) return false;
  if (search.sizes[choice] !== before) enqueue(search, choice);
  return true;
}

/** Writes a word of a choice with so many options fewer. */
function keep(search: Search, choice: number, word: number, left: number, fewer: number): void {
  const { words, sizes, trail } = search;
  trail.push(word, words[word] ?? 0, choice, sizes[choice] ?? 0);
  words[word] = left;
  sizes[choice] = (sizes[choice] ?? 0) - fewer;
}

function undo({ trail, words, sizes }: Search, length: number): void {
  while (trail.length > length) {
    const size = trail.pop() ?? 0;
    const choice = trail.pop() ?? 0;
    const before = trail.pop() ?? 0;
    const word = trail.pop() ?? 0;
    words[word] = before;
    sizes[choice] = size;
  }
}

function firstOf({ words, wordOffsets }: Search, choice: number): number {
  const from = wordOffsets[choice] ?? 0;
  const to = wordOffsets[choice + 1] ?? from;
  for (let word = from; word < to; word += 1) {
    const left = words[word] ?? 0;
    if (left !== 0) return ((word - from) << 5) + 31 - Math.clz32(left & -left);
  }
  return -1;
}

/** Options left of a choice. */
function optionsOf({ words, wordOffsets }: Search, choice: number): number[] {
  const from = wordOffsets[choice] ?? 0;
  const to = wordOffsets[choice + 1] ?? from;
  const found: number[] = [];
  for (let word = from; word < to; word += 1) {
    for (let left = words[word] ?? 0; left !== 0; left &= left - 1) {
      found.push(((word - from) << 5) + 31 - Math.clz32(left & -left));
    }
  }
  return found;
}

/**
 * Decides the given choices. When that is not easy they are told apart into groups that no rule joins any more; each group is
 * decided by itself, and if one cannot be, no other answer elsewhere would help.
 */
function decideAll(search: Search, among: readonly number[]): boolean {
  if (search.setbacks < easySetbacks) return decideNext(search, among);
  const grouped = new Uint8Array(search.sizes.length);
  for (const choice of among) {
    if (search.sizes[choice] === 1 || grouped[choice] === 1) continue;
    if (!decideNext(search, groupOf(search, choice, grouped))) return false;
  }
  return true;
}

/** The undecided choices that rules join, directly or through each other, with this one. */
function groupOf({ problem, sizes, wishes }: Search, first: number, grouped: Uint8Array): number[] {
  const group = [first];
  grouped[first] = 1;
  for (let next = 0; next < group.length; next += 1) {
    for (const constraint of problem.constraintsOf[group[next] ?? first] ?? []) {
      if (wishes.without?.[constraint.stop] === 1) continue;
      for (const other of constraint.scope) {
        if (sizes[other] === 1 || grouped[other] === 1) continue;
        grouped[other] = 1;
        group.push(other);
      }
    }
  }
  return group;
}

/** Decides the choice with the fewest options left, options without a witness before the others, and then the rest. */
function decideNext(search: Search, among: readonly number[]): boolean {
  const { sizes, offsets, problem } = search;
  let choice = -1;
  let fewest = Number.POSITIVE_INFINITY;
  for (const other of among) {
    const size = sizes[other] ?? 0;
    if (size === 1 || size > fewest) continue;
    const joined = problem.constraintsOf[other]?.length ?? 0;
    if (size === fewest && joined <= (problem.constraintsOf[choice]?.length ?? 0)) continue;
    choice = other;
    fewest = size;
  }
  if (choice < 0) return true;
  const options = optionsOf(search, choice);
  const { seen } = search.wishes;
  const from = offsets[choice] ?? 0;
  for (const last of [0, 1]) {
    for (const option of options) {
      if ((seen?.[from + option] ?? 0) !== last) continue;
      const mark = search.trail.length;
      decide(search, choice, option);
      if (propagate(search) && decideAll(search, among)) return true;
      undo(search, mark);
      search.setbacks += 1;
    }
  }
  return false;
}

/** Leaves a choice this option alone. */
function decide(search: Search, choice: number, option: number): void {
  const { words, wordOffsets } = search;
  const from = wordOffsets[choice] ?? 0;
  const to = wordOffsets[choice + 1] ?? from;
  for (let word = from; word < to; word += 1) {
    const before = words[word] ?? 0;
    const left = word - from === option >> 5 ? before & (1 << (option & 31)) : 0;
    if (left !== before) keep(search, choice, word, left, popCount(before) - popCount(left));
  }
  enqueue(search, choice);
}
