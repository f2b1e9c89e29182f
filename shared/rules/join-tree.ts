import { eliminationOrder, type Bucket } from "./elimination.ts";
import { classProblemOf, type ClassProblem, type Factor } from "./option-classes.ts";
import type { Assignment, Problem } from "./problem.ts";

/** One choice with the choices that separate it from the rest, as the list of classes that may stand together. */
interface Node {
  choice: number;
  /** Nodes whose separators lie within this one. */
  children: readonly number[];
  rows: number;
  /** By row: class of the choice. */
  classes: Int16Array;
  /** By row: the cell of this node's message, an index into all messages. */
  own: Int32Array;
  /** By row and child: the cell of the child's message. */
  theirs: Int32Array;
}

/**
 * A family's stop rules compiled into a tree of tables in which every row is part of some valid build. What is open is found
 * in one pass from the leaves to the roots and one back, without any search. A choice's own answer is held at one node alone,
 * so that it can be left out when that choice is asked about.
 */
export interface JoinTree {
  /** Whether some valid build extends the answers. */
  possible(given: Assignment): boolean;
  /** Marks (1) the flat indices of all open options; a choice's own answer left out. False where nothing extends the answers. */
  open(given: Assignment, into: Uint8Array): boolean;
  /** How many valid builds extend the answers. */
  count(given: Assignment): bigint;
  /** Rows of all tables, and of the largest. */
  rows: { all: number; largest: number };
}

/** Cells of one table before it is thinned; above it the problem is left to the search. */
const mostCells = 1 << 17;

/** Null where the rules join too many choices. `offsets`: as of the compiled catalogue; `familyChoice` is left out of the tree. */
export function createJoinTree(
  problem: Problem,
  offsets: readonly number[],
  familyChoice: number,
): JoinTree | null {
  const small = classProblemOf(problem, offsets);
  const order = small === null ? null : eliminationOrder(small, mostCells);
  if (small === null || order === null) return null;
  const { nodes, cells } = createNodes(small, order);
  return createPasses({ nodes, cells, small, offsets, familyChoice, family: problem.family });
}

/** A node while it is built. */
interface Draft {
  bucket: Bucket;
  children: number[];
  /** Rows of classes: the choice, then its separator. */
  rows: number[][];
  /** Stride of each separator choice in the message. */
  strides: number[];
  cells: number;
}

function createNodes(small: ClassProblem, order: readonly Bucket[]): { nodes: Node[]; cells: number } {
  const place = new Map(order.map(({ choice }, at) => [choice, at]));
  const factorsAt: Factor[][] = order.map(() => []);
  for (const factor of small.factors) {
    // A rule whose choices are all of one class forbids everything; it may stand anywhere.
    const first = factor.scope.reduce(
      (least, choice) => Math.min(least, place.get(choice) ?? 0),
      order.length,
    );
    factorsAt[first === order.length ? 0 : first]?.push(factor);
  }
  const drafts: Draft[] = order.map((bucket) => {
    const sizes = bucket.separator.map((choice) => small.sizes[choice]?.length ?? 0);
    const strides = sizes.map((_, at) => sizes.slice(0, at).reduce((all, size) => all * size, 1));
    return { bucket, children: [], rows: [], strides, cells: sizes.reduce((all, size) => all * size, 1) };
  });
  drafts.forEach((draft, at) => {
    const parent = place.get(draft.bucket.separator[0] ?? -1);
    const messages = draft.children.map((child) => messageOf(drafts[child]));
    draft.rows = rowsOf(draft, small, [...(factorsAt[at] ?? []), ...messages]);
    if (parent !== undefined) drafts[parent]?.children.push(at);
  });
  // From the roots down: rows that fit no row of the parent go.
  for (const parent of [...drafts].reverse()) {
    for (const child of parent.children) {
      const draft = drafts[child];
      if (draft === undefined) continue;
      const fits = new Uint8Array(draft.cells);
      const cellOf = cellReader(draft, [parent.bucket.choice, ...parent.bucket.separator]);
      for (const row of parent.rows) fits[cellOf(row)] = 1;
      const own = cellReader(draft, [draft.bucket.choice, ...draft.bucket.separator]);
      draft.rows = draft.rows.filter((row) => fits[own(row)] === 1);
    }
  }
  let cells = 0;
  const starts = drafts.map((draft) => {
    const start = cells;
    cells += draft.cells;
    return start;
  });
  const nodes = drafts.map((draft, at) => nodeOf(draft, drafts, at, starts));
  return { nodes, cells };
}

/** Reads, from a row over these choices, the cell of a node's message. */
function cellReader(draft: Draft, choices: readonly number[]): (row: readonly number[]) => number {
  const places = draft.bucket.separator.map((choice) => choices.indexOf(choice));
  return (row) => places.reduce((cell, at, index) => cell + (row[at] ?? 0) * (draft.strides[index] ?? 0), 0);
}

/** What a node lets through to its parent. */
function messageOf(draft: Draft | undefined): Factor {
  if (draft === undefined) return { scope: [], table: new Uint8Array([1]), strides: [] };
  const table = new Uint8Array(draft.cells);
  const cellOf = cellReader(draft, [draft.bucket.choice, ...draft.bucket.separator]);
  for (const row of draft.rows) table[cellOf(row)] = 1;
  return { scope: draft.bucket.separator, table, strides: draft.strides };
}

/** All rows over the choice and its separator that the factors allow, each asked as soon as its choices are set. */
function rowsOf(draft: Draft, small: ClassProblem, factors: readonly Factor[]): number[][] {
  const choices = [draft.bucket.choice, ...draft.bucket.separator];
  const asked = choices.map((_, at) =>
    factors
      .map((factor) => ({ factor, places: factor.scope.map((choice) => choices.indexOf(choice)) }))
      .filter(({ places }) => Math.max(0, ...places) === at),
  );
  const rows: number[][] = [];
  const row: number[] = choices.map(() => 0);
  const fill = (at: number): void => {
    if (at === choices.length) {
      rows.push(row.slice());
      return;
    }
    const size = small.sizes[choices[at] ?? -1]?.length ?? 0;
    for (let one = 0; one < size; one += 1) {
      row[at] = one;
      const allowed = (asked[at] ?? []).every(
        ({ factor, places }) =>
          factor.table[
            places.reduce((cell, where, index) => cell + (row[where] ?? 0) * (factor.strides[index] ?? 0), 0)
          ] === 1,
      );
      if (allowed) fill(at + 1);
    }
  };
  fill(0);
  return rows;
}

function nodeOf(draft: Draft, drafts: readonly Draft[], at: number, starts: readonly number[]): Node {
  const { bucket, rows, children } = draft;
  const choices = [bucket.choice, ...bucket.separator];
  const own = cellReader(draft, choices);
  const readers = children.flatMap((child) => {
    const known = drafts[child];
    return known === undefined ? [] : [{ start: starts[child] ?? 0, cellOf: cellReader(known, choices) }];
  });
  return {
    choice: bucket.choice,
    children,
    rows: rows.length,
    classes: Int16Array.from(rows, (row) => row[0] ?? 0),
    own: Int32Array.from(rows, (row) => (starts[at] ?? 0) + own(row)),
    theirs: Int32Array.from(rows.flatMap((row) => readers.map(({ start, cellOf }) => start + cellOf(row)))),
  };
}

interface Parts {
  nodes: readonly Node[];
  cells: number;
  small: ClassProblem;
  offsets: readonly number[];
  familyChoice: number;
  family: number;
}

function createPasses({ nodes, cells, small, offsets, familyChoice, family }: Parts): JoinTree {
  const up = new Uint8Array(cells);
  const down = new Uint8Array(cells);
  /** By choice: the class of the answer; -1 = none, -2 = an answer that never stands. */
  const held = new Int16Array(small.sizes.length);
  const isChild = new Set(nodes.flatMap(({ children }) => children));
  const roots = nodes.flatMap((_, at) => (isChild.has(at) ? [] : [at]));
  const rootOf = new Int32Array(nodes.length);
  for (let at = nodes.length - 1; at >= 0; at -= 1) {
    if (!isChild.has(at)) rootOf[at] = at;
    for (const child of nodes[at]?.children ?? []) rootOf[child] = rootOf[at] ?? at;
  }
  const classesWithin = small.sizes.map((sizes) => new Uint8Array(sizes.length));

  const hold = (given: Assignment): void => {
    for (let choice = 0; choice < held.length; choice += 1) {
      const answer = given[choice] ?? -1;
      if (choice === familyChoice || answer < 0) held[choice] = -1;
      else {
        const of = small.classOf[choice]?.[answer] ?? -1;
        held[choice] = of < 0 ? -2 : of;
      }
    }
    if ((given[familyChoice] ?? -1) >= 0 && given[familyChoice] !== family) held[familyChoice] = -2;
  };

  /** From the leaves to the roots; how many roots let nothing through. */
  const collect = (): { blocked: number; root: number } => {
    up.fill(0);
    for (const { choice, children, rows, classes, own, theirs } of nodes) {
      const answer = held[choice] ?? -1;
      const width = children.length;
      for (let row = 0; row < rows; row += 1) {
        if (answer !== -1 && answer !== classes[row]) continue;
        let through = 1;
        for (let at = row * width; at < (row + 1) * width; at += 1) through &= up[theirs[at] ?? 0] ?? 0;
        if (through === 1) up[own[row] ?? 0] = 1;
      }
    }
    let blocked = 0;
    let root = -1;
    for (const at of roots) {
      const node = nodes[at];
      if (node !== undefined && node.rows > 0 && up[node.own[0] ?? 0] === 1) continue;
      blocked += 1;
      root = at;
    }
    return { blocked, root };
  };

  /** From the roots back: what the rest lets through, and with it which classes are open. */
  const distribute = (): void => {
    down.fill(0);
    for (const at of roots) {
      const node = nodes[at];
      if (node !== undefined && node.rows > 0) down[node.own[0] ?? 0] = 1;
    }
    for (const within of classesWithin) within.fill(0);
    for (let at = nodes.length - 1; at >= 0; at -= 1) {
      const node = nodes[at];
      if (node !== undefined) distributeFrom(node);
    }
  };

  const distributeFrom = ({ choice, children, rows, classes, own, theirs }: Node): void => {
    const answer = held[choice] ?? -1;
    const within = classesWithin[choice];
    const width = children.length;
    for (let row = 0; row < rows; row += 1) {
      if (down[own[row] ?? 0] !== 1) continue;
      let closed = 0;
      let which = -1;
      for (let at = row * width; at < (row + 1) * width; at += 1) {
        const cell = theirs[at] ?? 0;
        if (up[cell] === 1) continue;
        closed += 1;
        which = cell;
      }
      const one = classes[row] ?? 0;
      if (closed === 0 && within !== undefined) within[one] = 1;
      if (closed > 1 || (answer !== -1 && answer !== one)) continue;
      if (closed === 1) down[which] = 1;
      else for (let at = row * width; at < (row + 1) * width; at += 1) down[theirs[at] ?? 0] = 1;
    }
  };

  return {
    rows: {
      all: nodes.reduce((sum, { rows }) => sum + rows, 0),
      largest: nodes.reduce((most, { rows }) => Math.max(most, rows), 0),
    },
    possible(given) {
      hold(given);
      return collect().blocked === 0;
    },
    open(given, into) {
      hold(given);
      const { blocked, root } = collect();
      // Two parts that cannot stand for themselves: no one choice, left out, would help both.
      if (blocked > 1) return false;
      distribute();
      nodes.forEach(({ choice }, at) => {
        if (blocked === 1 && rootOf[at] !== root) return;
        const of = small.classOf[choice];
        const within = classesWithin[choice];
        const from = offsets[choice] ?? 0;
        if (of === undefined || within === undefined) return;
        for (let option = 0; option < of.length; option += 1) {
          const one = of[option] ?? -1;
          if (one >= 0 && within[one] === 1) into[from + option] = 1;
        }
      });
      return blocked === 0;
    },
    count(given) {
      hold(given);
      const counts: bigint[] = Array.from({ length: cells }, () => 0n);
      for (const { choice, children, rows, classes, own, theirs } of nodes) {
        const answer = held[choice] ?? -1;
        const width = children.length;
        for (let row = 0; row < rows; row += 1) {
          const one = classes[row] ?? 0;
          if (answer !== -1 && answer !== one) continue;
          let ways = answer === -1 ? BigInt(small.sizes[choice]?.[one] ?? 0) : 1n;
          for (let at = row * width; at < (row + 1) * width; at += 1) ways *= counts[theirs[at] ?? 0] ?? 0n;
          counts[own[row] ?? 0] = (counts[own[row] ?? 0] ?? 0n) + ways;
        }
      }
      return roots.reduce((all, at) => {
        const node = nodes[at];
        return node === undefined || node.rows === 0 ? 0n : all * (counts[node.own[0] ?? 0] ?? 0n);
      }, 1n);
    },
  };
}
