import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { estimateOrderShipDate } from "#shared/scheduling/estimate-order.ts";
import { estimateShipDate } from "#shared/scheduling/estimate.ts";

const today = "2026-12-01";
const minutes = fc.record({
  qualify: fc.integer({ min: 0, max: 200 }),
  secondOperation: fc.integer({ min: 1, max: 900 }),
  inspection: fc.integer({ min: 0, max: 300 }),
});
const line = fc.record({
  minutes,
  leadDays: fc.integer({ min: 0, max: 60 }),
  quantity: fc.integer({ min: 1, max: 20 }),
});
const load = fc.record({ minutes });

describe("the ship date of an order", () => {
  it("is that of its line when it has one", () => {
    fc.assert(
      fc.property(line, load, (only, ahead) => {
        expect(estimateOrderShipDate([only], ahead, today)).toBe(
          estimateShipDate({ ...only, load: ahead, today }),
        );
      }),
    );
  });

  it("is never before that of any of its lines alone, and never moves forward when a line is added", () => {
    fc.assert(
      fc.property(fc.array(line, { minLength: 1, maxLength: 5 }), line, load, (lines, added, ahead) => {
        const whole = estimateOrderShipDate(lines, ahead, today);
        for (const one of lines) expect(whole >= estimateOrderShipDate([one], ahead, today)).toBe(true);
        expect(estimateOrderShipDate([...lines, added], ahead, today) >= whole).toBe(true);
      }),
    );
  });

  it("does not exist without lines", () => {
    expect(() => estimateOrderShipDate([], { minutes: {} }, today)).toThrow(RangeError);
  });
});
