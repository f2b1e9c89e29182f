import { z } from "zod";
import type { Cents } from "../money/cents.ts";
import type { PriceList } from "../pricing/price-list.ts";

/** How the blocks leave the shop. */
export const deliverySchema = z.discriminatedUnion("method", [
  z.object({ method: z.literal("pick-up") }),
  z.object({ method: z.literal("freight"), postalCode: z.string() }),
]);
export type Delivery = z.infer<typeof deliverySchema>;

export type FreightQuote =
  { ok: true; perBlockCents: Cents; totalCents: Cents; zone: string | null } | { ok: false; message: string };

/** US ZIP code: five digits, or nine with a hyphen; leading zeros count. */
const zipCode = /^\d{5}(-\d{4})?$/;

/**
 * Freight for a number of alike blocks, whole cents: nothing for pick-up, else the price list's rate for the first digit
 * of the ZIP code, per block. A first-cut table; density and class come with the full freight rating.
 */
export function quoteFreight(priceList: PriceList, delivery: Delivery, blocks: number): FreightQuote {
  if (!Number.isSafeInteger(blocks) || blocks < 1)
    return { ok: false, message: "There is no block to ship." };
  if (delivery.method === "pick-up") return { ok: true, perBlockCents: 0, totalCents: 0, zone: null };
  const postalCode = delivery.postalCode.trim();
  if (!zipCode.test(postalCode)) {
    return { ok: false, message: "Enter a US ZIP code: five digits, or five and four with a hyphen." };
  }
  const zone = postalCode.charAt(0);
  const rate = priceList.freightByZone[zone];
  if (rate === undefined) {
    return {
      ok: false,
      message: `We have no freight rate for ZIP codes that start with ${zone}. Choose pick-up or call us.`,
    };
  }
  return { ok: true, perBlockCents: rate, totalCents: rate * blocks, zone };
}

/** Freight for a number of blocks to a US ZIP code, whole cents. Throws RangeError, with a plain sentence, where there is no rate. */
export function freightCents(priceList: PriceList, postalCode: string, blocks: number): Cents {
  const quote = quoteFreight(priceList, { method: "freight", postalCode }, blocks);
  if (!quote.ok) throw new RangeError(quote.message);
  return quote.totalCents;
}
