import { describe, expect, test } from "vitest";
import { displacement } from "#shared/geometry/displacement.ts";

const inMillimetres = (bore: number, stroke: number) =>
  displacement({ bore: bore / 25.4, stroke: stroke / 25.4, cylinders: 8 });

describe("displacement against published bore and stroke pairs", () => {
  // Seen in the source named, recomputed.
  test.each([
    {
      bore: 4,
      stroke: 3,
      cubicInches: 301.593,
      source: "classic-car magazine on displacements shared by several makers",
    },
    { bore: 4, stroke: 3.25, cubicInches: 326.726, source: "the same article" },
    {
      bore: 4.232,
      stroke: 3.784,
      cubicInches: 425.816,
      source: "classic-car magazine on V8s whose names do not match",
    },
    {
      bore: 4,
      stroke: 3.5,
      cubicInches: 351.858,
      source: "trade magazine for workshops, May 2009, with full pi",
    },
    { bore: 4.03, stroke: 3.4, cubicInches: 346.952, source: "car magazine stroker article" },
  ])("$bore x $stroke in is $cubicInches cu in ($source)", ({ bore, stroke, cubicInches }) => {
    expect(displacement({ bore, stroke, cylinders: 8 }).cubicInches).toBeCloseTo(cubicInches, 3);
  });

  test("metric pairs of workshop-manual specification pages", () => {
    expect(inMillimetres(92, 82.7).cubicCentimetres).toBeCloseTo(4398.06, 2);
    expect(inMillimetres(96, 83).cubicCentimetres).toBeCloseTo(4806.18, 2);
    expect(inMillimetres(96, 83).cubicInches).toBeCloseTo(293.29, 2);
  });

  // From memory, recomputed.
  test.each([
    [3.75, 3, 265.072],
    [3.875, 3, 283.038],
    [3.736, 3.48, 305.192],
    [3.91, 3.31, 317.952],
    [4, 3.48, 349.848],
    [4, 3.58, 359.901],
    [4.125, 3.75, 400.921],
    [4.25, 3.76, 426.723],
    [4.32, 3.75, 439.722],
    [4.25, 4, 453.96],
    [4.3, 4.304, 500.022],
  ])("%s x %s in is %s cu in (from memory)", (bore, stroke, cubicInches) => {
    expect(displacement({ bore, stroke, cylinders: 8 }).cubicInches).toBeCloseTo(cubicInches, 3);
  });

  test("one cubic inch is 16.387064 cm3 (structural guide, conversion appendix)", () => {
    const swept = displacement({ bore: 4, stroke: 3.48, cylinders: 8 });
    expect(swept.cubicCentimetres / swept.cubicInches).toBeCloseTo(16.387064, 10);
    expect(swept.litres).toBeCloseTo(5.733, 4);
  });

  test("four cylinders of 3.92 x 3.11 in are 150.14 cu in (owners' forum, rounded inches)", () => {
    expect(displacement({ bore: 3.92, stroke: 3.11, cylinders: 4 }).cubicInches).toBeCloseTo(150.14, 2);
  });

  test("impossible sizes are refused", () => {
    expect(() => displacement({ bore: 0, stroke: 3, cylinders: 8 })).toThrow(RangeError);
    expect(() => displacement({ bore: 4, stroke: Number.NaN, cylinders: 8 })).toThrow(RangeError);
    expect(() => displacement({ bore: 4, stroke: 3, cylinders: 0 })).toThrow("at least one cylinder");
  });
});
