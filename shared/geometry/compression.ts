import { givenAbove } from "./given.ts";

/** 1 cu in = 16.387064 cc exactly. */
const cubicCentimetresPerCubicInch = 16.387064;

function disc(diameter: number, height: number): number {
  return (Math.PI / 4) * diameter * diameter * height * cubicCentimetresPerCubicInch;
}

/** What stands above the piston of one cylinder at top dead centre. */
interface ClearanceSpace {
  /** Inches. */
  bore: number;
  /** Chamber of the head, cc. */
  chamber: number;
  /** Inches. */
  gasketBore: number;
  gasketThickness: number;
  /** Inches, negative = the piston stands proud of the deck. */
  deckClearance: number;
  /** Crown of the piston, cc: a dish is positive, a dome negative. */
  crown: number;
  /** Crevice over the top ring, cc, where it is known. */
  crevice?: number;
}

/**
 * Clearance volume of one cylinder, cc: chamber + gasket + deck + dish - dome (+ crevice). Zero or below where the piston would not
 * leave any room. Throws RangeError on sizes that are not above zero or not finite.
 */
export function clearanceVolume(space: ClearanceSpace): number {
  givenAbove("the bore", space.bore);
  givenAbove("the chamber", space.chamber);
  givenAbove("the gasket bore", space.gasketBore);
  givenAbove("the gasket thickness", space.gasketThickness);
  const { deckClearance, crown, crevice = 0 } = space;
  if (!Number.isFinite(deckClearance) || !Number.isFinite(crown))
    throw new RangeError("the deck clearance and the crown must be finite numbers");
  if (!(crevice >= 0) || !Number.isFinite(crevice)) throw new RangeError("the crevice must not be negative");
  const gasket = disc(space.gasketBore, space.gasketThickness);
  return space.chamber + gasket + disc(space.bore, deckClearance) + crown + crevice;
}

/**
 * (Swept + clearance volume) / clearance volume of one cylinder, both in the same unit. Throws RangeError where either is not above
 * zero: a piston that fills the chamber has no compression ratio.
 */
export function compressionRatio(input: { swept: number; clearance: number }): number {
  givenAbove("the swept volume", input.swept);
  givenAbove("the clearance volume", input.clearance);
  return (input.swept + input.clearance) / input.clearance;
}
