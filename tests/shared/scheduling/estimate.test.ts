import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { workCentreSchema } from "#shared/catalogue/catalogue.ts";
import { estimateShipDate, plainCalendar } from "#shared/scheduling/estimate.ts";

const centres = workCentreSchema.options;
const someMinutes = fc.dictionary(fc.constantFrom(...centres), fc.integer({ min: 0, max: 600 }));
const someLoad = fc.dictionary(fc.constantFrom(...centres), fc.integer({ min: 0, max: 60_000 }));
const someDay = fc
  .integer({ min: 0, max: 3_000 })
  .map((day) => new Date(Date.UTC(2026, 0, 1 + day)).toISOString().slice(0, 10));

describe("first-cut estimate of the ship date", () => {
  test("work counts from the next working day, over weekends and holidays", () => {
    const short = { minutes: { wash: 100 }, load: { minutes: {} }, leadDays: 0 };
    expect(estimateShipDate({ ...short, today: "2026-12-01" })).toBe("2026-12-02");
    // Friday; then the Thursday before Christmas, which falls on a Friday in 2026.
    expect(estimateShipDate({ ...short, today: "2026-12-04" })).toBe("2026-12-07");
    expect(estimateShipDate({ ...short, today: "2026-12-24" })).toBe("2026-12-28");
  });

  test("a shift that is just filled ends that day; one minute more ends the next", () => {
    const base = { load: { minutes: {} }, leadDays: 0, today: "2026-12-01" };
    expect(estimateShipDate({ ...base, minutes: { wash: 480 } })).toBe("2026-12-02");
    expect(estimateShipDate({ ...base, minutes: { wash: 481 } })).toBe("2026-12-03");
    // Friday's shift is 420 minutes.
    expect(estimateShipDate({ ...base, minutes: { wash: 480 * 2 + 421 } })).toBe("2026-12-07");
  });

  test("load counts over the machines of a work centre, and only where the block goes", () => {
    const base = { leadDays: 0, today: "2026-12-01", minutes: { secondOperation: 1 } };
    const machines = plainCalendar.machines.secondOperation;
    expect(estimateShipDate({ ...base, load: { minutes: { secondOperation: 479 * machines } } })).toBe(
      "2026-12-02",
    );
    expect(estimateShipDate({ ...base, load: { minutes: { secondOperation: 480 * machines } } })).toBe(
      "2026-12-03",
    );
    expect(estimateShipDate({ ...base, load: { minutes: { finishHone: 100_000 } } })).toBe("2026-12-02");
  });

  test("lead days are added and never end on a day off", () => {
    const base = { minutes: { wash: 1 }, load: { minutes: {} }, today: "2026-12-01" };
    expect(estimateShipDate({ ...base, leadDays: 3 })).toBe("2026-12-07");
    expect(estimateShipDate({ ...base, leadDays: 14 })).toBe("2026-12-16");
  });

  test("more load, minutes, lead or blocks is never earlier", () => {
    fc.assert(
      fc.property(
        someMinutes,
        someLoad,
        someLoad,
        someDay,
        fc.nat(40),
        fc.nat(20),
        fc.integer({ min: 1, max: 30 }),
        (minutes, load, more, today, leadDays, longer, quantity) => {
          const base = { minutes, load: { minutes: load }, today, leadDays, quantity };
          const date = estimateShipDate(base);
          const added = Object.fromEntries(
            centres.map((centre) => [centre, (load[centre] ?? 0) + (more[centre] ?? 0)]),
          );
          const slower = Object.fromEntries(centres.map((centre) => [centre, (minutes[centre] ?? 0) + 7]));
          expect(date > today).toBe(true);
          expect(estimateShipDate(base)).toBe(date);
          expect(estimateShipDate({ ...base, load: { minutes: added } }) >= date).toBe(true);
          expect(estimateShipDate({ ...base, minutes: slower }) >= date).toBe(true);
          expect(estimateShipDate({ ...base, leadDays: leadDays + longer }) >= date).toBe(true);
          expect(estimateShipDate({ ...base, quantity: quantity + 1 }) >= date).toBe(true);
        },
      ),
    );
  });

  test("bad figures and dates are refused", () => {
    const base = { minutes: { wash: 10 }, load: { minutes: {} }, today: "2026-12-01", leadDays: 0 };
    expect(() => estimateShipDate({ ...base, leadDays: -1 })).toThrow("lead days");
    expect(() => estimateShipDate({ ...base, quantity: 0 })).toThrow("quantity");
    expect(() => estimateShipDate({ ...base, minutes: { wash: 0.5 } })).toThrow("minutes");
    expect(() => estimateShipDate({ ...base, load: { minutes: { wash: -3 } } })).toThrow("load");
    expect(() => estimateShipDate({ ...base, today: "2026-02-30" })).toThrow("no calendar date");
    const closed = { ...plainCalendar, shiftMinutes: [0, 0, 0, 0, 0, 0, 0] as const };
    expect(() => estimateShipDate({ ...base, calendar: closed })).toThrow("no working day");
  });
});
