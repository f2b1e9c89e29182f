import { lengthFromInches, toInches } from "../units/length.ts";

/**
 * Exact dimensions of a block: sums and halves of lengths in whole units of 0.00005 in. All lengths in inches, on that
 * grid. Every function throws RangeError on a length that is negative, not a number or off the grid.
 */

function length(name: string, inches: number): number {
  if (!Number.isFinite(inches) || inches <= 0) throw new RangeError(`${name} must be a length above zero`);
  return lengthFromInches(inches);
}

function allowance(name: string, inches: number): number {
  if (!Number.isFinite(inches) || inches < 0) throw new RangeError(`${name} must not be negative`);
  return lengthFromInches(inches);
}

/** Half of a length in units; exact, for a grid of 0.0001 in leaves no odd unit. */
function half(units: number): number {
  return units / 2;
}

function rodAndThrow(stroke: number, rodLength: number): { crankThrow: number; rod: number } {
  const crankThrow = half(length("the stroke", stroke));
  const rod = length("the rod length", rodLength);
  if (rod <= crankThrow) throw new RangeError("the rod is shorter than half the stroke");
  return { crankThrow, rod };
}

/** Deck height - (stroke/2 + rod length + compression height); negative = the piston stands proud of the deck. */
export function deckClearance(input: {
  deckHeight: number;
  stroke: number;
  rodLength: number;
  compressionHeight: number;
}): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  const compressionHeight = length("the compression height", input.compressionHeight);
  return toInches(length("the deck height", input.deckHeight) - (crankThrow + rod + compressionHeight));
}

/** Least nominal cylinder wall: (barrel outside diameter - finish bore)/2 - core-shift allowance. */
export function cylinderWall(input: {
  barrelOutsideDiameter: number;
  finishBore: number;
  coreShift: number;
}): number {
  const barrel = length("the barrel's outside diameter", input.barrelOutsideDiameter);
  return toInches(
    half(barrel - length("the bore", input.finishBore)) - allowance("the core shift", input.coreShift),
  );
}

/** Iron between two bores: bore spacing - finish bore. */
export function webBetweenBores(input: { boreSpacing: number; finishBore: number }): number {
  return toInches(length("the bore spacing", input.boreSpacing) - length("the bore", input.finishBore));
}

/** Bore as delivered: finish bore less the stock left on the diameter for the builder's hone. */
export function deliveredBore(input: { finishBore: number; stock: number }): number {
  const delivered = length("the bore", input.finishBore) - allowance("the stock", input.stock);
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
  const skirt = length("the skirt length", input.skirtLength);
  return toInches(length("the height of the barrel bottom", input.barrelBottom) - (rod - crankThrow - skirt));
}

/** (rod length - stroke/2) - boss drop - counterweight radius; negative = the counterweight meets the pin boss. */
export function counterweightToBoss(input: {
  rodLength: number;
  stroke: number;
  bossDrop: number;
  counterweightRadius: number;
}): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  const counterweight = length("the counterweight radius", input.counterweightRadius);
  return toInches(rod - crankThrow - length("the boss drop", input.bossDrop) - counterweight);
}

/** Case swing radius - counterweight radius. */
export function counterweightToCase(input: { caseSwingRadius: number; counterweightRadius: number }): number {
  const counterweight = length("the counterweight radius", input.counterweightRadius);
  return toInches(length("the case swing radius", input.caseSwingRadius) - counterweight);
}

/** Cam journal radius - lobe radius: the lobes pass through the bearings when the cam goes in. */
export function lobeToJournal(input: { journalDiameter: number; lobeRadius: number }): number {
  const journal = half(length("the cam journal diameter", input.journalDiameter));
  return toInches(journal - length("the lobe radius", input.lobeRadius));
}

/** Rod length / stroke, no unit. */
export function rodRatio(input: { rodLength: number; stroke: number }): number {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  return rod / (2 * crankThrow);
}
