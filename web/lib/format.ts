import { formatMillimetres, measuredLength } from "#shared/units/length.ts";

const dollars = new Intl.NumberFormat("en-US", { style: "currency", currency: "USD" });
const grouped = new Intl.NumberFormat("en-US");

const minus = "\u2212";

/** Integer cents as "$4,310.00"; a true minus sign before what is negative. */
export function money(cents: number): string {
  const text = dollars.format(Math.abs(cents) / 100);
  return cents < 0 ? `${minus}${text}` : text;
}

/** A change of price: "+$310.00", "−$45.00", "no change". */
export function moneyChange(cents: number): string {
  if (cents === 0) return "no change";
  return cents > 0 ? `+${money(cents)}` : money(cents);
}

/** Making a formatter costs far more than using it. */
const byPlaces = new Map<number, Intl.NumberFormat>();

function placed(places: number): Intl.NumberFormat {
  const known = byPlaces.get(places);
  if (known !== undefined) return known;
  const made = new Intl.NumberFormat("en-US", {
    minimumFractionDigits: places,
    maximumFractionDigits: places,
  });
  byPlaces.set(places, made);
  return made;
}

/** A number to fixed places with a true minus sign, such as 4.125 to 4 places: "4.1250". */
export function fixed(value: number, places: number): string {
  const text = placed(places).format(Math.abs(value));
  return value < 0 && Number(value.toFixed(places)) !== 0 ? `${minus}${text}` : text;
}

/** Inches to four digits unless told otherwise: "4.1250 in". */
export function inches(value: number, places = 4): string {
  return `${fixed(value, places)} in`;
}

/** Inches, read to 0.0001 in, shown in millimetres; halves are rounded away from zero. */
export function millimetres(valueInInches: number, places = 2): string {
  return `${formatMillimetres(measuredLength(valueInInches), places).replace("-", minus)} mm`;
}

/** Whole pounds: "187 lb". */
export function pounds(value: number): string {
  return `${grouped.format(Math.round(value))} lb`;
}

/** A change of weight: "+12 lb", "−3 lb", "no change". */
export function poundsChange(value: number): string {
  const whole = Math.round(value);
  if (whole === 0) return "no change";
  return whole > 0 ? `+${pounds(whole)}` : `${minus}${pounds(-whole)}`;
}

/** A change of days: "+2 days", "−1 day", "no change". */
export function daysChange(days: number): string {
  if (days === 0) return "no change";
  const size = Math.abs(days);
  return `${days > 0 ? "+" : minus}${size} ${size === 1 ? "day" : "days"}`;
}

const calendarDay = new Intl.DateTimeFormat("en-GB", {
  day: "numeric",
  month: "long",
  year: "numeric",
  timeZone: "UTC",
});

/** A calendar date (ISO, no time) as "12 May 2026". */
export function date(isoDate: string): string {
  return calendarDay.format(new Date(`${isoDate}T00:00:00Z`));
}

/** A moment as "12 May 2026, 14:05" on the shop's clock. */
export function dateTime(isoMoment: string, timeZone: string): string {
  const moment = new Date(isoMoment);
  const day = moment.toLocaleDateString("en-GB", {
    day: "numeric",
    month: "long",
    year: "numeric",
    timeZone,
  });
  const time = moment.toLocaleTimeString("en-GB", { hour: "2-digit", minute: "2-digit", timeZone });
  return `${day}, ${time}`;
}

/** "+13135550123" as it is read in the US: "(313) 555-0123". */
export function telephone(phone: string): string {
  const parts = /^\+1(\d{3})(\d{3})(\d{4})$/.exec(phone);
  return parts === null ? phone : `(${parts[1] ?? ""}) ${parts[2] ?? ""}-${parts[3] ?? ""}`;
}
