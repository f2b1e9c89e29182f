import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { quoteFreight } from "#shared/freight/freight.ts";
import { priceBuild } from "#shared/pricing/price-build.ts";
import { priceOrder } from "#shared/pricing/price-order.ts";
import { buildOf, marl400 } from "./demo/context.ts";

describe("price of a block", () => {
  test("base and charged options, each one line, add up", () => {
    const price = priceBuild(demoPriceList, demoCatalogue, marl400);
    expect(price.lines).toEqual([
      { kind: "base", label: "Marl block", amountCents: 294_000 },
      {
        kind: "option",
        label: "Main caps: Four-bolt straight, ductile iron",
        choice: "capStyle",
        option: "fourBoltStraight",
        amountCents: 24_000,
      },
      {
        kind: "option",
        label: "Lifters: Roller, production-type retainers",
        choice: "lifterStyle",
        option: "rollerRetainers",
        amountCents: 7_000,
      },
      {
        kind: "option",
        label: "Fuel-pump pad: Machined",
        choice: "fuelPumpPad",
        option: "machinedPad",
        amountCents: 3_800,
      },
      {
        kind: "option",
        label: "Sonic report: With report",
        choice: "sonicReport",
        option: "sonic",
        amountCents: 12_500,
      },
      {
        kind: "option",
        label: "Dowel kit: With dowel kit",
        choice: "dowelKit",
        option: "dowels",
        amountCents: 3_200,
      },
    ]);
    expect(price.totalCents).toBe(344_500);
  });

  test("a deduction is a line below zero, and amounts follow the family", () => {
    const rough = priceBuild(demoPriceList, demoCatalogue, buildOf({ family: "marl", boreFinish: "rough" }));
    expect(rough.lines.at(-1)).toMatchObject({ amountCents: -6_000 });
    expect(rough.totalCents).toBe(288_000);
    const basalt = priceBuild(
      demoPriceList,
      demoCatalogue,
      buildOf({ family: "basalt", capStyle: "fourBoltStraight" }),
    );
    expect(basalt.lines).toHaveLength(1);
  });

  test("no family, no price; a gap in the list is an error, never free", () => {
    expect(() => priceBuild(demoPriceList, demoCatalogue, buildOf({ bore: "b4125" }))).toThrow(
      "without a family",
    );
    const { capStyle: _gone, ...options } = demoPriceList.options;
    expect(_gone).toBeDefined();
    expect(() => priceBuild({ ...demoPriceList, options }, demoCatalogue, marl400)).toThrow(
      "capStyle fourBoltStraight in marl",
    );
    expect(() => priceBuild({ ...demoPriceList, families: {} }, demoCatalogue, marl400)).toThrow(
      "no amount for marl",
    );
  });
});

describe("freight by first ZIP digit", () => {
  test("each digit has a rate, per block; pick-up costs nothing", () => {
    for (let digit = 0; digit <= 9; digit += 1) {
      const rate = demoPriceList.freightByZone[digit.toString()];
      expect(quoteFreight(demoPriceList, `${digit}1001`, 3)).toEqual({
        ok: true,
        cents: (rate ?? Number.NaN) * 3,
      });
    }
    expect(quoteFreight(demoPriceList, "01001-1234", 1)).toEqual({ ok: true, cents: 39_500 });
  });

  test("what is no ZIP code, or has no rate, is told plainly", () => {
    for (const postalCode of ["", "1234", "123456", "ABCDE", "K1A 0B1", "12345-12"]) {
      expect(quoteFreight(demoPriceList, postalCode, 1)).toMatchObject({
        ok: false,
        message: expect.stringContaining("ZIP code of five digits") as string,
      });
    }
    const gap = { ...demoPriceList, freightByZone: { "0": 100 } };
    expect(quoteFreight(gap, "90210", 1)).toMatchObject({
      ok: false,
      message: expect.stringContaining("start with 9") as string,
    });
    expect(quoteFreight(demoPriceList, "60601", 0)).toMatchObject({ ok: false });
  });
});

describe("price of an order", () => {
  const unitCents = priceBuild(demoPriceList, demoCatalogue, marl400).totalCents;
  const freight = {
    method: "freight",
    address: {
      line1: "1 Mill Lane",
      line2: "",
      city: "Ashford",
      state: "IL",
      postalCode: "60601",
      country: "US",
    },
  } as const;

  test("blocks, freight and tax are lines that add up to the total", () => {
    const order = priceOrder({
      lines: [{ label: "Marl, 4.125 in", unitCents, quantity: 2 }],
      delivery: freight,
      freightCents: 49_000,
      tax: { label: "IL sales tax", cents: 5_512 },
    });
    expect(
      order.lines.map(({ kind, label, quantity, amountCents }) => [kind, label, quantity, amountCents]),
    ).toEqual([
      ["block", "Marl, 4.125 in", 2, 689_000],
      ["freight", "Freight to IL 60601", 1, 49_000],
      ["tax", "IL sales tax", 1, 5_512],
    ]);
    expect(order).toMatchObject({ goodsCents: 689_000, totalCents: 743_512, currency: "USD" });
  });

  test("the lines add up whatever is ordered", () => {
    const cents = fc.integer({ min: 0, max: 5_000_000 });
    const line = fc.record({
      label: fc.string(),
      unitCents: cents,
      quantity: fc.integer({ min: 1, max: 20 }),
    });
    fc.assert(
      fc.property(
        fc.array(line, { minLength: 1, maxLength: 50 }),
        cents,
        cents,
        (lines, freightCents, tax) => {
          const order = priceOrder({
            lines,
            delivery: freight,
            freightCents,
            tax: { label: "tax", cents: tax },
          });
          expect(order.lines.reduce((sum, { amountCents }) => sum + amountCents, 0)).toBe(order.totalCents);
          expect(order.goodsCents + order.freightCents + order.taxCents).toBe(order.totalCents);
        },
      ),
    );
  });

  test("impossible orders are refused", () => {
    const base = {
      delivery: { method: "pick-up" },
      freightCents: 0,
      tax: { label: "tax", cents: 0 },
    } as const;
    const line = { label: "x", unitCents, quantity: 1 };
    expect(() => priceOrder({ ...base, lines: [] })).toThrow("at least one line");
    expect(() => priceOrder({ ...base, lines: [{ ...line, quantity: 0 }] })).toThrow("quantity");
    expect(() => priceOrder({ ...base, lines: [{ ...line, unitCents: 0.5 }] })).toThrow("price");
    expect(() => priceOrder({ ...base, lines: [line], tax: { label: "tax", cents: -1 } })).toThrow("tax");
    expect(() => priceOrder({ ...base, lines: [line], freightCents: -1 })).toThrow("freight");
  });
});
