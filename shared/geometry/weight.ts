/** Density of grey iron, lb/cu in (7.15 g/cm3; two foundries' pages). */
const greyIronDensity = 0.258;

/**
 * Weight of the bare block, lb: family weight at its base bore, plus option weights, less the iron bored out beyond the
 * base bore (a bore delivered below it leaves iron in). Lengths in inches; barrel length = deck height - barrel bottom.
 */
export function blockWeight(input: {
  familyWeight: number;
  optionWeights: readonly number[];
  baseBore: number;
  deliveredBore: number;
  barrelLength: number;
  cylinders: number;
}): number {
  const { familyWeight, optionWeights, baseBore, barrelLength, cylinders } = input;
  if (!(familyWeight > 0 && baseBore > 0 && input.deliveredBore > 0 && barrelLength > 0 && cylinders > 0)) {
    throw new RangeError("weight, bores, barrel length and cylinders must be above zero");
  }
  const ring = (Math.PI / 4) * (input.deliveredBore * input.deliveredBore - baseBore * baseBore);
  const added = optionWeights.reduce((sum, weight) => sum + weight, 0);
  return familyWeight + added - ring * barrelLength * cylinders * greyIronDensity;
}
