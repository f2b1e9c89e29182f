import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  compareQuantities,
  formatInches,
  formatMillimetres,
  lengthFromInches,
  measuredLength,
  parseLength,
  toInches,
} from "#shared/units/length.ts";

describe("exact lengths", () => {
  test("text is read exactly", () => {
    expect(parseLength("6.1250")).toBe(122_500);
    expect(parseLength(" 0.00005 ")).toBe(1);
    expect(parseLength("-1.5")).toBe(-30_000);
    expect(parseLength("4")).toBe(80_000);
    expect(parseLength("4.1250000")).toBe(82_500);
  });

  test("what is no length on the grid is null", () => {
    for (const text of ["", "4.", ".5", "1e3", "4.12503", "0x10", "4,125", "NaN", "4 in"])
      expect(parseLength(text)).toBeNull();
  });

  test("catalogue numbers are taken as written, and refused off the grid", () => {
    expect(lengthFromInches(4.615)).toBe(92_300);
    expect(lengthFromInches(2.16535)).toBe(43_307);
    expect(() => lengthFromInches(2.165351)).toThrow("grid");
    expect(() => lengthFromInches(Number.NaN)).toThrow("grid");
    expect(() => lengthFromInches(Number.POSITIVE_INFINITY)).toThrow("grid");
  });

  test("1 in is 25.4 mm exactly (NIST SP 811, appendix B)", () => {
    expect(formatMillimetres(lengthFromInches(1), 4)).toBe("25.4000");
    expect(formatMillimetres(lengthFromInches(4.125))).toBe("104.775");
    expect(formatMillimetres(lengthFromInches(-0.0005), 3)).toBe("-0.013");
    expect(formatMillimetres(0, 0)).toBe("0");
  });

  test("inches are written to the places the shop holds", () => {
    expect(formatInches(lengthFromInches(4.125))).toBe("4.1250");
    expect(formatInches(1)).toBe("0.0001");
    expect(formatInches(lengthFromInches(-0.004))).toBe("-0.0040");
    expect(formatInches(lengthFromInches(4.155), 3)).toBe("4.155");
  });

  test("text, units and text again are the same", () => {
    fc.assert(
      fc.property(fc.integer({ min: -200_000, max: 200_000 }), (tenThousandths) => {
        const units = tenThousandths * 2;
        expect(parseLength(formatInches(units))).toBe(units === 0 ? 0 : units);
        expect(lengthFromInches(toInches(units))).toBe(units === 0 ? 0 : units);
      }),
    );
  });

  test("a limit met exactly is met, one unit less is not", () => {
    expect(compareQuantities((4.615 - 4.155) / 2 - 0.03, 0.2)).toBe(0);
    expect(compareQuantities(0.19995, 0.2)).toBeLessThan(0);
    expect(compareQuantities(0.2001, 0.2)).toBeGreaterThan(0);
  });

  test("measured distances are rounded to 0.0001 in first", () => {
    expect(toInches(measuredLength(0.05996))).toBe(0.06);
    expect(toInches(measuredLength(0.05994))).toBe(0.0599);
    expect(Object.is(measuredLength(-0.00001), 0)).toBe(true);
    expect(() => measuredLength(Number.NaN)).toThrow("finite");
  });
});
