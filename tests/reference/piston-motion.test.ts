import fc from "fast-check";
import * as mathjs from "mathjs";
import { describe, expect, test } from "vitest";
import {
  angleOfPeakSpeed,
  peakPistonAcceleration,
  peakPistonSpeed,
  pistonMotion,
} from "#shared/geometry/piston-motion.ts";

const degree = Math.PI / 180;
/** l = 6, a = 2 of the published example. */
const published = { stroke: 4, rodLength: 6 };

describe("piston motion equations, published example with l = 6 and a = 2 (encyclopaedia)", () => {
  test("fastest at 73.17530 degrees after top dead centre; rod at 18.60639, crank to rod 88.21832", () => {
    const angle = angleOfPeakSpeed(published);
    expect(angle / degree).toBeCloseTo(73.1753, 5);
    const rodAngle = Math.asin((2 / 6) * Math.sin(angle)) / degree;
    expect(rodAngle).toBeCloseTo(18.60639, 5);
    expect(180 - rodAngle - angle / degree).toBeCloseTo(88.21832, 5);
  });

  // Recomputed with the published equations; units of length, per w and per w².
  test.each([
    [0, 8, 0, -2.666667],
    [30, 7.648131, -1.29277, -2.084601],
    [45, 7.245165, -1.757211, -1.43439],
    [60, 6.744563, -2.033562, -0.66767],
    [90, 5.656854, -2, 0.707107],
    [120, 4.744563, -1.430539, 1.33233],
    [150, 4.184029, -0.70723, 1.379501],
    [180, 4, 0, 1.333333],
  ])("at %i degrees", (angle, height, velocity, acceleration) => {
    const motion = pistonMotion({ ...published, angle: angle * degree });
    expect(motion.height).toBeCloseTo(height, 6);
    expect(motion.velocity).toBeCloseTo(velocity, 6);
    expect(motion.acceleration).toBeCloseTo(acceleration, 6);
  });

  test("at its fastest, 6.265286 up and 2.109279 per w, without acceleration", () => {
    const motion = pistonMotion({ ...published, angle: angleOfPeakSpeed(published) });
    expect(motion.height).toBeCloseTo(6.265286, 6);
    expect(motion.velocity).toBeCloseTo(-2.109279, 6);
    expect(motion.acceleration).toBeCloseTo(0, 12);
  });

  test("the greatest speed is about 1.6 times the mean: 1.6566 at R = 3 (encyclopaedia, mean piston speed)", () => {
    const peak = peakPistonSpeed({ ...published, rpm: 60 });
    expect(peak.metresPerSecond / ((2 * 4 * 0.0254 * 60) / 60)).toBeCloseTo(1.6566, 4);
  });
});

describe("published example: rod 6.024 in, stroke 3.307 in, 6,000 rpm (drag-racing forum article)", () => {
  const crank = { stroke: 3.307, rodLength: 6.024 };

  test("no acceleration at 75.6 degrees, 0.0021 s; 1,078 in/s; pin 6.218 in up; 7.68 in at top dead centre", () => {
    const peak = peakPistonSpeed({ ...crank, rpm: 6000 });
    expect(peak.angle / degree).toBeCloseTo(75.6, 1);
    expect(peak.angle / (2 * Math.PI * 100)).toBeCloseTo(0.0021, 4);
    expect(Math.abs((peak.feetPerMinute * 12) / 60 - 1078)).toBeLessThan(0.5);
    expect(pistonMotion({ ...crank, angle: peak.angle }).height).toBeCloseTo(6.218, 3);
    expect(pistonMotion({ ...crank, angle: 0 }).height).toBeCloseTo(7.68, 2);
  });

  test("recomputed: 75.6235 degrees, 1,077.54 in/s, 6.21771 in", () => {
    const peak = peakPistonSpeed({ ...crank, rpm: 6000 });
    expect(peak.angle / degree).toBeCloseTo(75.6235, 4);
    expect((peak.feetPerMinute * 12) / 60).toBeCloseTo(1077.54, 2);
    expect(pistonMotion({ ...crank, angle: peak.angle }).height).toBeCloseTo(6.21771, 5);
  });
});

describe("own figures, recomputed", () => {
  test("stroke 4.000, rod 6.000, 7,000 rpm: 7,730.9 ft/min, 3,711.4 g at top dead centre", () => {
    const crank = { stroke: 4, rodLength: 6, rpm: 7000 };
    expect(peakPistonSpeed(crank).feetPerMinute).toBeCloseTo(7730.9, 1);
    expect(peakPistonSpeed(crank).metresPerSecond).toBeCloseTo(7730.9 * 0.00508, 2);
    expect(peakPistonAcceleration(crank).gravities).toBeCloseTo(3711.4, 1);
    expect(peakPistonAcceleration(crank).angle).toBe(0);
  });

  test("stroke 3.480, rod 5.700, 6,000 rpm: 74.3094 degrees, 5,717.2 ft/min, 2,322.3 g", () => {
    const crank = { stroke: 3.48, rodLength: 5.7, rpm: 6000 };
    const peak = peakPistonSpeed(crank);
    expect(peak.angle / degree).toBeCloseTo(74.3094, 4);
    expect(peak.feetPerMinute).toBeCloseTo(5717.2, 1);
    expect(peakPistonAcceleration(crank).gravities).toBeCloseTo(2322.3, 1);
  });

  test("a rod hardly longer than half the stroke is jerked hardest near a quarter turn", () => {
    const crank = { stroke: 4, rodLength: 2.1, rpm: 1000 };
    const peak = peakPistonAcceleration(crank);
    expect(peak.angle / degree).toBeGreaterThan(75);
    expect(peak.angle / degree).toBeLessThan(105);
    const every = Array.from({ length: 36_000 }, (_, step) =>
      Math.abs(pistonMotion({ ...crank, angle: step * 0.005 * degree }).acceleration),
    );
    const gravity = 9.80665 / 0.0254;
    expect(peak.gravities).toBeCloseTo((Math.max(...every) * ((2 * Math.PI * 1000) / 60) ** 2) / gravity, 2);
  });
});

describe("against a general library: x(t) differentiated symbolically, in 64 digits", () => {
  const math = mathjs.create(mathjs.all ?? {}, { number: "BigNumber", precision: 64 });
  const height = "r * cos(t) + sqrt(l^2 - r^2 * sin(t)^2)";
  const velocity = math.derivative(height, "t");
  const acceleration = math.derivative(velocity, "t");
  const at = (expression: { evaluate(scope: object): unknown }, scope: object): number =>
    Number(math.format(expression.evaluate(scope), { notation: "fixed", precision: 20 }));

  test("height, velocity and acceleration agree everywhere", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 25_000, max: 55_000 }),
        fc.integer({ min: 50_000, max: 80_000 }),
        fc.integer({ min: 0, max: 6283 }),
        (stroke, rod, angle) => {
          const motion = pistonMotion({
            stroke: stroke / 10_000,
            rodLength: rod / 10_000,
            angle: angle / 1000,
          });
          const scope = {
            r: math.bignumber(stroke).div(20_000),
            l: math.bignumber(rod).div(10_000),
            t: math.bignumber(angle).div(1000),
          };
          expect(motion.height).toBeCloseTo(at(math.parse(height), scope), 11);
          expect(motion.velocity).toBeCloseTo(at(velocity, scope), 11);
          expect(motion.acceleration).toBeCloseTo(at(acceleration, scope), 11);
        },
      ),
      { numRuns: 60 },
    );
  });
});

test("impossible input is refused", () => {
  expect(() => pistonMotion({ stroke: 4, rodLength: 2, angle: 0 })).toThrow("shorter than half the stroke");
  expect(() => pistonMotion({ stroke: 4, rodLength: 6, angle: Number.NaN })).toThrow("the crank angle");
  expect(() => pistonMotion({ stroke: -4, rodLength: 6, angle: 0 })).toThrow("the stroke");
  expect(() => peakPistonSpeed({ ...published, rpm: 0 })).toThrow("the engine speed");
  expect(() => peakPistonAcceleration({ ...published, rpm: Number.POSITIVE_INFINITY })).toThrow(
    "the engine speed",
  );
});
