import { lengthFromInches, toInches } from "../units/length.ts";
import { givenAllowance, givenLength, half, rodAndThrow } from "./given.ts";

/**
 * Exact dimensions of a block: sums and halves of lengths in whole units of 0.00005 in. All lengths in inches, on that
 * grid. Every function throws RangeError on a length that is negative, not a number or off the grid.
 */

/** Deck height - (stroke/2 + rod length + compression height); negative = the piston stands proud of the deck. */
export function deckClearance(input: {
  deckHeight: number;
  stroke: number;
  rodLength: number;
  compressionHeight: number;
}): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  const compressionHeight = givenLength("the compression height", input.compressionHeight);
  return toInches(givenLength("the deck height", input.deckHeight) - (crankThrow + rod + compressionHeight));
}

/** Least nominal cylinder wall: (barrel outside diameter - finish bore)/2 - core-shift allowance. */
export function cylinderWall(input: {
  barrelOutsideDiameter: number;
  finishBore: number;
  coreShift: number;
}): number {
  const barrel = givenLength("the barrel's outside diameter", input.barrelOutsideDiameter);
  return toInches(
    half(barrel - givenLength("the bore", input.finishBore)) -
      givenAllowance("the core shift", input.coreShift),
  );
}

/** Iron between two bores: bore spacing - finish bore. Throws RangeError for a bore wider than the spacing. */
export function webBetweenBores(input: { boreSpacing: number; finishBore: number }): number {
  const spacing = givenLength("the bore spacing", input.boreSpacing);
  const bore = givenLength("the bore", input.finishBore);
  if (bore > spacing) throw new RangeError("the bore is wider than the bore spacing");
  return toInches(spacing - bore);
}

/** Piston to head at top dead centre: deck clearance + gasket thickness; negative = the piston meets the head. */
export function pistonToHead(input: {
  deckHeight: number;
  stroke: number;
  rodLength: number;
  compressionHeight: number;
  gasketThickness: number;
}): number {
  const gasket = givenLength("the gasket thickness", input.gasketThickness);
  return toInches(lengthFromInches(deckClearance(input)) + gasket);
}

/**
 * Cylinders honed to the builder's pistons: each is its measured skirt + the clearance asked, inches, in the order given.
 * Throws RangeError where there is no skirt.
 */
export function honedCylinders(input: { skirts: readonly number[]; clearance: number }): number[] {
  if (input.skirts.length === 0) throw new RangeError("there must be at least one skirt");
  const clearance = givenAllowance("the clearance asked", input.clearance);
  return input.skirts.map((skirt, at) => toInches(givenLength(`skirt ${at + 1}`, skirt) + clearance));
}

/** Greatest difference of a cylinder from the chosen finish bore, either way, inches. */
export function greatestFromBore(input: { cylinders: readonly number[]; finishBore: number }): number {
  const bore = givenLength("the bore", input.finishBore);
  const differences = input.cylinders.map((size) => Math.abs(givenLength("the cylinder", size) - bore));
  return toInches(Math.max(0, ...differences));
}

/** Gasket bore - the bore it must clear, inches; negative = the gasket hangs into the cylinder. */
export function gasketOverBore(input: { gasketBore: number; bore: number }): number {
  return toInches(givenLength("the gasket bore", input.gasketBore) - givenLength("the bore", input.bore));
}

/** Bore as delivered: finish bore less the stock left on the diameter for the builder's hone. */
export function deliveredBore(input: { finishBore: number; stock: number }): number {
  const delivered = givenLength("the bore", input.finishBore) - givenAllowance("the stock", input.stock);
  if (delivered <= 0) throw new RangeError("the stock left is greater than the bore");
  return toInches(delivered);
}

/** How far the skirt leaves the barrel at bottom dead centre: hb - (rod length - stroke/2 - skirt length). */
export function skirtExposure(input: {
  barrelBottom: number;
  rodLength: number;
  stroke: number;
  skirtLength: number;
}): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  const skirt = givenLength("the skirt length", input.skirtLength);
  return toInches(
    givenLength("the height of the barrel bottom", input.barrelBottom) - (rod - crankThrow - skirt),
  );
}

/** (rod length - stroke/2) - boss drop - counterweight radius; negative = the counterweight meets the pin boss. */
export function counterweightToBoss(input: {
  rodLength: number;
  stroke: number;
  bossDrop: number;
  counterweightRadius: number;
}): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  const counterweight = givenLength("the counterweight radius", input.counterweightRadius);
  return toInches(rod - crankThrow - givenLength("the boss drop", input.bossDrop) - counterweight);
}

/** Case swing radius - counterweight radius. */
export function counterweightToCase(input: { caseSwingRadius: number; counterweightRadius: number }): number {
  const counterweight = givenLength("the counterweight radius", input.counterweightRadius);
  return toInches(givenLength("the case swing radius", input.caseSwingRadius) - counterweight);
}

/** Cam journal radius - lobe radius: the lobes pass through the bearings when the cam goes in. */
export function lobeToJournal(input: { journalDiameter: number; lobeRadius: number }): number {
  const journal = half(givenLength("the cam journal diameter", input.journalDiameter));
  return toInches(journal - givenLength("the lobe radius", input.lobeRadius));
}

/** Rod length / stroke, no unit. */
export function rodRatio(input: { rodLength: number; stroke: number }): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  return rod / (2 * crankThrow);
}
