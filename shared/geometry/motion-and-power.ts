import { givenAbove } from "./given.ts";

/** 1 in = 0.0254 m exactly. */
const metresPerInch = 0.0254;

/** (rev/min, cu in, psi) to hp of a four-stroke: 33,000 ft lbf/min x 12 in/ft x 2 rev per working stroke. */
const powerConstant = 792_000;

/** Mean piston speed, 2 stroke rpm: m/s and ft/min. Stroke in inches. */
export function meanPistonSpeed(input: { stroke: number; rpm: number }): {
  metresPerSecond: number;
  feetPerMinute: number;
} {
  givenAbove("the stroke", input.stroke);
  givenAbove("the engine speed", input.rpm);
  return {
    metresPerSecond: (2 * input.stroke * metresPerInch * input.rpm) / 60,
    feetPerMinute: (input.stroke * input.rpm) / 6,
  };
}

/** Brake mean effective pressure, psi, that a power asks of a displacement at a speed: 792,000 hp / (cu in rpm). */
export function brakeMeanEffectivePressure(input: {
  horsepower: number;
  cubicInches: number;
  rpm: number;
}): number {
  givenAbove("the power", input.horsepower);
  givenAbove("the displacement", input.cubicInches);
  givenAbove("the engine speed", input.rpm);
  return (powerConstant * input.horsepower) / (input.cubicInches * input.rpm);
}

/**
 * What engines of a kind usually make, hp, low and high: bmep x cu in x rpm / 792,000. Pressures in psi, the range of the
 * duty and induction. A load on the parts, never a promise: heads, cam and fuel decide.
 */
export function powerRange(input: { cubicInches: number; rpm: number; low: number; high: number }): {
  low: number;
  high: number;
} {
  givenAbove("the displacement", input.cubicInches);
  givenAbove("the engine speed", input.rpm);
  givenAbove("the mean effective pressure", input.low);
  givenAbove("the higher mean effective pressure", input.high);
  if (input.high < input.low) throw new RangeError("the range of mean effective pressure is upside down");
  const perPressure = (input.cubicInches * input.rpm) / powerConstant;
  return { low: input.low * perPressure, high: input.high * perPressure };
}
