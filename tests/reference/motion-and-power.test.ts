import { describe, expect, test } from "vitest";
import {
  brakeMeanEffectivePressure,
  meanPistonSpeed,
  powerRange,
} from "#shared/geometry/motion-and-power.ts";

describe("mean piston speed", () => {
  test("stroke 90 mm at 3,000 rpm is 9 m/s (encyclopaedia, mean piston speed)", () => {
    expect(meanPistonSpeed({ stroke: 90 / 25.4, rpm: 3000 }).metresPerSecond).toBeCloseTo(9, 10);
  });

  test("stroke 85 mm at 5,500 rpm is 15.58 m/s (motor-vehicle teaching site, formulary)", () => {
    expect(meanPistonSpeed({ stroke: 85 / 25.4, rpm: 5500 }).metresPerSecond).toBeCloseTo(15.5833, 4);
  });

  test("stroke 4.000 in at 7,000 rpm is 4,666.67 ft/min, 23.70667 m/s (own figures, recomputed)", () => {
    const speed = meanPistonSpeed({ stroke: 4, rpm: 7000 });
    expect(speed.feetPerMinute).toBeCloseTo(4666.67, 2);
    expect(speed.metresPerSecond).toBeCloseTo(23.70667, 5);
  });

  test("stroke 3.480 in at 6,000 rpm is 3,480 ft/min, 17.6784 m/s (own figures, recomputed)", () => {
    const speed = meanPistonSpeed({ stroke: 3.48, rpm: 6000 });
    expect(speed.feetPerMinute).toBeCloseTo(3480, 6);
    expect(speed.metresPerSecond).toBeCloseTo(17.6784, 6);
  });

  test("a standing engine is refused", () => {
    expect(() => meanPistonSpeed({ stroke: 4, rpm: 0 })).toThrow("engine speed");
  });
});

describe("power and mean effective pressure", () => {
  test("792,000 is 33,000 ft lbf/min per hp x 12 in/ft x 2 turns per working stroke", () => {
    expect(brakeMeanEffectivePressure({ horsepower: 1, cubicInches: 1, rpm: 1 })).toBe(33_000 * 12 * 2);
  });

  test("the range turns back into its pressures", () => {
    const range = powerRange({ cubicInches: 400.921, rpm: 6000, low: 140, high: 175 });
    expect(
      brakeMeanEffectivePressure({ horsepower: range.low, cubicInches: 400.921, rpm: 6000 }),
    ).toBeCloseTo(140, 9);
    expect(
      brakeMeanEffectivePressure({ horsepower: range.high, cubicInches: 400.921, rpm: 6000 }),
    ).toBeCloseTo(175, 9);
  });

  test("it agrees with the metric form kW = kPa x litres x rpm / 120,000", () => {
    const { low } = powerRange({ cubicInches: 349.848, rpm: 5500, low: 130, high: 140 });
    const kilowatts = (130 * 6.894757293168 * (349.848 * 0.016387064) * 5500) / 120_000;
    // 1 hp = 550 ft lbf/s = 0.745699872 kW (from memory).
    expect(low * 0.745699872).toBeCloseTo(kilowatts, 3);
  });

  test("an upside-down range is refused", () => {
    expect(() => powerRange({ cubicInches: 400, rpm: 6000, low: 150, high: 140 })).toThrow("upside down");
  });
});
