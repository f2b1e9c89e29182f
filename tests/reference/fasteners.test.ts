import { describe, expect, test } from "vitest";
import { boltTightening, stressArea, torque } from "#shared/geometry/fasteners.ts";

describe("stress areas (handbook copy of the B1.1 table)", () => {
  test.each([
    ["3/8-16", 0.375, 16, 0.0775],
    ["3/8-24", 0.375, 24, 0.0878],
    ["7/16-14", 0.4375, 14, 0.1063],
    ["7/16-20", 0.4375, 20, 0.1187],
    ["1/2-13", 0.5, 13, 0.1419],
    ["1/2-20", 0.5, 20, 0.1599],
    ["9/16-12", 0.5625, 12, 0.182],
    ["9/16-18", 0.5625, 18, 0.203],
  ])("%s", (_, diameter, threadsPerInch, area) => {
    // The table cuts 1/2-20 off at 0.1599 where the formula gives 0.15995.
    expect(Math.abs(stressArea({ diameter, threadsPerInch }) - area)).toBeLessThan(0.000_1);
  });
});

describe("preload and torque", () => {
  test("3/4-16 with 25 kip and K = 0.2 is 3,750 lbf in (machine-design textbook, from memory)", () => {
    expect(torque({ preload: 25_000, diameter: 0.75, nutFactor: 0.2 })).toBeCloseTo(3750, 9);
  });

  // Grade 8, 120 ksi proof (fastener maker's copy of the J429 table), 75 % of it; own figures, recomputed.
  test.each([
    ["7/16-14", 9568, 69.8, 52.3],
    ["1/2-13", 12_771, 106.4, 79.8],
    ["1/2-20", 14_396, 120, 90],
  ] as const)("%s grade 8 at three quarters of its proof load", (thread, preload, dry, oiled) => {
    const bolt = boltTightening({ thread, grade: 8 });
    // Preloads were recomputed with the formula's area, the product's with the table's four places.
    expect(Math.abs(bolt.preload - preload)).toBeLessThan(preload * 0.0006);
    expect(Math.abs(bolt.dryTorque - dry)).toBeLessThan(0.1);
    expect(Math.abs(bolt.oiledTorque - oiled)).toBeLessThan(0.1);
  });

  test.each([
    [2, 55],
    [5, 85],
    [8, 120],
  ] as const)(
    "grade %i has a proof strength of %i ksi (fastener maker's copy of the J429 table)",
    (grade, ksi) => {
      const { preload } = boltTightening({ thread: "1/2-13", grade });
      expect(preload / (0.75 * 0.1419)).toBeCloseTo(ksi * 1000, 6);
    },
  );

  test("impossible input is refused", () => {
    expect(() => stressArea({ diameter: 0.5, threadsPerInch: 1 })).toThrow("the core of the thread");
    expect(() => stressArea({ diameter: -0.5, threadsPerInch: 13 })).toThrow("the diameter");
    expect(() => torque({ preload: Number.NaN, diameter: 0.5, nutFactor: 0.2 })).toThrow("the preload");
  });
});
