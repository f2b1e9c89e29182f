import { measuredLength, toInches } from "../units/length.ts";
import { givenLength, half } from "./given.ts";

/** A point of a rod outline: [across, along] from the crankpin, inches. */
export type OutlinePoint = readonly [across: number, along: number];

/** A rod outline made ready to measure from: its edges one after the other, and the circle around it. */
export interface MeasuredOutline {
  edges: number;
  /** Four numbers an edge: start across, start along, and the way to its end. */
  lines: Float64Array;
  /** 1 / length² of each edge. */
  inverse: Float64Array;
  /** Greatest distance of a point from the crankpin, inches. */
  reach: number;
  /** Whether it is convex: then its signed distance is a convex function of the point. */
  convex: boolean;
}

/** Twice the signed area of the triangle a, b, c. */
function turn([ax, ay]: OutlinePoint, [bx, by]: OutlinePoint, [cx, cy]: OutlinePoint): number {
  return (bx - ax) * (cy - ay) - (by - ay) * (cx - ax);
}

function within(a: OutlinePoint, b: OutlinePoint, p: OutlinePoint): boolean {
  return (
    Math.min(a[0], b[0]) <= p[0] &&
    p[0] <= Math.max(a[0], b[0]) &&
    Math.min(a[1], b[1]) <= p[1] &&
    p[1] <= Math.max(a[1], b[1])
  );
}

/** Whether two edges have a point in common. */
function meet(a: OutlinePoint, b: OutlinePoint, c: OutlinePoint, d: OutlinePoint): boolean {
  const [c1, c2, a1, a2] = [turn(a, b, c), turn(a, b, d), turn(c, d, a), turn(c, d, b)];
  if (c1 * c2 < 0 && a1 * a2 < 0) return true;
  return (
    (c1 === 0 && within(a, b, c)) ||
    (c2 === 0 && within(a, b, d)) ||
    (a1 === 0 && within(c, d, a)) ||
    (a2 === 0 && within(c, d, b))
  );
}

/**
 * What is wrong with a rod outline, as a plain sentence; null = nothing. It must have at least three points, all finite, no two
 * neighbours alike, and its edges may meet only where one follows the other.
 */
export function outlineProblem(points: readonly OutlinePoint[]): string | null {
  if (points.length < 3) return "a rod outline needs at least three points";
  if (!points.flat().every(Number.isFinite)) return "a rod outline must have finite points";
  const edges = points.map((start, at) => ({ start, end: points[(at + 1) % points.length] ?? start }));
  if (edges.some(({ start, end }) => start[0] === end[0] && start[1] === end[1]))
    return "a rod outline must not have the same point twice in a row";
  for (const [at, edge] of edges.entries()) {
    for (const [other, { start, end }] of edges.entries()) {
      if (other <= at) continue;
      if (other === at + 1 || (at === 0 && other === edges.length - 1)) {
        const [before, shared, after] =
          other === at + 1 ? [edge.start, start, end] : [start, edge.start, edge.end];
        if (doublesBack(before, shared, after)) return "the rod outline crosses itself";
      } else if (meet(edge.start, edge.end, start, end)) return "the rod outline crosses itself";
    }
  }
  return null;
}

/** Whether the edge that leaves the shared point runs back over the one that came to it. */
function doublesBack(before: OutlinePoint, shared: OutlinePoint, after: OutlinePoint): boolean {
  const back =
    (before[0] - shared[0]) * (after[0] - shared[0]) + (before[1] - shared[1]) * (after[1] - shared[1]);
  return turn(before, shared, after) === 0 && back > 0;
}

const measured = new WeakMap<readonly OutlinePoint[], MeasuredOutline>();

/** Makes an outline ready to measure from; kept per list of points. Throws RangeError with `outlineProblem`'s sentence. */
export function measureOutline(points: readonly OutlinePoint[]): MeasuredOutline {
  const known = measured.get(points);
  if (known !== undefined) return known;
  const problem = outlineProblem(points);
  if (problem !== null) throw new RangeError(problem);
  const lines = new Float64Array(points.length * 4);
  const inverse = new Float64Array(points.length);
  points.forEach(([across, along], at) => {
    const [nextAcross, nextAlong] = points[(at + 1) % points.length] ?? [across, along];
    lines.set([across, along, nextAcross - across, nextAlong - along], at * 4);
    inverse[at] = 1 / ((nextAcross - across) ** 2 + (nextAlong - along) ** 2);
  });
  const turns = points.map((point, at) => {
    const next = points[(at + 1) % points.length] ?? point;
    return Math.sign(turn(point, next, points[(at + 2) % points.length] ?? point));
  });
  const made: MeasuredOutline = {
    edges: points.length,
    lines,
    inverse,
    reach: Math.max(...points.map(([across, along]) => Math.hypot(across, along))),
    convex: !(turns.includes(1) && turns.includes(-1)),
  };
  measured.set(points, made);
  return made;
}

/** What `measureFrom` finds of a point: written anew by every call, for it is asked many thousand times. */
export interface Measured {
  /** Inches, negative inside. */
  distance: number;
  /** Nearest point of the outline. */
  across: number;
  along: number;
}

/** Signed distance of a point of the rod's plane from the outline, and the nearest point of it, inches, written into `found`. */
export function measureFrom(outline: MeasuredOutline, across: number, along: number, found: Measured): void {
  const { edges, lines, inverse } = outline;
  let least = Infinity;
  let inside = false;
  for (let edge = 0, at = 0; edge < edges; edge += 1, at += 4) {
    const wayAcross = lines[at + 2] ?? 0;
    const wayAlong = lines[at + 3] ?? 0;
    const fromAcross = across - (lines[at] ?? 0);
    const fromAlong = along - (lines[at + 1] ?? 0);
    let share = (fromAcross * wayAcross + fromAlong * wayAlong) * (inverse[edge] ?? 0);
    if (share < 0) share = 0;
    else if (share > 1) share = 1;
    const apartAcross = fromAcross - share * wayAcross;
    const apartAlong = fromAlong - share * wayAlong;
    const square = apartAcross * apartAcross + apartAlong * apartAlong;
    if (square < least) {
      least = square;
      found.across = across - apartAcross;
      found.along = along - apartAlong;
    }
    // A line from the point to the right crosses the edge: counted to tell inside from outside.
    if (
      fromAlong < 0 !== fromAlong < wayAlong &&
      fromAcross * wayAlong < fromAlong * wayAcross === wayAlong > 0
    )
      inside = !inside;
  }
  found.distance = inside ? -Math.sqrt(least) : Math.sqrt(least);
}

/**
 * Rod to case: case swing radius - (stroke/2 + reach of the outline), inches, rounded to 0.0001 in; exact whatever the rod
 * length, for the reach turns about the crankpin. Negative = the rod would cut the case.
 */
export function rodToCase(input: {
  caseSwingRadius: number;
  stroke: number;
  outline: readonly OutlinePoint[];
}): number {
  const swing = givenLength("the case swing radius", input.caseSwingRadius);
  const crankThrow = half(givenLength("the stroke", input.stroke));
  return toInches(measuredLength(toInches(swing - crankThrow) - measureOutline(input.outline).reach));
}
