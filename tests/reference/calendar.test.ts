import { describe, expect, test } from "vitest";
import { formatDay, isHoliday, parseDay, weekday } from "#shared/scheduling/calendar.ts";

describe("calendar days", () => {
  test("days are whole numbers from 1970-01-01, a Thursday, and come back as they were", () => {
    expect(parseDay("1970-01-01")).toBe(0);
    expect(weekday(0)).toBe(4);
    // Net terms of 30 days (recomputed): the due dates of the references.
    for (const [from, due] of [
      ["2024-01-31", "2024-03-01"],
      ["2023-01-31", "2023-03-02"],
      ["2024-02-29", "2024-03-30"],
      ["2025-12-15", "2026-01-14"],
    ] as const) {
      expect(formatDay(parseDay(from) + 30)).toBe(due);
    }
  });

  test("they agree with the platform's calendar over 200 years", () => {
    for (let day = parseDay("1950-01-01"); day < parseDay("2150-01-01"); day += 13) {
      const platform = new Date(day * 86_400_000);
      expect(formatDay(day)).toBe(platform.toISOString().slice(0, 10));
      expect(weekday(day)).toBe(platform.getUTCDay());
    }
  });

  test("what is no date is refused", () => {
    for (const text of ["2026-02-29", "2026-13-01", "2026-1-1", "tomorrow", ""]) {
      expect(() => parseDay(text)).toThrow("no calendar date");
    }
  });
});

describe("federal holidays (5 U.S.C. 6103, from memory)", () => {
  test("those of 2026, with Independence Day kept on the Friday before", () => {
    const kept = [
      "2026-01-01",
      "2026-01-19",
      "2026-02-16",
      "2026-05-25",
      "2026-06-19",
      "2026-07-03",
      "2026-09-07",
      "2026-10-12",
      "2026-11-11",
      "2026-11-26",
      "2026-12-25",
    ];
    const found: string[] = [];
    for (let day = parseDay("2026-01-01"); day <= parseDay("2026-12-31"); day += 1)
      if (isHoliday(day)) found.push(formatDay(day));
    expect(found).toEqual(kept);
  });

  test("a New Year's Day on Saturday is kept on 31 December of the year before", () => {
    expect(isHoliday(parseDay("2021-12-31"))).toBe(true);
    expect(isHoliday(parseDay("2022-01-01"))).toBe(false);
  });

  test("a Sunday holiday is kept on Monday", () => {
    expect(isHoliday(parseDay("2022-06-20"))).toBe(true);
    expect(isHoliday(parseDay("2022-06-19"))).toBe(false);
  });
});
