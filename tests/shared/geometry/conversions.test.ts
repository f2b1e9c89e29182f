import fc from "fast-check";
import * as mathjs from "mathjs";
import { describe, expect, test } from "vitest";
import { clearanceVolume, compressionRatio } from "#shared/geometry/compression.ts";
import * as dimensions from "#shared/geometry/dimensions.ts";
import { displacement } from "#shared/geometry/displacement.ts";
import {
  formatInches,
  formatMillimetres,
  lengthFromInches,
  parseLength,
  toInches,
} from "#shared/units/length.ts";

const math = mathjs.create(mathjs.all ?? {}, { number: "BigNumber", precision: 64 });

/** A value of a formula in 64 digits. */
function inManyDigits(formula: string, scope: Record<string, number>): number {
  const exact = Object.fromEntries(
    Object.entries(scope).map(([name, value]) => [name, math.bignumber(value)]),
  );
  return Number(math.format(math.evaluate(formula, exact), { notation: "fixed", precision: 20 }));
}

/** Ten-thousandths of an inch, up to a foot. */
const tenThousandths = fc.integer({ min: 1, max: 120_000 });

describe("inches and millimetres (1 in = 25.4 mm exactly; NIST SP 811, appendix B)", () => {
  test("the shop's grid of 0.0001 in goes to 0.00001 mm without rounding, and back to the same length", () => {
    fc.assert(
      fc.property(tenThousandths, (length) => {
        const units = length * 2;
        const millimetres = formatMillimetres(units, 5);
        // 0.0001 in is 0.00254 mm: 254 hundred-thousandths of a millimetre.
        expect(millimetres.replace(".", "").replace(/^0+/, "")).toBe(String(length * 254));
        const back = Number(millimetres.replace(".", "")) / 254;
        expect(formatInches(back * 2)).toBe(formatInches(units));
      }),
    );
  });

  test("a shown millimetre figure is never further off than half its last place", () => {
    fc.assert(
      fc.property(tenThousandths, fc.integer({ min: 0, max: 4 }), (length, places) => {
        const shown = Number(formatMillimetres(length * 2, places));
        expect(Math.abs(shown - (length * 25.4) / 10_000)).toBeLessThanOrEqual(0.5 * 10 ** -places + 1e-9);
      }),
    );
  });

  test("text, number and units of one length are the same however often they are turned", () => {
    fc.assert(
      fc.property(tenThousandths, (length) => {
        let units = length * 2;
        for (let turn = 0; turn < 5; turn += 1) {
          units = lengthFromInches(toInches(parseLength(formatInches(units)) ?? Number.NaN));
        }
        expect(units).toBe(length * 2);
      }),
    );
  });

  test("sums and halves of lengths on the grid are exact, where floating point drifts", () => {
    fc.assert(
      fc.property(
        tenThousandths,
        tenThousandths,
        fc.integer({ min: 0, max: 1000 }),
        (outside, bore, shift) => {
          const wall = dimensions.cylinderWall({
            barrelOutsideDiameter: outside / 10_000,
            finishBore: bore / 10_000,
            coreShift: shift / 10_000,
          });
          expect(wall).toBe((outside - bore - 2 * shift) / 20_000);
        },
      ),
    );
  });
});

describe("against a general library in 64 digits", () => {
  const length = (from: number, to: number) =>
    fc.integer({ min: from * 10_000, max: to * 10_000 }).map((units) => units / 10_000);

  test("displacement in cubic inches and centimetres", () => {
    fc.assert(
      fc.property(length(3, 5), length(2, 5), (bore, stroke) => {
        const found = displacement({ bore, stroke, cylinders: 8 });
        const scope = { bore, stroke };
        expect(found.cubicInches).toBeCloseTo(inManyDigits("pi / 4 * bore^2 * stroke * 8", scope), 9);
        expect(found.cubicCentimetres).toBeCloseTo(
          inManyDigits("pi / 4 * bore^2 * stroke * 8 * 2.54^3", scope),
          7,
        );
      }),
      { numRuns: 50 },
    );
  });

  test("clearance volume and compression ratio", () => {
    fc.assert(
      fc.property(
        fc.record({
          bore: length(4, 4.6),
          stroke: length(3, 5),
          chamber: fc.integer({ min: 300, max: 1500 }).map((tenths) => tenths / 10),
          gasketBore: length(4, 4.8),
          gasketThickness: length(0.01, 0.1),
          deckClearance: length(-0.02, 0.1),
          crown: fc.integer({ min: -150, max: 400 }).map((tenths) => tenths / 10),
        }),
        (space) => {
          const clearance = clearanceVolume(space);
          const formula =
            "chamber + pi / 4 * (gasketBore^2 * gasketThickness + bore^2 * deckClearance) * 2.54^3 + crown";
          expect(clearance).toBeCloseTo(inManyDigits(formula, space), 9);
          const swept = displacement({ ...space, cylinders: 1 }).cubicCentimetres;
          expect(compressionRatio({ swept, clearance })).toBeCloseTo(
            inManyDigits(`1 + pi / 4 * bore^2 * stroke * 2.54^3 / (${formula})`, space),
            9,
          );
        },
      ),
      { numRuns: 50 },
    );
  });
});
