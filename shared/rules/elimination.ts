import type { ClassProblem } from "./option-classes.ts";

/** One choice's place in the join tree: it is left out after all choices before it, joining those that come later. */
export interface Bucket {
  choice: number;
  /** The later choices that are joined with it, by their place in the order. */
  separator: number[];
}

/**
 * An order in which to leave the choices out, one at a time: always the one whose table with the choices still joined to it has
 * the fewest cells (over classes). Null where a table would have more than `mostCells`.
 */
export function eliminationOrder({ sizes, factors }: ClassProblem, mostCells: number): Bucket[] | null {
  const joined = sizes.map(() => new Set<number>());
  for (const { scope } of factors) {
    for (const choice of scope) for (const other of scope) if (other !== choice) joined[choice]?.add(other);
  }
  const cellsOf = (choice: number): number =>
    [...(joined[choice] ?? [])].reduce(
      (cells, other) => cells * (sizes[other]?.length ?? 1),
      sizes[choice]?.length ?? 1,
    );
  const left = new Map(sizes.map((_, choice) => [choice, cellsOf(choice)]));
  const order: Bucket[] = [];
  while (left.size > 0) {
    let choice = -1;
    let least = Number.POSITIVE_INFINITY;
    for (const [candidate, cells] of left) {
      if (cells < least) [choice, least] = [candidate, cells];
    }
    if (choice < 0 || least > mostCells) return null;
    left.delete(choice);
    const separator = [...(joined[choice] ?? [])];
    order.push({ choice, separator });
    for (const one of separator) {
      joined[one]?.delete(choice);
      for (const other of separator) if (other !== one) joined[one]?.add(other);
    }
    for (const one of separator) left.set(one, cellsOf(one));
  }
  const place = new Map(order.map((bucket, at) => [bucket.choice, at]));
  for (const bucket of order) bucket.separator.sort((a, b) => (place.get(a) ?? 0) - (place.get(b) ?? 0));
  return order;
}
