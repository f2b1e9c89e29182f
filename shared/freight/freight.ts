import type { Cents } from "../money/cents.ts";
import type { PriceList } from "../pricing/price-list.ts";

export type FreightQuote = { ok: true; cents: Cents } | { ok: false; message: string };

/** US ZIP code: five digits, or nine with a hyphen; leading zeros count. */
const zipCode = /^\d{5}(-\d{4})?$/;

/**
 * Freight for a number of blocks to a US ZIP code, whole cents: the price list's rate for its first digit, per block.
 * A first-cut table; density and class come with the full freight rating. Where there is no rate, the message says so
 * to the buyer.
 */
export function quoteFreight(priceList: PriceList, postalCode: string, blocks: number): FreightQuote {
  if (!Number.isSafeInteger(blocks) || blocks < 1) {
    return { ok: false, message: "There is no block to ship." };
  }
  const trimmed = postalCode.trim();
  if (!zipCode.test(trimmed)) {
    return { ok: false, message: "Write a ZIP code of five digits, or ZIP+4." };
  }
  const zone = trimmed.charAt(0);
  const rate = priceList.freightByZone[zone];
  if (rate === undefined) {
    return {
      ok: false,
      message: `We have no freight rate for ZIP codes that start with ${zone}. Choose pick-up or call us.`,
    };
  }
  return { ok: true, cents: rate * blocks };
}
