// @vitest-environment node
import { describe, expect, it } from "vitest";
import {
  date,
  dateTime,
  daysChange,
  fixed,
  inches,
  millimetres,
  money,
  moneyChange,
  pounds,
  poundsChange,
} from "#web/lib/format.ts";

describe("money", () => {
  it.each([
    [431000, "$4,310.00"],
    [5, "$0.05"],
    [0, "$0.00"],
    [-4550, "\u2212$45.50"],
    [123456789, "$1,234,567.89"],
  ])("%i cents", (cents, text) => {
    expect(money(cents)).toBe(text);
  });

  it("shows a change with its sign", () => {
    expect([31000, -4500, 0].map(moneyChange)).toEqual(["+$310.00", "\u2212$45.00", "no change"]);
  });
});

describe("lengths and weights", () => {
  it("keeps the digits that the shop holds", () => {
    expect(inches(4.125)).toBe("4.1250 in");
    expect(inches(9.025, 3)).toBe("9.025 in");
    expect(fixed(-0.00004, 4)).toBe("0.0000");
    expect(fixed(-0.25, 2)).toBe("\u22120.25");
  });

  it("shows inches in millimetres (1 in = 25.4 mm exactly, international yard and pound agreement of 1959)", () => {
    expect(millimetres(4.125)).toBe("104.78 mm");
    expect(millimetres(1, 1)).toBe("25.4 mm");
  });

  it("rounds pounds", () => {
    expect(pounds(186.6)).toBe("187 lb");
    expect([12.2, -3.1, 0.2].map(poundsChange)).toEqual(["+12 lb", "\u22123 lb", "no change"]);
  });
});

describe("dates", () => {
  it("shows a calendar date wherever the reader is", () => {
    expect(date("2026-05-12")).toBe("12 May 2026");
  });

  it("shows a moment on the shop's clock", () => {
    expect(dateTime("2026-05-13T02:05:00Z", "America/New_York")).toBe("12 May 2026, 22:05");
  });

  it("counts days", () => {
    expect([2, -1, 0].map(daysChange)).toEqual(["+2 days", "\u22121 day", "no change"]);
  });
});
