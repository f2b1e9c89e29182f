/**
 * Calendar days as whole numbers (days since 1970-01-01) and the working days of a shop. Pure integer arithmetic on the
 * proleptic Gregorian calendar; no clock and no time zone: "today" always comes in as an ISO date.
 */

const isoDate = /^(\d{4})-(\d{2})-(\d{2})$/;

/** Day number of a civil date; months count from 1. */
function dayNumber(year: number, month: number, day: number): number {
  const shifted = month <= 2 ? year - 1 : year;
  const era = Math.floor(shifted / 400);
  const yearOfEra = shifted - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146_097 + dayOfEra - 719_468;
}

function civilDate(day: number): { year: number; month: number; day: number } {
  const shifted = day + 719_468;
  const era = Math.floor(shifted / 146_097);
  const dayOfEra = shifted - era * 146_097;
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1_460) +
      Math.floor(dayOfEra / 36_524) -
      Math.floor(dayOfEra / 146_096)) /
      365,
  );
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const shiftedMonth = Math.floor((5 * dayOfYear + 2) / 153);
  const month = shiftedMonth < 10 ? shiftedMonth + 3 : shiftedMonth - 9;
  return {
    year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0),
    month,
    day: dayOfYear - Math.floor((153 * shiftedMonth + 2) / 5) + 1,
  };
}

/** Day number of an ISO date; throws RangeError on text that is no date of the calendar. */
export function parseDay(iso: string): number {
  const parts = isoDate.exec(iso);
  if (parts !== null) {
    const day = dayNumber(Number(parts[1]), Number(parts[2]), Number(parts[3]));
    if (formatDay(day) === iso) return day;
  }
  throw new RangeError(`${iso} is no calendar date`);
}

/** ISO date of a day number. */
export function formatDay(day: number): string {
  const date = civilDate(day);
  return [date.year.toString().padStart(4, "0"), pad(date.month), pad(date.day)].join("-");
}

function pad(part: number): string {
  return part.toString().padStart(2, "0");
}

/** 0 = Sunday ... 6 = Saturday. */
export function weekday(day: number): number {
  return (((day + 4) % 7) + 7) % 7;
}

/** A holiday by its rule: a fixed date, or the nth (or last) weekday of a month. */
type HolidayRule =
  | { name: string; month: number; day: number }
  | { name: string; month: number; weekday: number; nth: 1 | 2 | 3 | 4 | "last" };

/** Federal holidays of the United States (5 U.S.C. 6103, from memory). */
const federalHolidays: readonly HolidayRule[] = [
  { name: "New Year's Day", month: 1, day: 1 },
  { name: "Birthday of Martin Luther King, Jr.", month: 1, weekday: 1, nth: 3 },
  { name: "Washington's Birthday", month: 2, weekday: 1, nth: 3 },
  { name: "Memorial Day", month: 5, weekday: 1, nth: "last" },
  { name: "Juneteenth", month: 6, day: 19 },
  { name: "Independence Day", month: 7, day: 4 },
  { name: "Labor Day", month: 9, weekday: 1, nth: 1 },
  { name: "Columbus Day", month: 10, weekday: 1, nth: 2 },
  { name: "Veterans Day", month: 11, day: 11 },
  { name: "Thanksgiving Day", month: 11, weekday: 4, nth: 4 },
  { name: "Christmas Day", month: 12, day: 25 },
];

/** The day a holiday is kept: a Saturday's on the Friday before, a Sunday's on the Monday after. */
function observed(rule: HolidayRule, year: number): number {
  if ("day" in rule) {
    const day = dayNumber(year, rule.month, rule.day);
    if (weekday(day) === 6) return day - 1;
    return weekday(day) === 0 ? day + 1 : day;
  }
  if (rule.nth === "last") {
    const last =
      dayNumber(rule.month === 12 ? year + 1 : year, rule.month === 12 ? 1 : rule.month + 1, 1) - 1;
    return last - ((weekday(last) - rule.weekday + 7) % 7);
  }
  const first = dayNumber(year, rule.month, 1);
  return first + ((rule.weekday - weekday(first) + 7) % 7) + (rule.nth - 1) * 7;
}

const holidaysByYear = new Map<number, ReadonlySet<number>>();

function holidaysOf(year: number): ReadonlySet<number> {
  const known = holidaysByYear.get(year);
  if (known !== undefined) return known;
  // 1 January of the year after may be kept on 31 December.
  const days = new Set([year, year + 1].flatMap((y) => federalHolidays.map((rule) => observed(rule, y))));
  holidaysByYear.set(year, days);
  return days;
}

/** Whether the day is kept as a federal holiday. */
export function isHoliday(day: number): boolean {
  return holidaysOf(civilDate(day).year).has(day);
}
