import { describe, expect, test } from "vitest";
import { clearanceVolume, compressionRatio } from "#shared/geometry/compression.ts";
import * as dimensions from "#shared/geometry/dimensions.ts";
import { displacement } from "#shared/geometry/displacement.ts";

const swept = (bore: number, stroke: number): number =>
  displacement({ bore, stroke, cylinders: 1 }).cubicCentimetres;

describe("compression ratio", () => {
  test("bore 90 mm, stroke 100 mm, clearance 0.065 L: 636.1725 cc, 10.787 (exam question; the answer posted with it is wrong)", () => {
    const volume = swept(90 / 25.4, 100 / 25.4);
    expect(volume).toBeCloseTo(636.1725, 4);
    expect(volume * 4).toBeCloseTo(2544.69, 2);
    expect(compressionRatio({ swept: volume, clearance: 65 })).toBeCloseTo(10.787, 3);
  });

  test("a ratio of 11 with 300 cc swept leaves 30 cc (textbook question)", () => {
    expect(compressionRatio({ swept: 300, clearance: 30 })).toBe(11);
  });

  test("4.125 x 4.000, chamber 70, gasket 4.165 x 0.041, deck 0.005, dish 12: 92.24886 cc, 10.4959 (own figures, recomputed)", () => {
    const clearance = clearanceVolume({
      bore: 4.125,
      chamber: 70,
      gasketBore: 4.165,
      gasketThickness: 0.041,
      deckClearance: 0.005,
      crown: 12,
    });
    expect(swept(4.125, 4)).toBeCloseTo(875.98956, 5);
    expect(clearance).toBeCloseTo(92.24886, 5);
    expect(compressionRatio({ swept: swept(4.125, 4), clearance })).toBeCloseTo(10.4959, 4);
  });

  const flatTop = {
    bore: 4,
    chamber: 64,
    gasketBore: 4.1,
    gasketThickness: 0.041,
    deckClearance: 0.025,
    crown: 0,
  };

  test("4.000 x 3.480, chamber 64, gasket 4.100 x 0.041, deck 0.025, flat top: 78.01854 cc, 10.1853 (own figures, recomputed)", () => {
    const clearance = clearanceVolume(flatTop);
    expect(swept(4, 3.48)).toBeCloseTo(716.6222, 4);
    expect(clearance).toBeCloseTo(78.01854, 5);
    expect(compressionRatio({ swept: swept(4, 3.48), clearance })).toBeCloseTo(10.1853, 4);
  });

  test("a dome takes away, a crevice adds, a piston proud of the deck takes away", () => {
    const plain = clearanceVolume(flatTop);
    expect(clearanceVolume({ ...flatTop, crown: -6.5 })).toBeCloseTo(plain - 6.5, 9);
    expect(clearanceVolume({ ...flatTop, crevice: 1.2 })).toBeCloseTo(plain + 1.2, 9);
    const proud = clearanceVolume({ ...flatTop, deckClearance: -0.025 });
    expect(plain - proud).toBeCloseTo(swept(4, 0.05), 9);
  });

  test("no room, or no number, is refused", () => {
    const full = clearanceVolume({ ...flatTop, crown: -90 });
    expect(full).toBeLessThan(0);
    expect(() => compressionRatio({ swept: 700, clearance: full })).toThrow("the clearance volume");
    expect(() => clearanceVolume({ ...flatTop, chamber: -64 })).toThrow("the chamber");
    expect(() => clearanceVolume({ ...flatTop, gasketBore: 0 })).toThrow("the gasket bore");
    expect(() => clearanceVolume({ ...flatTop, gasketThickness: Number.NaN })).toThrow(
      "the gasket thickness",
    );
    expect(() => clearanceVolume({ ...flatTop, deckClearance: Number.NaN })).toThrow("finite");
    expect(() => clearanceVolume({ ...flatTop, crown: Number.POSITIVE_INFINITY })).toThrow("finite");
    expect(() => clearanceVolume({ ...flatTop, crevice: -1 })).toThrow("the crevice");
  });
});

describe("gasket, head and honed cylinders", () => {
  const stack = { deckHeight: 9.025, stroke: 3.75, rodLength: 5.7, compressionHeight: 1.425 };

  test("piston to head is deck clearance + gasket, to the ten-thousandth", () => {
    expect(dimensions.pistonToHead({ ...stack, gasketThickness: 0.041 })).toBe(0.066);
    expect(dimensions.pistonToHead({ ...stack, deckHeight: 8.9, gasketThickness: 0.041 })).toBe(-0.059);
    // Met exactly: 0.010 proud under a 0.045 gasket leaves the 0.035 that steel rods ask for.
    expect(dimensions.pistonToHead({ ...stack, deckHeight: 8.99, gasketThickness: 0.045 })).toBe(0.035);
    expect(() => dimensions.pistonToHead({ ...stack, gasketThickness: -0.041 })).toThrow("the gasket");
  });

  test("each cylinder is its skirt + the clearance asked", () => {
    const cylinders = dimensions.honedCylinders({ skirts: [4.121, 4.1213, 4.1225], clearance: 0.004 });
    expect(cylinders).toEqual([4.125, 4.1253, 4.1265]);
    expect(dimensions.greatestFromBore({ cylinders, finishBore: 4.125 })).toBe(0.0015);
    expect(dimensions.greatestFromBore({ cylinders, finishBore: 4.129 })).toBe(0.004);
    expect(() => dimensions.honedCylinders({ skirts: [], clearance: 0.004 })).toThrow("at least one skirt");
    expect(() => dimensions.honedCylinders({ skirts: [4.1, -4.1], clearance: 0.004 })).toThrow("skirt 2");
    expect(() => dimensions.honedCylinders({ skirts: [4.1], clearance: -0.004 })).toThrow("clearance asked");
  });

  test("gasket over the bore, signed", () => {
    expect(dimensions.gasketOverBore({ gasketBore: 4.135, bore: 4.125 })).toBe(0.01);
    expect(dimensions.gasketOverBore({ gasketBore: 4.1, bore: 4.125 })).toBe(-0.025);
  });

  test("a bore wider than the spacing is refused", () => {
    expect(() => dimensions.webBetweenBores({ boreSpacing: 4.4, finishBore: 4.44 })).toThrow(
      "the bore is wider than the bore spacing",
    );
    expect(dimensions.webBetweenBores({ boreSpacing: 4.4, finishBore: 4.4 })).toBe(0);
  });
});
