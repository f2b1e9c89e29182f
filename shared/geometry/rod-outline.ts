import { lengthFromInches, measuredLength, toInches } from "../units/length.ts";

/** A point of a rod outline: [across, along] from the crankpin, inches. */
export type OutlinePoint = readonly [across: number, along: number];

/** Greatest distance of an outline point from the crankpin, inches, unrounded. Throws RangeError below three points. */
export function outlineReach(points: readonly OutlinePoint[]): number {
  if (points.length < 3) throw new RangeError("a rod outline needs at least three points");
  const reach = Math.max(...points.map(([across, along]) => Math.hypot(across, along)));
  if (!Number.isFinite(reach) || reach <= 0) throw new RangeError("a rod outline must have finite points");
  return reach;
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
  const swing = lengthFromInches(input.caseSwingRadius);
  const stroke = lengthFromInches(input.stroke);
  if (swing <= 0 || stroke <= 0)
    throw new RangeError("the case swing radius and the stroke must be above zero");
  return toInches(measuredLength(toInches(swing - stroke / 2) - outlineReach(input.outline)));
}
