import { z } from "zod";
import { buildRequestSchema, buildViewSchema, engravingSchema } from "./build.ts";

const specialRequestSchema = z.string().trim().max(500, "At most 500 characters.");

export const addCartLineRequestSchema = buildRequestSchema.extend({
  quantity: z.int().min(1, "At least one block.").max(20, "At most 20 blocks on a line.").default(1),
  engraving: engravingSchema.default(""),
  specialRequest: specialRequestSchema.default(""),
  /** What the browser showed for one block; the server refuses when its own price differs. */
  expectedPriceCents: z.int(),
});
export type AddCartLineRequest = z.infer<typeof addCartLineRequestSchema>;

export const changeCartLineRequestSchema = z.object({
  quantity: z.int().min(1, "At least one block.").max(20, "At most 20 blocks on a line."),
});

const cartLineSchema = z.object({
  id: z.uuid(),
  quantity: z.int(),
  engraving: z.string(),
  specialRequest: z.string(),
  build: buildViewSchema,
  /** Price for one block when it was put in the cart, if it differs from today's. */
  earlierPriceCents: z.int().nullable(),
  totalCents: z.int(),
});
export type CartLineView = z.infer<typeof cartLineSchema>;

export const cartSchema = z.object({
  lines: z.array(cartLineSchema),
  /** Lines whose build can no longer be made as it stands, with the reason; they must be opened again or removed. */
  refused: z.array(z.object({ id: z.uuid(), specCode: z.string(), reason: z.string() })),
  totalCents: z.int(),
  blocks: z.int(),
});
export type CartView = z.infer<typeof cartSchema>;
