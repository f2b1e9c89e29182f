/** 1 cu in = 2.54^3 cm3 = 16.387064 cm3 exactly. */
const cubicCentimetresPerCubicInch = 16.387064;

export interface Displacement {
  cubicInches: number;
  cubicCentimetres: number;
  litres: number;
}

/** Swept volume: pi/4 bore^2 stroke cylinders. Bore and stroke in inches; throws RangeError on anything not above zero. */
export function displacement(input: { bore: number; stroke: number; cylinders: number }): Displacement {
  const { bore, stroke, cylinders } = input;
  if (!(bore > 0 && stroke > 0) || !Number.isFinite(bore * stroke)) {
    throw new RangeError("bore and stroke must be above zero");
  }
  if (!Number.isSafeInteger(cylinders) || cylinders < 1)
    throw new RangeError("there must be at least one cylinder");
  const cubicInches = (Math.PI / 4) * bore * bore * stroke * cylinders;
  const cubicCentimetres = cubicInches * cubicCentimetresPerCubicInch;
  return { cubicInches, cubicCentimetres, litres: cubicCentimetres / 1000 };
}
