import type { Constraint, Problem } from "./problem.ts";

/**
 * A family's stop rules in small: options that no rule tells apart are one class, options that never stand are none, and
 * rules are tables over classes. What holds of one option of a class holds of all.
 */
export interface ClassProblem {
  /** By choice, by option index: the class, or -1 where the option does not exist or a rule alone forbids it. */
  classOf: readonly Int16Array[];
  /** By choice, by class: how many options it has. */
  sizes: readonly (readonly number[])[];
  factors: readonly Factor[];
}

/** A rule over at least two choices of more than one class each: 1 where the classes may stand together. */
export interface Factor {
  scope: readonly number[];
  /** By the sum of class x stride, the first choice running fastest. */
  table: Uint8Array;
  strides: readonly number[];
}

/** Cells of one rule's table; above it the problem is left to the search. */
const mostCells = 1 << 18;

/** Null where a rule's table is too large, or where nothing at all may stand. `offsets`: as of the compiled catalogue. */
export function classProblemOf(problem: Problem, offsets: readonly number[]): ClassProblem | null {
  const domains = domainsOf(problem, offsets);
  const joint = problem.constraints.filter(({ scope }) => scope.length > 1);
  const cells = joint.map(({ scope }) => product(scope.map((choice) => domains[choice]?.length ?? 0)));
  if (cells.some((count) => count > mostCells)) return null;
  const tables = joint.map((constraint) => tableOver(constraint, domains));
  const classes = domains.map((domain, choice) => {
    const marks: string[] = domain.map(() => "");
    tables.forEach((table, at) => {
      const where = joint[at]?.scope.indexOf(choice) ?? -1;
      if (where >= 0) addSlices(marks, table, where);
    });
    const numbers = new Map<string, number>();
    return marks.map((mark) => {
      const found = numbers.get(mark) ?? numbers.size;
      numbers.set(mark, found);
      return found;
    });
  });
  const classOf = domains.map((domain, choice) => {
    const of = new Int16Array((offsets[choice + 1] ?? 0) - (offsets[choice] ?? 0)).fill(-1);
    domain.forEach((option, at) => (of[option] = classes[choice]?.[at] ?? -1));
    return of;
  });
  const sizes = classes.map((of) => {
    const counts: number[] = Array.from({ length: Math.max(-1, ...of) + 1 }, () => 0);
    for (const one of of) counts[one] = (counts[one] ?? 0) + 1;
    return counts;
  });
  const factors = joint.flatMap(({ scope }, at) => {
    const factor = factorOf(scope, tables[at] ?? emptyTable, classes, sizes);
    return factor === null ? [] : [factor];
  });
  return { classOf, sizes, factors };
}

function product(sizes: readonly number[]): number {
  return sizes.reduce((all, size) => all * size, 1);
}

/** By choice: the options that exist and that no rule over this choice alone forbids; none at all where a rule forbids all. */
function domainsOf(problem: Problem, offsets: readonly number[]): number[][] {
  const never = problem.constraints.some(
    (constraint) => constraint.scope.length === 0 && !constraint.allows(0),
  );
  return problem.constraintsOf.map((constraints, choice) => {
    const own = constraints.filter(({ scope }) => scope.length === 1);
    const from = offsets[choice] ?? 0;
    const count = (offsets[choice + 1] ?? from) - from;
    return Array.from({ length: count }, (_, option) => option).filter(
      (option) =>
        !never &&
        problem.exists[from + option] === 1 &&
        own.every((constraint) => constraint.allows(option * (constraint.strides[0] ?? 1))),
    );
  });
}

interface DomainTable {
  sizes: readonly number[];
  cells: Uint8Array;
}

const emptyTable: DomainTable = { sizes: [], cells: new Uint8Array(0) };

/** A rule's table over the domains, the first choice running fastest. */
function tableOver(constraint: Constraint, domains: readonly number[][]): DomainTable {
  const { scope, strides } = constraint;
  const own = scope.map((choice) => domains[choice] ?? []);
  const sizes = own.map(({ length }) => length);
  const cells = new Uint8Array(product(sizes));
  let next = 0;
  const fill = (at: number, cell: number): void => {
    if (at < 0) {
      cells[next] = constraint.allows(cell) ? 1 : 0;
      next += 1;
      return;
    }
    for (const option of own[at] ?? []) fill(at - 1, cell + option * (strides[at] ?? 0));
  };
  fill(scope.length - 1, 0);
  return { sizes, cells };
}

/** Adds to each option's mark what the table allows with it. */
function addSlices(marks: string[], { sizes, cells }: DomainTable, where: number): void {
  const inner = product(sizes.slice(0, where));
  const size = sizes[where] ?? 1;
  for (let option = 0; option < size; option += 1) {
    let mark = "";
    let bits = 1;
    for (let from = option * inner; from < cells.length; from += inner * size) {
      for (let at = from; at < from + inner; at += 1) {
        bits = bits * 2 + (cells[at] ?? 0);
        if (bits >= 32768) {
          mark += String.fromCharCode(bits);
          bits = 1;
        }
      }
    }
    marks[option] += mark + String.fromCharCode(bits);
  }
}

/** The table over classes, choices of one class left out; null where it forbids nothing. */
function factorOf(
  scope: readonly number[],
  { sizes, cells }: DomainTable,
  classes: readonly (readonly number[])[],
  classSizes: readonly (readonly number[])[],
): Factor | null {
  if (!cells.includes(0)) return null;
  const kept = scope.filter((choice) => (classSizes[choice]?.length ?? 0) > 1);
  const strides = kept.map((_, at) =>
    product(kept.slice(0, at).map((choice) => classSizes[choice]?.length ?? 1)),
  );
  const table = new Uint8Array(product(kept.map((choice) => classSizes[choice]?.length ?? 1)));
  for (let cell = 0; cell < cells.length; cell += 1) {
    if (cells[cell] !== 1) continue;
    let rest = cell;
    let target = 0;
    for (let at = 0; at < scope.length; at += 1) {
      const size = sizes[at] ?? 1;
      const place = kept.indexOf(scope[at] ?? -1);
      if (place >= 0) target += (classes[scope[at] ?? -1]?.[rest % size] ?? 0) * (strides[place] ?? 0);
      rest = Math.floor(rest / size);
    }
    table[target] = 1;
  }
  return { scope: kept, table, strides };
}
