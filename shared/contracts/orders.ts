import { z } from "zod";
import { readOrderNumber } from "../orders/order-number.ts";
import { orderStateSchema } from "../orders/order-state.ts";
import { contactSchema, deliverySchema } from "./address.ts";
import { buildViewSchema } from "./build.ts";
import { totalsSchema } from "./checkout.ts";
import { emailAddressSchema } from "./person.ts";

/** An order number in an address, read as leniently as a person types it. */
export const orderNumberSchema = z
  .string()
  .transform((text) => readOrderNumber(text) ?? "")
  .refine((number) => number !== "", "This is not an order number.");

/** POST /api/orders/links */
export const orderLinkRequestSchema = z.object({
  orderNumber: z
    .string()
    .trim()
    .min(1, "Write the order number.")
    .max(20, "An order number looks like K7Q4-M2XD."),
  email: emailAddressSchema,
});

const orderLineSchema = z.object({
  id: z.uuid(),
  quantity: z.int(),
  engraving: z.string(),
  specialRequest: z.string(),
  specialRequestAnswer: z.string(),
  build: buildViewSchema,
  totalCents: z.int(),
});
export type OrderLineView = z.infer<typeof orderLineSchema>;

const orderEventSchema = z.object({
  id: z.uuid(),
  at: z.iso.datetime(),
  /** What happened, in words for the reader. */
  text: z.string(),
  state: orderStateSchema,
});

/** GET /api/orders/:number, as the customer sees it. */
export const orderSchema = z.object({
  number: z.string(),
  state: orderStateSchema,
  placedAt: z.iso.datetime().nullable(),
  estimatedShipOn: z.iso.date(),
  promisedShipOn: z.iso.date().nullable(),
  declineReason: z.string().nullable(),
  contact: contactSchema,
  delivery: deliverySchema,
  lines: z.array(orderLineSchema),
  totals: totalsSchema,
  paidCents: z.int(),
  returnedCents: z.int(),
  history: z.array(orderEventSchema),
  /** What comes next, one sentence. */
  next: z.string(),
});
export type OrderView = z.infer<typeof orderSchema>;

/** GET /api/orders/:number/review, as the planner sees it. */
export const orderReviewSchema = orderSchema.extend({
  openedBy: z.object({ name: z.string(), at: z.iso.datetime(), me: z.boolean() }).nullable(),
  /** Today's estimate against the present load; the promise that the form proposes. */
  proposedShipOn: z.iso.date(),
  history: z.array(orderEventSchema.extend({ by: z.string() })),
});
export type OrderReview = z.infer<typeof orderReviewSchema>;

const orderSummarySchema = z.object({
  number: z.string(),
  state: orderStateSchema,
  placedAt: z.iso.datetime().nullable(),
  contactName: z.string(),
  summary: z.string(),
  blocks: z.int(),
  totalCents: z.int(),
  cautions: z.int(),
  hasSpecialRequest: z.boolean(),
  shipsOn: z.iso.date(),
  openedBy: z.string().nullable(),
});
export type OrderSummary = z.infer<typeof orderSummarySchema>;

/** GET /api/orders?state=&search=&page= */
export const orderListQuerySchema = z.object({
  state: orderStateSchema.exclude(["awaiting-payment"]).default("placed"),
  search: z.string().trim().max(100).default(""),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});
export type OrderListQuery = z.infer<typeof orderListQuerySchema>;

export const orderListSchema = z.object({
  orders: z.array(orderSummarySchema),
  total: z.int(),
  page: z.int(),
  pages: z.int(),
});

/** GET /api/account/orders */
export const myOrdersSchema = z.object({
  orders: z.array(orderSummarySchema.omit({ openedBy: true, cautions: true })),
});
export type MyOrders = z.infer<typeof myOrdersSchema>;

export const acceptOrderRequestSchema = z.object({
  promisedShipOn: z.iso.date("Choose a date."),
  /** Needed when the promise differs from the estimate. */
  dateReason: z.string().trim().max(300, "At most 300 characters.").default(""),
  /** An answer for every line with a special request: line id -> answer. */
  answers: z.record(z.uuid(), z.string().trim().max(500, "At most 500 characters.")).default({}),
});
export type AcceptOrderRequest = z.infer<typeof acceptOrderRequestSchema>;

export const declineOrderRequestSchema = z.object({
  reason: z
    .string()
    .trim()
    .min(10, "Tell the customer why, in a sentence.")
    .max(500, "At most 500 characters."),
});
export type DeclineOrderRequest = z.infer<typeof declineOrderRequestSchema>;
