/** A whole number of a currency's smallest unit (cents for USD). Never a fraction. */
export type Cents = number;

/** Decimal places of the smallest unit by ISO 4217 code (references: npm currency-codes 2.2.0). */
export const minorUnits: Readonly<Record<string, number>> = {
  USD: 2,
  EUR: 2,
  CAD: 2,
  HUF: 2,
  JPY: 0,
  ISK: 0,
  KWD: 3,
  BHD: 3,
  TND: 3,
  CLF: 4,
};

/** The amount as plain decimal text without a sign of currency, e.g. 123456 USD -> "1234.56". Throws on an unknown code. */
export function amountText(amount: Cents, currency: string): string {
  const places = minorUnits[currency];
  if (places === undefined) throw new RangeError(`no minor unit is known for the currency ${currency}`);
  requireWhole(amount);
  const digits = Math.abs(amount)
    .toString()
    .padStart(places + 1, "0");
  const text = places === 0 ? digits : `${digits.slice(0, -places)}.${digits.slice(-places)}`;
  return amount < 0 ? `-${text}` : text;
}

/** US dollars as a reader sees them, e.g. 431000 -> "$4,310.00", -500 -> "-$5.00". */
export function formatCents(amount: Cents): string {
  const [whole = "0", fraction = "00"] = amountText(Math.abs(amount), "USD").split(".");
  return `${amount < 0 ? "-" : ""}$${whole.replace(/\B(?=(\d{3})+$)/g, ",")}.${fraction}`;
}

function requireWhole(amount: number): void {
  if (!Number.isSafeInteger(amount)) throw new RangeError(`${amount} is not a whole number of cents`);
}

/**
 * The rational numerator/denominator rounded to a whole number, halves away from zero (2.5 -> 3, -2.5 -> -3).
 * Exact: integers or BigInt in, no floating point. Throws RangeError on a zero denominator or a fraction.
 */
export function roundHalfUp(numerator: number | bigint, denominator: number | bigint): number {
  const top = BigInt(numerator);
  const bottom = BigInt(denominator);
  if (bottom === 0n) throw new RangeError("the denominator is zero");
  const negative = top < 0n !== bottom < 0n;
  const a = top < 0n ? -top : top;
  const b = bottom < 0n ? -bottom : bottom;
  const rounded = (2n * a + b) / (2n * b);
  return Number(negative && rounded !== 0n ? -rounded : rounded);
}

/**
 * Splits an amount over whole non-negative weights by the largest remainder: floor every share, then one cent each to
 * the largest fractions, ties to the earlier line. The shares add up to the amount exactly; a negative amount mirrors
 * the positive one. Throws RangeError without any positive weight.
 */
export function allocate(amount: Cents, weights: readonly number[]): Cents[] {
  requireWhole(amount);
  for (const weight of weights) {
    if (!Number.isSafeInteger(weight) || weight < 0) throw new RangeError(`${weight} is not a weight`);
  }
  const sum = weights.reduce((total, weight) => total + BigInt(weight), 0n);
  if (sum === 0n) throw new RangeError("an amount cannot be split over weights that are all zero");
  const magnitude = BigInt(Math.abs(amount));
  const shares = weights.map((weight, index) => {
    const product = magnitude * BigInt(weight);
    return { index, whole: product / sum, rest: product % sum };
  });
  const left = Number(magnitude - shares.reduce((total, share) => total + share.whole, 0n));
  const favoured = new Set(
    [...shares]
      .sort((a, b) => (a.rest === b.rest ? a.index - b.index : a.rest > b.rest ? -1 : 1))
      .slice(0, left)
      .map((share) => share.index),
  );
  const sign = amount < 0 ? -1 : 1;
  return shares.map(({ index, whole }) => {
    const share = Number(whole) + (favoured.has(index) ? 1 : 0);
    return share === 0 ? 0 : sign * share;
  });
}
