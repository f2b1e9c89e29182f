import { z } from "zod";

/** A US ZIP code's first digit. */
const zone = z.string().regex(/^\d$/);

/**
 * Amounts in whole cents, keyed by family and option; immutable, versioned, each with an effective date.
 * An amount may be negative (a deduction). Kept apart from the catalogue, which holds no money.
 */
export const priceListSchema = z.object({
  version: z.int().min(1),
  name: z.string().min(1),
  effectiveOn: z.iso.date(),
  currency: z.literal("USD"),
  /** family id -> base amount of a bare block. */
  families: z.record(z.string(), z.int().min(0)),
  /** choice id -> option id -> amount, either one for all families or one for each. */
  options: z.record(z.string(), z.record(z.string(), z.union([z.int(), z.record(z.string(), z.int())]))),
  /** One freight rate for each first ZIP digit, per block. Pick-up at the shop costs nothing. */
  freightByZone: z.record(zone, z.int().min(0)),
});
export type PriceList = z.infer<typeof priceListSchema>;
