import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { makeOrderNumber, readOrderNumber } from "#shared/orders/order-number.ts";

const random = fc.array(fc.integer({ min: 0, max: 30 }), { minLength: 7, maxLength: 7 });
const alphabet = "0123456789ABCDEFGHJKMNPQRSTVWXY";

describe("order numbers", () => {
  it("are two groups of four characters", () => {
    expect(makeOrderNumber([0, 1, 2, 3, 4, 5, 6])).toMatch(/^0123-456[0-9A-Y]$/);
  });

  it("are read back as they were made, however they are typed", () => {
    fc.assert(
      fc.property(random, (values) => {
        const number = makeOrderNumber(values);
        expect(readOrderNumber(number)).toBe(number);
        expect(readOrderNumber(` ${number.toLowerCase().replace("-", " ")} `)).toBe(number);
      }),
    );
  });

  it("are refused with any single wrong character", () => {
    fc.assert(
      fc.property(
        random,
        fc.integer({ min: 0, max: 7 }),
        fc.constantFrom(...alphabet),
        (values, place, wrong) => {
          const plain = makeOrderNumber(values).replace("-", "");
          fc.pre(plain[place] !== wrong);
          expect(readOrderNumber(plain.slice(0, place) + wrong + plain.slice(place + 1))).toBeNull();
        },
      ),
    );
  });

  it("are refused with two neighbours swapped", () => {
    fc.assert(
      fc.property(random, fc.integer({ min: 0, max: 6 }), (values, place) => {
        const plain = makeOrderNumber(values).replace("-", "");
        fc.pre(plain[place] !== plain[place + 1]);
        const swapped =
          plain.slice(0, place) + plain.charAt(place + 1) + plain.charAt(place) + plain.slice(place + 2);
        expect(readOrderNumber(swapped)).toBeNull();
      }),
    );
  });

  it("take look-alikes for what they look like", () => {
    const number = makeOrderNumber([0, 1, 1, 0, 5, 6, 7]);
    expect(readOrderNumber(number.replace(/0/g, "o").replace(/1/g, "l"))).toBe(number);
  });

  it("are never made of anything but seven values", () => {
    expect(() => makeOrderNumber([1, 2, 3])).toThrow(RangeError);
    expect(() => makeOrderNumber([31, 0, 0, 0, 0, 0, 0])).toThrow(RangeError);
  });
});
