import { workCentreSchema, type WorkCentre } from "../catalogue/catalogue.ts";
import { parseDay } from "../scheduling/calendar.ts";
import { estimateShipDate, type Load } from "../scheduling/estimate.ts";

export type Minutes = Partial<Record<WorkCentre, number>>;

/** A ship date, ISO, and the same as a day number. */
export interface ShipDate {
  date: string;
  day: number;
}

/** Dates kept for one load; the estimate is asked again when they are dropped. */
const mostKept = 20_000;
const known = new WeakMap<Load, Map<string, ShipDate>>();

/** The estimated ship date of one block; kept, since most options leave it as it is. */
export function shipDateOf(load: Load, today: string, minutes: Minutes, leadDays: number): ShipDate {
  const dates = known.get(load) ?? new Map<string, ShipDate>();
  known.set(load, dates);
  let key = `${today} ${leadDays}`;
  for (const centre of workCentreSchema.options) key += ` ${minutes[centre] ?? 0}`;
  const found = dates.get(key);
  if (found !== undefined) return found;
  if (dates.size >= mostKept) dates.clear();
  const date = estimateShipDate({ minutes, load, today, leadDays });
  const made = { date, day: parseDay(date) };
  dates.set(key, made);
  return made;
}
