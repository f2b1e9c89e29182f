import { z } from "zod";
import { contactSchema, deliverySchema } from "./address.ts";

/** One visible line of the total, with its reason in the label. */
const totalLineSchema = z.object({
  kind: z.enum(["block", "freight", "tax"]),
  label: z.string(),
  quantity: z.int(),
  amountCents: z.int(),
});

export const totalsSchema = z.object({
  currency: z.literal("USD"),
  lines: z.array(totalLineSchema),
  goodsCents: z.int(),
  freightCents: z.int(),
  taxCents: z.int(),
  totalCents: z.int(),
});
export type Totals = z.infer<typeof totalsSchema>;

/** POST /api/checkout/total: what the cart costs, delivered. */
export const totalRequestSchema = z.object({ delivery: deliverySchema });

/** POST /api/orders: place the order and open the payment page. */
export const placeOrderRequestSchema = z.object({
  contact: contactSchema,
  delivery: deliverySchema,
  /** The total that the buyer saw; the server refuses when its own differs. */
  expectedTotalCents: z.int(),
});
export type PlaceOrderRequest = z.infer<typeof placeOrderRequestSchema>;

export const placedOrderSchema = z.object({
  orderNumber: z.string(),
  /** Where the browser goes to pay. */
  paymentUrl: z.url(),
});
export type PlacedOrder = z.infer<typeof placedOrderSchema>;

/** GET /api/checkout/result?session=…: only reads; says how the payment stands. */
export const checkoutResultSchema = z.object({
  orderNumber: z.string(),
  state: z.enum(["paid", "waiting", "expired", "returned"]),
  totalCents: z.int(),
  email: z.string(),
});
export type CheckoutResult = z.infer<typeof checkoutResultSchema>;
