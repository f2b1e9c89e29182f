import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { allocate, amountText, formatCents, minorUnits, roundHalfUp } from "#shared/money/cents.ts";

describe("ISO 4217 minor units (npm currency-codes 2.2.0)", () => {
  test.each([
    ["USD", 2],
    ["EUR", 2],
    ["CAD", 2],
    ["HUF", 2],
    ["JPY", 0],
    ["ISK", 0],
    ["KWD", 3],
    ["BHD", 3],
    ["TND", 3],
    ["CLF", 4],
  ] as const)("%s has %s", (code, places) => {
    expect(minorUnits[code]).toBe(places);
  });

  test("amounts are written by them", () => {
    expect(amountText(431_000, "USD")).toBe("4310.00");
    expect(amountText(-5, "USD")).toBe("-0.05");
    expect(amountText(120, "JPY")).toBe("120");
    expect(amountText(1, "KWD")).toBe("0.001");
    expect(amountText(12_345, "CLF")).toBe("1.2345");
    expect(() => amountText(1, "XAU")).toThrow("XAU");
    expect(() => amountText(1.5, "USD")).toThrow("whole number");
  });

  test("dollars for a reader", () => {
    expect(formatCents(431_000)).toBe("$4,310.00");
    expect(formatCents(123_456_789)).toBe("$1,234,567.89");
    expect(formatCents(99)).toBe("$0.99");
    expect(formatCents(-6_000)).toBe("-$60.00");
  });
});

describe("rounding half up (inputs and answers of the Java SE RoundingMode documentation, from memory)", () => {
  test.each([
    [55, 6],
    [25, 3],
    [16, 2],
    [11, 1],
    [10, 1],
    [-10, -1],
    [-11, -1],
    [-16, -2],
    [-25, -3],
    [-55, -6],
  ])("%s tenths round to %s", (tenths, rounded) => {
    expect(roundHalfUp(tenths, 10)).toBe(rounded);
    expect(roundHalfUp(-tenths, -10)).toBe(rounded);
  });

  test("1.005 dollars are 101 cents, where floating point says 1.00", () => {
    expect((1.005).toFixed(2)).toBe("1.00");
    expect(roundHalfUp(1005, 10)).toBe(101);
  });

  test("a zero denominator is refused and zero has no sign", () => {
    expect(() => roundHalfUp(1, 0)).toThrow("zero");
    expect(Object.is(roundHalfUp(-1, 10), 0)).toBe(true);
  });

  test("no whole number is nearer", () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: -(10n ** 15n), max: 10n ** 15n }),
        fc.bigInt({ min: 1n, max: 10n ** 9n }),
        (top, bottom) => {
          const distance = 2n * (BigInt(roundHalfUp(top, bottom)) * bottom - top);
          const away = top < 0n ? -distance : distance;
          expect(away > -bottom && away <= bottom).toBe(true);
        },
      ),
    );
  });
});

describe("splitting by the largest remainder", () => {
  test.each([
    {
      amount: 5,
      weights: [3, 7],
      shares: [2, 3],
      source: "enterprise patterns book, money chapter, allocate test; from memory",
    },
    { amount: 100, weights: [1, 1, 1], shares: [34, 33, 33], source: "from memory" },
    {
      amount: 1003,
      weights: [50, 50],
      shares: [502, 501],
      source: "a money library's documentation; from memory",
    },
    { amount: 1000, weights: [19999, 8500, 1250], shares: [672, 286, 42], source: "own, recomputed" },
    {
      amount: 5000,
      weights: [325000, 48900, 18750, 12500],
      shares: [4011, 604, 231, 154],
      source: "own, recomputed",
    },
  ])("$amount over $weights ($source)", ({ amount, weights, shares }) => {
    expect(allocate(amount, weights)).toEqual(shares);
    expect(allocate(-amount, weights)).toEqual(shares.map((share) => -share));
  });

  test("shares add up, keep the sign, and lie within a cent of their part", () => {
    const weights = fc
      .array(fc.nat(1_000_000), { minLength: 1, maxLength: 12 })
      .filter((all) => all.some((w) => w > 0));
    fc.assert(
      fc.property(fc.integer({ min: -1_000_000_000, max: 1_000_000_000 }), weights, (amount, parts) => {
        const shares = allocate(amount, parts);
        const sum = parts.reduce((total, part) => total + part, 0);
        expect(shares.reduce((total, share) => total + share, 0)).toBe(amount);
        shares.forEach((share, at) => {
          const exact = BigInt(amount) * BigInt(parts[at] ?? 0);
          const off = BigInt(share) * BigInt(sum) - exact;
          expect(off < BigInt(sum) && off > -BigInt(sum)).toBe(true);
        });
      }),
    );
  });

  test("weights must be whole, not negative and not all zero", () => {
    expect(() => allocate(100, [0, 0])).toThrow("all zero");
    expect(() => allocate(100, [])).toThrow("all zero");
    expect(() => allocate(100, [-1, 2])).toThrow("not a weight");
    expect(() => allocate(1.5, [1])).toThrow("whole number");
  });
});
