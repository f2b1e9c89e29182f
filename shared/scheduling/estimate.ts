import { workCentreSchema, type WorkCentre } from "../catalogue/catalogue.ts";
import { formatDay, isHoliday, parseDay, weekday } from "./calendar.ts";

/** Minutes of accepted work ahead at each work centre; absent = none. */
export interface Load {
  minutes: Partial<Record<WorkCentre, number>>;
}

/** How many alike machines each work centre has, and the minutes of one shift by weekday (Sunday first). */
export interface ShopCalendar {
  machines: Record<WorkCentre, number>;
  shiftMinutes: readonly [number, number, number, number, number, number, number];
}

/** The calendar the demo shop starts with; invented. */
export const plainCalendar: ShopCalendar = {
  machines: {
    qualify: 1,
    firstOperation: 2,
    secondOperation: 3,
    capFitting: 1,
    thirdOperation: 2,
    finishHone: 1,
    wash: 1,
    inspection: 1,
    pack: 1,
  },
  shiftMinutes: [0, 480, 480, 480, 480, 420, 0],
};

export interface EstimateInput {
  /** Minutes of one block at each work centre. */
  minutes: Partial<Record<WorkCentre, number>>;
  load: Load;
  /** ISO date in the shop's time zone. */
  today: string;
  /** Longest lead of the block's options, calendar days. */
  leadDays: number;
  /** How many alike blocks; 1 if absent. */
  quantity?: number;
  calendar?: ShopCalendar;
}

/**
 * First-cut estimate of the ship date, ISO: the blocks pass the work centres in routing order behind the accepted work,
 * work counts from the day after today over shifts and federal holidays, then the lead days are added and the date moves
 * on to the next working day. Never earlier for more load, more minutes, more blocks or longer lead. The floor's
 * scheduler takes its place behind the same function. Throws RangeError on a negative or fractional figure, a bad date,
 * or a calendar without any working minute.
 */
export function estimateShipDate(input: EstimateInput): string {
  const { minutes, load, leadDays, quantity = 1, calendar = plainCalendar } = input;
  requireWhole(leadDays, 0, "lead days");
  requireWhole(quantity, 1, "quantity");
  let elapsed = 0;
  for (const centre of workCentreSchema.options) {
    const own = minutes[centre] ?? 0;
    const ahead = load.minutes[centre] ?? 0;
    requireWhole(own, 0, "minutes");
    requireWhole(ahead, 0, "load");
    if (own === 0) continue;
    const machines = calendar.machines[centre];
    const rounds = Math.ceil(quantity / machines);
    elapsed = Math.max(elapsed, Math.ceil(ahead / machines)) + rounds * own;
  }
  const finished = dayAfterWork(parseDay(input.today), elapsed, calendar);
  return formatDay(nextWorkingDay(finished + leadDays, calendar));
}

function requireWhole(figure: number, least: number, what: string): void {
  if (!Number.isSafeInteger(figure) || figure < least) {
    throw new RangeError(`${what}: ${figure} is not a whole number of at least ${least}`);
  }
}

function shiftOn(day: number, calendar: ShopCalendar): number {
  return isHoliday(day) ? 0 : (calendar.shiftMinutes[weekday(day)] ?? 0);
}

/** The working day on which so many shift minutes after today are done; at least the next working day. */
function dayAfterWork(today: number, minutes: number, calendar: ShopCalendar): number {
  if (!calendar.shiftMinutes.some((shift) => shift > 0))
    throw new RangeError("the calendar has no working day");
  let left = minutes;
  let day = today;
  do {
    day = nextWorkingDay(day + 1, calendar);
    left -= shiftOn(day, calendar);
  } while (left > 0);
  return day;
}

function nextWorkingDay(from: number, calendar: ShopCalendar): number {
  let day = from;
  while (shiftOn(day, calendar) === 0) day += 1;
  return day;
}
