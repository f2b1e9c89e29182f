import { z } from "zod";

/** The records that the service keeps, in the shape in which the v1 API shows them. */

const metadata = z.record(z.string(), z.string());
const id = z.string();
const unixSeconds = z.number().int();
const cents = z.number().int();

const lineItem = z.object({
  id,
  object: z.literal("item"),
  amount_discount: cents,
  amount_subtotal: cents,
  amount_tax: cents,
  amount_total: cents,
  currency: z.string(),
  description: z.string(),
  price: z.object({
    id,
    object: z.literal("price"),
    currency: z.string(),
    unit_amount: cents,
    product: id,
    type: z.literal("one_time"),
  }),
  quantity: z.number().int(),
});

const session = z.object({
  id,
  object: z.literal("checkout.session"),
  allowed_payment_method_types: z.array(z.string()).nullable(),
  amount_subtotal: cents,
  amount_total: cents,
  cancel_url: z.string().nullable(),
  client_reference_id: z.string().nullable(),
  created: unixSeconds,
  currency: z.string(),
  customer: z.null(),
  customer_details: z
    .object({ email: z.string().nullable(), name: z.string().nullable(), address: z.null(), phone: z.null() })
    .nullable(),
  customer_email: z.string().nullable(),
  expires_at: unixSeconds,
  livemode: z.literal(false),
  metadata,
  mode: z.literal("payment"),
  payment_intent: id.nullable(),
  payment_method_types: z.array(z.string()),
  payment_status: z.enum(["paid", "unpaid"]),
  status: z.enum(["open", "complete", "expired"]),
  success_url: z.string(),
  total_details: z.object({ amount_discount: cents, amount_shipping: cents, amount_tax: cents }),
  ui_mode: z.literal("hosted_page"),
});

const paymentError = z.object({
  type: z.enum(["card_error", "invalid_request_error"]),
  code: z.string(),
  decline_code: z.string().optional(),
  message: z.string(),
  charge: id.optional(),
});

const intent = z.object({
  id,
  object: z.literal("payment_intent"),
  amount: cents,
  amount_capturable: cents,
  amount_received: cents,
  canceled_at: z.null(),
  capture_method: z.literal("automatic_async"),
  client_secret: z.string(),
  confirmation_method: z.literal("automatic"),
  created: unixSeconds,
  currency: z.string(),
  customer: z.null(),
  description: z.string().nullable(),
  last_payment_error: paymentError.nullable(),
  latest_charge: id.nullable(),
  livemode: z.literal(false),
  metadata,
  next_action: z
    .object({
      type: z.literal("redirect_to_url"),
      redirect_to_url: z.object({ url: z.string(), return_url: z.string() }),
    })
    .nullable(),
  payment_method_types: z.array(z.string()),
  receipt_email: z.string().nullable(),
  status: z.enum(["requires_payment_method", "requires_action", "succeeded", "canceled"]),
});

const cardDetails = z.object({
  brand: z.string(),
  country: z.literal("US"),
  exp_month: z.number().int(),
  exp_year: z.number().int(),
  funding: z.literal("credit"),
  last4: z.string(),
});

const charge = z.object({
  id,
  object: z.literal("charge"),
  amount: cents,
  amount_captured: cents,
  amount_refunded: cents,
  billing_details: z.object({
    address: z.null(),
    email: z.string().nullable(),
    name: z.string().nullable(),
    phone: z.null(),
  }),
  captured: z.boolean(),
  created: unixSeconds,
  currency: z.string(),
  customer: z.null(),
  description: z.string().nullable(),
  disputed: z.literal(false),
  failure_code: z.string().nullable(),
  failure_message: z.string().nullable(),
  livemode: z.literal(false),
  metadata,
  outcome: z.object({
    network_status: z.enum(["approved_by_network", "declined_by_network", "not_sent_to_network"]),
    reason: z.string().nullable(),
    risk_level: z.enum(["normal", "highest"]),
    seller_message: z.string(),
    type: z.enum(["authorized", "issuer_declined", "blocked"]),
  }),
  paid: z.boolean(),
  payment_intent: id,
  payment_method_details: z.object({ type: z.literal("card"), card: cardDetails }),
  receipt_email: z.string().nullable(),
  refunded: z.boolean(),
  status: z.enum(["succeeded", "failed"]),
});

const refund = z.object({
  id,
  object: z.literal("refund"),
  amount: cents,
  charge: id,
  created: unixSeconds,
  currency: z.string(),
  customer: z.null(),
  metadata,
  payment_intent: id,
  reason: z.enum(["requested_by_customer", "duplicate", "fraudulent"]).nullable(),
  receipt_number: z.null(),
  status: z.literal("succeeded"),
});

const taxabilityReason = z.enum(["standard_rated", "not_subject_to_tax", "customer_exempt"]);

const lineTax = z.object({
  amount: cents,
  jurisdiction: z.object({
    country: z.literal("US"),
    display_name: z.string(),
    level: z.literal("state"),
    state: z.string(),
  }),
  sourcing: z.literal("destination"),
  tax_rate_details: z
    .object({ display_name: z.string(), percentage_decimal: z.string(), tax_type: z.literal("sales_tax") })
    .nullable(),
  taxability_reason: taxabilityReason,
  taxable_amount: cents,
});

const calculationLine = z.object({
  id,
  object: z.literal("tax.calculation_line_item"),
  amount: cents,
  amount_tax: cents,
  livemode: z.literal(false),
  metadata: metadata.nullable(),
  product: z.null(),
  quantity: z.number().int(),
  reference: z.string(),
  tax_behavior: z.literal("exclusive"),
  tax_breakdown: z.array(lineTax),
  tax_code: z.string(),
});

const calculation = z.object({
  id,
  object: z.literal("tax.calculation"),
  amount_total: cents,
  currency: z.string(),
  customer: z.null(),
  customer_details: z.object({
    address: z.record(z.string(), z.string().nullable()),
    address_source: z.enum(["shipping", "billing"]).nullable(),
    ip_address: z.null(),
    tax_ids: z.tuple([]),
    taxability_override: z.enum(["none", "customer_exempt"]),
  }),
  expires_at: unixSeconds,
  livemode: z.literal(false),
  ship_from_details: z.null(),
  shipping_cost: z
    .object({
      amount: cents,
      amount_tax: cents,
      tax_behavior: z.literal("exclusive"),
      tax_breakdown: z.array(lineTax),
      tax_code: z.string(),
    })
    .nullable(),
  tax_amount_exclusive: cents,
  tax_amount_inclusive: cents,
  tax_breakdown: z.array(
    z.object({
      amount: cents,
      inclusive: z.literal(false),
      tax_rate_details: z.object({
        country: z.literal("US"),
        flat_amount: z.null(),
        percentage_decimal: z.string(),
        rate_type: z.literal("percentage").nullable(),
        state: z.string(),
        tax_type: z.literal("sales_tax").nullable(),
      }),
      taxability_reason: taxabilityReason,
      taxable_amount: cents,
    }),
  ),
  tax_date: unixSeconds,
});

const event = z.object({
  id,
  object: z.literal("event"),
  api_version: z.string(),
  created: unixSeconds,
  data: z.object({
    object: z.record(z.string(), z.unknown()),
    previous_attributes: z.record(z.string(), z.unknown()).optional(),
  }),
  livemode: z.literal(false),
  pending_webhooks: z.number().int(),
  request: z.object({ id: id.nullable(), idempotency_key: z.string().nullable() }),
  type: z.string(),
});

/** One event on its way to the shop. Times in milliseconds. */
const delivery = z.object({
  eventId: id,
  state: z.enum(["waiting", "held", "lost", "delivered"]),
  dueAt: z.number(),
  /** Among deliveries due at the same time the smaller goes first. */
  order: z.number(),
  attempts: z.array(
    z.object({ at: z.number(), status: z.number().int().nullable(), error: z.string().nullable() }),
  ),
});

const idempotentResult = z.object({
  fingerprint: z.string(),
  status: z.number().int(),
  body: z.record(z.string(), z.unknown()),
  requestId: id,
  /** Milliseconds. */
  createdAt: z.number(),
});

/** A card whose bank has asked the buyer to confirm. The number itself is never kept. */
const waitingCard = z.object({
  card: cardDetails,
  name: z.string(),
  refusal: z.object({ code: z.string(), declineCode: z.string() }).nullable(),
});

export const stateSchema = z.object({
  sessions: z.record(id, session),
  /** By session: what is bought, with the merchant's own description of each line. */
  sessionLines: z.record(id, z.array(z.object({ item: lineItem, details: z.string().nullable() }))),
  /** By session: what its payment will carry. */
  intentData: z.record(id, z.object({ metadata, description: z.string().nullable() })),
  intents: z.record(id, intent),
  waitingCards: z.record(id, waitingCard),
  charges: z.record(id, charge),
  refunds: z.record(id, refund),
  calculations: z.record(id, calculation),
  calculationLines: z.record(id, z.array(calculationLine)),
  events: z.record(id, event),
  deliveries: z.array(delivery),
  idempotentResults: z.record(z.string(), idempotentResult),
});

export type State = z.infer<typeof stateSchema>;
export type Session = z.infer<typeof session>;
export type LineItem = z.infer<typeof lineItem>;
export type PaymentIntent = z.infer<typeof intent>;
export type Charge = z.infer<typeof charge>;
export type CardDetails = z.infer<typeof cardDetails>;
export type Refund = z.infer<typeof refund>;
export type Calculation = z.infer<typeof calculation>;
export type CalculationLine = z.infer<typeof calculationLine>;
export type LineTax = z.infer<typeof lineTax>;
export type StoredEvent = z.infer<typeof event>;
export type Delivery = z.infer<typeof delivery>;
