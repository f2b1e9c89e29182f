import { createServer } from "node:http";
import Stripe from "stripe";
import { z } from "zod";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import type { FakeStripe } from "#tests/support/fake-stripe.ts";

type SessionParameters = Stripe.Checkout.SessionCreateParams;

/** The real SDK, pointed at the stand-in; without retries, so that one call is one request. */
export function sdk(fake: FakeStripe, key = fake.secretKey): Stripe {
  const { hostname, port } = new URL(fake.origin);
  return new Stripe(key, { host: hostname, port, protocol: "http", maxNetworkRetries: 0, telemetry: false });
}

export function line(
  name: string,
  cents: number,
  quantity = 1,
): Stripe.Checkout.SessionCreateParams.LineItem {
  return { quantity, price_data: { currency: "usd", unit_amount: cents, product_data: { name } } };
}

export function sessionParameters(changes: SessionParameters = {}): SessionParameters {
  return {
    mode: "payment",
    line_items: [line("Marl block", 248_100)],
    customer_email: "buyer@example.com",
    success_url: "http://127.0.0.1:9/paid?session={CHECKOUT_SESSION_ID}",
    cancel_url: "http://127.0.0.1:9/cart",
    ...changes,
  };
}

/** Calls one of the stand-in's controls. */
export async function control(
  fake: FakeStripe,
  path: string,
  body?: object,
): Promise<{ status: number; body: unknown }> {
  const response = await fetch(`${fake.origin}/fake${path}`, {
    ...(body === undefined
      ? {}
      : { method: "POST", headers: { "content-type": "application/json" }, body: JSON.stringify(body) }),
  });
  return { status: response.status, body: await response.json() };
}

export function pay(
  fake: FakeStripe,
  sessionId: string,
  card: string,
  more: object = {},
): Promise<{ status: number; body: unknown }> {
  return control(fake, `/checkout/${sessionId}/pay`, { card, ...more });
}

/** A session that is paid, and the payment behind it. */
export async function paidSession(
  fake: FakeStripe,
  cents: number,
): Promise<{ sessionId: string; paymentIntent: string }> {
  const stripe = sdk(fake);
  const { id } = await stripe.checkout.sessions.create(
    sessionParameters({ line_items: [line("Block", cents)] }),
  );
  await pay(fake, id, "4242424242424242");
  const session = await stripe.checkout.sessions.retrieve(id);
  if (typeof session.payment_intent !== "string") throw new Error("the session was not paid");
  return { sessionId: id, paymentIntent: session.payment_intent };
}

/** Runs a call that must fail and answers its error. */
export async function errorOf(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  try {
    await call;
  } catch (error) {
    if (error instanceof Stripe.errors.StripeError) return error;
    throw error;
  }
  throw new Error("the call was expected to fail");
}

export interface ReceivedWebhook {
  id: string;
  type: string;
  body: string;
  signature: string;
  at: number;
}

export interface WebhookReceiver {
  url: string;
  received: ReceivedWebhook[];
  /** What it answers from now on. */
  answerWith: (status: number) => void;
  /** Waits until so many have come, and answers their types in the order in which they came. */
  types: (count: number) => Promise<string[]>;
  clear: () => void;
}

const eventHead = z.object({ id: z.string(), type: z.string() });

/** A server that takes webhooks and writes them down. */
export async function startReceiver(): Promise<WebhookReceiver> {
  const received: ReceivedWebhook[] = [];
  let status = 200;
  const server = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on("data", (chunk: Buffer) => chunks.push(chunk));
    request.on("end", () => {
      const body = Buffer.concat(chunks).toString("utf8");
      const signature = String(request.headers["stripe-signature"]);
      received.push({ ...eventHead.parse(JSON.parse(body)), body, signature, at: Date.now() });
      response.writeHead(status).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  atEndOfFile(async () => {
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
  });
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("the receiver has no port");
  return {
    url: `http://127.0.0.1:${String(address.port)}/webhooks`,
    received,
    answerWith: (next) => {
      status = next;
    },
    types: async (count) => {
      const end = Date.now() + 10_000;
      while (received.length < count && Date.now() < end) await new Promise((done) => setTimeout(done, 10));
      if (received.length < count) {
        throw new Error(`${String(received.length)} of ${String(count)} webhooks came`);
      }
      return received.map((one) => one.type);
    },
    clear: () => {
      received.length = 0;
    },
  };
}

/** The event types of one success, in the order in which they are sent. */
export const eventsOfSuccess = [
  "payment_intent.created",
  "charge.succeeded",
  "payment_intent.succeeded",
  "checkout.session.completed",
];
