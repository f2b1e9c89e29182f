/**
 * Exact lengths. A length is a whole number of units of 0.00005 in, so that every length on the 0.0001 in grid and
 * its half are integers, and sums and halves of catalogue or typed lengths carry no rounding.
 */

/** Whole units in one inch. */
const unitsPerInch = 20_000;

const decimalText = /^([+-]?)(\d{1,7})(?:\.(\d+))?$/;

/** Units of a plain number of inches from the catalogue; throws RangeError if it lies off the 0.00005 in grid. */
export function lengthFromInches(inches: number): number {
  const units = Math.round(inches * unitsPerInch);
  if (!Number.isSafeInteger(units) || Math.abs(units / unitsPerInch - inches) > 1e-9) {
    throw new RangeError(`${inches} in does not lie on the 0.00005 in grid`);
  }
  return units === 0 ? 0 : units;
}

/** Units of decimal text in inches, e.g. "6.1250"; null if it is no decimal or lies off the 0.00005 in grid. */
export function parseLength(text: string): number | null {
  const parts = decimalText.exec(text.trim());
  if (parts === null) return null;
  const [, sign = "", whole = "0", fraction = ""] = parts;
  const places = Math.max(fraction.length, 5);
  const scaled = BigInt(whole + fraction.padEnd(places, "0")) * BigInt(unitsPerInch);
  const divisor = 10n ** BigInt(places);
  if (scaled % divisor !== 0n) return null;
  const units = Number(scaled / divisor);
  return sign === "-" && units !== 0 ? -units : units;
}

/** Inches of a length in units; for display and for figures. */
export function toInches(units: number): number {
  return units / unitsPerInch;
}

/** A measured (floating point) distance in inches, rounded half up to the 0.0001 in grid, in units. */
export function measuredLength(inches: number): number {
  if (!Number.isFinite(inches)) throw new RangeError("a measured distance must be a finite number");
  const units = Math.round(inches * 10_000) * 2;
  return units === 0 ? 0 : units;
}

function formatScaled(numerator: bigint, denominator: bigint, places: number): string {
  const magnitude = numerator < 0n ? -numerator : numerator;
  const scaled = (magnitude * 10n ** BigInt(places) * 2n + denominator) / (denominator * 2n);
  const digits = scaled.toString().padStart(places + 1, "0");
  const text = places === 0 ? digits : `${digits.slice(0, -places)}.${digits.slice(-places)}`;
  return numerator < 0n && scaled !== 0n ? `-${text}` : text;
}

/** Text in inches, rounded half away from zero to the places given (the shop holds four). */
export function formatInches(units: number, places = 4): string {
  return formatScaled(BigInt(units), BigInt(unitsPerInch), places);
}

/** Text in millimetres; 1 in = 25.4 mm exactly (NIST SP 811, appendix B), rounded once. */
export function formatMillimetres(units: number, places = 3): string {
  return formatScaled(BigInt(units) * 127n, BigInt(unitsPerInch) * 5n, places);
}

/**
 * Compares two quantities the way every rule does: both as whole units of 0.00005, so that a limit met exactly is met.
 * Negative, zero or positive as left is smaller, the same or greater.
 */
export function compareQuantities(left: number, right: number): number {
  return Math.round(left * unitsPerInch) - Math.round(right * unitsPerInch);
}
