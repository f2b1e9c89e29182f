import { z } from "zod";
import type { Endpoint } from "./endpoint.ts";
import { invalidRequest, noSuchRecord } from "./errors.ts";
import { newId } from "./identifiers.ts";
import { listPage, newestFirst } from "./lists.ts";
import { amount, integer, listParameters, metadataParameter, parseParameters, text } from "./parameters.ts";
import type { LineItem, Session } from "./records.ts";
import { recordEvent, type Work } from "./work.ts";

const MINUTE = 60;
const DAY = 24 * 60 * MINUTE;
const SMALLEST_TOTAL = 50;
const LARGEST_TOTAL = 99_999_999;

const expand = z.array(text).optional();

const createParameters = z.strictObject({
  mode: z.literal("payment"),
  line_items: z
    .array(
      z.strictObject({
        quantity: integer.pipe(z.number().min(1)),
        price_data: z.strictObject({
          currency: z.string().regex(/^[a-z]{3}$/i),
          unit_amount: amount,
          product_data: z.strictObject({
            name: text,
            description: text.optional(),
            tax_code: text.optional(),
          }),
        }),
      }),
    )
    .min(1)
    .max(100),
  success_url: z.url(),
  cancel_url: z.url().optional(),
  client_reference_id: text.optional(),
  customer_email: z.email().optional(),
  expires_at: integer.optional(),
  metadata: metadataParameter.optional(),
  payment_intent_data: z
    .strictObject({ metadata: metadataParameter.optional(), description: text.optional() })
    .optional(),
  allowed_payment_method_types: z.array(z.literal("card")).optional(),
  expand,
});

const listOfSessions = z.strictObject({
  ...listParameters,
  payment_intent: text.optional(),
  status: z.enum(["open", "complete", "expired"]).optional(),
  expand,
});

export const checkoutSessionEndpoints: Endpoint[] = [
  {
    method: "post",
    path: "/checkout/sessions",
    run: (work, { parameters }) => shown(work, create(work, parseParameters(createParameters, parameters))),
  },
  {
    method: "get",
    path: "/checkout/sessions",
    run(work, { parameters }) {
      const request = parseParameters(listOfSessions, parameters);
      const sessions = newestFirst(work.state.sessions).filter(
        (session) =>
          (request.payment_intent === undefined || session.payment_intent === request.payment_intent) &&
          (request.status === undefined || session.status === request.status),
      );
      const page = listPage(sessions, request, "/v1/checkout/sessions");
      return { ...page, data: page.data.map((session) => shown(work, session)) };
    },
  },
  {
    method: "get",
    path: "/checkout/sessions/:id",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({ expand }), parameters);
      return shown(work, findSession(work, id));
    },
  },
  {
    method: "get",
    path: "/checkout/sessions/:id/line_items",
    run(work, { id, parameters }) {
      const request = parseParameters(z.strictObject({ ...listParameters, expand }), parameters);
      findSession(work, id);
      return listPage(lineItemsOf(work, id), request, `/v1/checkout/sessions/${id}/line_items`);
    },
  },
  {
    method: "post",
    path: "/checkout/sessions/:id/expire",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({ expand }), parameters);
      const session = findSession(work, id);
      if (session.status !== "open") {
        throw invalidRequest(`Only an open session can be expired; this one is ${session.status}`);
      }
      expireSession(work, session);
      return shown(work, session);
    },
  },
];

/** Finds a session, and closes it first when its time is up. */
export function findSession(work: Work, id: string): Session {
  const session = work.state.sessions[id];
  if (session === undefined) throw noSuchRecord("checkout.session", id, "session");
  if (session.status === "open" && session.expires_at <= work.now) expireSession(work, session);
  return session;
}

/** Closes a session so that it can no longer be paid, and says so. */
export function expireSession(work: Work, session: Session): void {
  session.status = "expired";
  recordEvent(work, "checkout.session.expired", shown(work, session));
}

/** Closes every session whose time is up. */
export function expireDueSessions(work: Work): void {
  const due = Object.values(work.state.sessions).filter(
    (session) => session.status === "open" && session.expires_at <= work.now,
  );
  for (const session of due) expireSession(work, session);
}

/** A session as the API shows it: an open one has the address where it is paid. */
export function shown(work: Work, session: Session): Session & { url: string | null } {
  return { ...session, url: session.status === "open" ? `${work.origin}/pay/${session.id}` : null };
}

export function lineItemsOf(work: Work, sessionId: string): LineItem[] {
  return (work.state.sessionLines[sessionId] ?? []).map((line) => line.item);
}

function create(work: Work, request: z.output<typeof createParameters>): Session {
  const expiresAt = request.expires_at ?? work.now + DAY;
  if (expiresAt < work.now + 30 * MINUTE || expiresAt > work.now + DAY) {
    throw invalidRequest("expires_at must be 30 minutes to 24 hours after the session is made", {
      param: "expires_at",
      beforeWork: true,
    });
  }
  const currency = currencyOf(request.line_items.map((line) => line.price_data.currency.toLowerCase()));
  const lines = request.line_items.map((line) => ({
    item: lineItem(line.price_data.product_data.name, line.price_data.unit_amount, line.quantity, currency),
    details: line.price_data.product_data.description ?? null,
  }));
  const total = lines.reduce((sum, line) => sum + line.item.amount_total, 0);
  refuseTotal(total);
  const session: Session = {
    id: newId("cs_test", 48),
    object: "checkout.session",
    allowed_payment_method_types: request.allowed_payment_method_types ?? null,
    amount_subtotal: total,
    amount_total: total,
    cancel_url: request.cancel_url ?? null,
    client_reference_id: request.client_reference_id ?? null,
    created: work.now,
    currency,
    customer: null,
    customer_details: null,
    customer_email: request.customer_email ?? null,
    expires_at: expiresAt,
    livemode: false,
    metadata: request.metadata ?? {},
    mode: "payment",
    payment_intent: null,
    payment_method_types: ["card"],
    payment_status: "unpaid",
    status: "open",
    success_url: request.success_url,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: "hosted_page",
  };
  work.state.sessions[session.id] = session;
  work.state.sessionLines[session.id] = lines;
  work.state.intentData[session.id] = {
    metadata: request.payment_intent_data?.metadata ?? {},
    description: request.payment_intent_data?.description ?? null,
  };
  return session;
}

function currencyOf(currencies: string[]): string {
  const [currency = "", ...more] = new Set(currencies);
  if (more.length > 0) {
    throw invalidRequest("All lines of a session must have the same currency", {
      param: "line_items",
      beforeWork: true,
    });
  }
  return currency;
}

function refuseTotal(total: number): void {
  if (total >= SMALLEST_TOTAL && total <= LARGEST_TOTAL) return;
  const code = total < SMALLEST_TOTAL ? "amount_too_small" : "amount_too_large";
  throw invalidRequest(`A payment is from ${SMALLEST_TOTAL} to ${LARGEST_TOTAL} cents`, {
    code,
    beforeWork: true,
  });
}

function lineItem(name: string, unitAmount: number, quantity: number, currency: string): LineItem {
  const total = unitAmount * quantity;
  return {
    id: newId("li"),
    object: "item",
    amount_discount: 0,
    amount_subtotal: total,
    amount_tax: 0,
    amount_total: total,
    currency,
    description: name,
    price: {
      id: newId("price"),
      object: "price",
      currency,
      unit_amount: unitAmount,
      product: newId("prod", 14),
      type: "one_time",
    },
    quantity,
  };
}
