import { createHmac } from "node:crypto";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import {
  type CheckoutRequest,
  createStripeGateway,
  GatewayRefused,
  GatewayUnavailable,
  type StripeGateway,
  WebhookSignatureError,
} from "#server/gateways/stripe.ts";
import {
  control,
  pay,
  type ReceivedWebhook,
  sdk,
  startReceiver,
  type WebhookReceiver,
} from "#tests/fake-services/stripe-calls.ts";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import { freePort } from "#tests/support/free-port.ts";

let fake: FakeStripe;
let receiver: WebhookReceiver;
let gateway: StripeGateway;
let number = 0;

beforeAll(async () => {
  receiver = await startReceiver();
  fake = await startFakeStripe({ webhookUrl: receiver.url });
  gateway = createStripeGateway({
    secretKey: fake.secretKey,
    webhookSecret: fake.webhookSecret,
    apiOrigin: fake.origin,
  });
});

beforeEach(async () => {
  await control(fake, "/faults", { mode: "none" });
  receiver.clear();
});

function checkoutRequest(changes: Partial<CheckoutRequest> = {}): CheckoutRequest {
  number += 1;
  return {
    orderNumber: `OC-${String(number)}`,
    orderId: `order-${String(number)}`,
    paymentId: `payment-${String(number)}`,
    email: "buyer@example.com",
    lines: [
      { name: "Marl block", description: "4.1250 in bore", amountCents: 248_100, quantity: 1 },
      { name: "Main stud kit", amountCents: 18_500, quantity: 2 },
    ],
    currency: "usd",
    successUrl: "http://127.0.0.1:9/paid/{CHECKOUT_SESSION_ID}",
    cancelUrl: "http://127.0.0.1:9/cart",
    expiresAt: new Date(Date.now() + 60 * 60 * 1000),
    idempotencyKey: `open-${String(number)}`,
    ...changes,
  };
}

async function refusal(call: Promise<unknown>): Promise<GatewayRefused> {
  const error = await call.then(
    () => undefined,
    (reason: unknown) => reason,
  );
  if (error instanceof GatewayRefused) return error;
  throw new Error(`expected a refusal, got ${String(error)}`);
}

describe("tax", () => {
  const address = { line1: "1 Mill Road", city: "Osier", postalCode: "37000", country: "US" as const };

  it("is asked with goods and freight and comes with words for its rate", async () => {
    const lines = [
      { reference: "block", amountCents: 248_150 },
      { reference: "kit", amountCents: 150 },
    ];
    const answer = await gateway.askTax({
      currency: "usd",
      lines,
      freightCents: 18_500,
      address: { ...address, state: "TN" },
      idempotencyKey: "tax-1",
    });
    // 17370.5, 10.5 and 1295 at the demo rate of 7 %: each rounded, a half up.
    expect(answer).toMatchObject({ taxCents: 17_371 + 11 + 1295, rateLabel: "TN sales tax 7 %" });
    expect(answer.calculationId).toMatch(/^taxcalc_/);
    expect(answer.expiresAt?.getTime()).toBeGreaterThan(Date.now());
  });

  it("keeps the digits of a broken rate, and says where there is none", async () => {
    const ask = (state: string): Promise<{ taxCents: number; rateLabel: string }> =>
      gateway.askTax({
        currency: "usd",
        lines: [{ reference: "block", amountCents: 1000 }],
        freightCents: 0,
        address: { ...address, line2: "Yard 3", state },
      });
    expect(await ask("MN")).toMatchObject({ taxCents: 69, rateLabel: "MN sales tax 6.875 %" });
    expect(await ask("OR")).toMatchObject({ taxCents: 0, rateLabel: "OR: no sales tax" });
  });
});

describe("checkout sessions", () => {
  it("open with our ids, and read back as ours", async () => {
    const request = checkoutRequest();
    const opened = await gateway.openCheckoutSession(request);
    expect(opened.url).toContain(fake.origin);
    expect(Math.abs(opened.expiresAt.getTime() - request.expiresAt.getTime())).toBeLessThan(1000);
    expect(await gateway.readCheckoutSession(opened.sessionId)).toEqual({
      id: opened.sessionId,
      status: "open",
      paymentStatus: "unpaid",
      amountCents: 285_100,
      currency: "usd",
      orderId: request.orderId,
      paymentId: request.paymentId,
      paymentIntentId: null,
      url: opened.url,
    });
    await pay(fake, opened.sessionId, "4242424242424242");
    const paid = await gateway.readCheckoutSession(opened.sessionId);
    expect(paid).toMatchObject({ status: "complete", paymentStatus: "paid", url: null });
    const intent = await sdk(fake).paymentIntents.retrieve(paid.paymentIntentId ?? "");
    expect(intent.metadata).toEqual({
      order_id: request.orderId,
      order_number: request.orderNumber,
      payment_id: request.paymentId,
    });
  });

  it("are the same for the same key", async () => {
    const request = checkoutRequest();
    const first = await gateway.openCheckoutSession(request);
    const second = await gateway.openCheckoutSession(request);
    expect(second).toEqual(first);
  });

  it("refuse one key for two carts", async () => {
    const request = checkoutRequest();
    await gateway.openCheckoutSession(request);
    const error = await refusal(gateway.openCheckoutSession({ ...request, email: "other@example.com" }));
    expect(error).toMatchObject({ code: "idempotency_error", status: 400 });
  });

  it("expire once; what was paid or expired before says so", async () => {
    const open = await gateway.openCheckoutSession(checkoutRequest());
    expect(await gateway.expireCheckoutSession(open.sessionId)).toBe("expired");
    expect(await gateway.expireCheckoutSession(open.sessionId)).toBe("already-expired");
    const paid = await gateway.openCheckoutSession(checkoutRequest());
    await pay(fake, paid.sessionId, "4242424242424242");
    expect(await gateway.expireCheckoutSession(paid.sessionId)).toBe("already-complete");
  });

  it("that do not exist are refused by name", async () => {
    expect(await refusal(gateway.readCheckoutSession("cs_test_none"))).toMatchObject({
      code: "resource_missing",
      status: 404,
    });
    expect(await refusal(gateway.expireCheckoutSession("cs_test_none"))).toMatchObject({ status: 404 });
  });
});

describe("refunds", () => {
  it("return part, then the rest, then nothing", async () => {
    const { sessionId } = await gateway.openCheckoutSession(checkoutRequest());
    await pay(fake, sessionId, "4242424242424242");
    const { paymentIntentId } = await gateway.readCheckoutSession(sessionId);
    const give = (
      amountCents: number,
      idempotencyKey: string,
    ): Promise<{ refundId: string; status: string }> =>
      gateway.refund({
        paymentIntentId: paymentIntentId ?? "",
        amountCents,
        reason: "requested_by_customer",
        idempotencyKey: `${sessionId}-${idempotencyKey}`,
        metadata: { refund_id: idempotencyKey },
      });
    const part = await give(100_000, "part");
    expect(part.status).toBe("succeeded");
    expect(await give(100_000, "part")).toEqual(part);
    expect(await refusal(give(185_101, "too much"))).toMatchObject({ code: "amount_too_large" });
    await give(185_100, "rest");
    expect(await refusal(give(1, "more"))).toMatchObject({ code: "charge_already_refunded" });
  });
});

describe("a service in trouble", () => {
  it("is asked again after a 500, with the same key", async () => {
    await control(fake, "/faults", { mode: "500", count: 2 });
    const opened = await gateway.openCheckoutSession(checkoutRequest());
    expect((await gateway.readCheckoutSession(opened.sessionId)).status).toBe("open");
  });

  it("does the work once when its answer was lost", async () => {
    await control(fake, "/faults", { mode: "lose-answer", count: 1 });
    const request = checkoutRequest();
    const opened = await gateway.openCheckoutSession(request);
    const made = (await sdk(fake).checkout.sessions.list({ limit: 100 })).data.filter(
      (session) => session.client_reference_id === request.orderId,
    );
    expect(made.map((session) => session.id)).toEqual([opened.sessionId]);
  });

  it.each(["500", "429"] as const)("is unavailable when it keeps answering %s", async (mode) => {
    await control(fake, "/faults", { mode });
    await expect(gateway.openCheckoutSession(checkoutRequest())).rejects.toBeInstanceOf(GatewayUnavailable);
  });

  it("is unavailable when it hangs", async () => {
    await control(fake, "/faults", { mode: "hang" });
    const impatient = createStripeGateway({
      secretKey: fake.secretKey,
      webhookSecret: fake.webhookSecret,
      apiOrigin: fake.origin,
      timeoutMilliseconds: 200,
    });
    const request = checkoutRequest();
    await expect(impatient.openCheckoutSession(request)).rejects.toBeInstanceOf(GatewayUnavailable);
    await control(fake, "/faults", { mode: "none" });
    expect((await gateway.openCheckoutSession(request)).url).toContain(fake.origin);
  });

  it("is unavailable when nobody listens", async () => {
    const nowhere = createStripeGateway({
      secretKey: fake.secretKey,
      webhookSecret: fake.webhookSecret,
      apiOrigin: `http://127.0.0.1:${String(await freePort())}`,
    });
    await expect(nowhere.readCheckoutSession("cs_test_any")).rejects.toBeInstanceOf(GatewayUnavailable);
  });

  it("refuses a wrong key", async () => {
    const stranger = createStripeGateway({
      secretKey: "sk_test_wrong",
      webhookSecret: "whsec_any",
      apiOrigin: fake.origin,
    });
    expect(await refusal(stranger.readCheckoutSession("cs_test_any"))).toMatchObject({ status: 401 });
  });
});

describe("webhooks", () => {
  // references.md, 8.5: vector and behaviour checked with SDK 23.1.0.
  const payload = Buffer.from('{"id":"evt_test","object":"event","type":"payment_intent.succeeded"}');
  const published = "f457ee3d89f52f9f02936e1cd1173dd5dfa132cdc78ec55ea964a53098c5a1c0";
  const signed = (age: number): Date => new Date((1_700_000_000 + age) * 1000);

  function vectorGateway(): StripeGateway {
    return createStripeGateway({ secretKey: "sk_test_any", webhookSecret: "whsec_test_secret" });
  }

  it("with the published signature are accepted up to 300 seconds old", () => {
    const header = `t=1700000000,v1=${published}`;
    const read = (age: number): unknown => vectorGateway().readWebhook(payload, header, signed(age));
    expect(read(0)).toMatchObject({ id: "evt_test", kind: "other", type: "payment_intent.succeeded" });
    expect(read(300)).toMatchObject({ id: "evt_test" });
    expect(() => read(301)).toThrow(WebhookSignatureError);
  });

  it.each([
    ["another secret's signature", `t=1700000000,v1=${"0".repeat(64)}`],
    ["the old scheme alone", `t=1700000000,v0=${published}`],
    ["no time", `v1=${published}`],
    ["nothing at all", ""],
  ])("with %s are refused", (_what, header) => {
    expect(() => vectorGateway().readWebhook(payload, header, signed(0))).toThrow(WebhookSignatureError);
  });

  it("are taken when one of several signatures fits, and refused when a byte changed", () => {
    const header = `t=1700000000,v1=${"0".repeat(64)},v1=${published}`;
    expect(vectorGateway().readWebhook(payload, header, signed(0)).id).toBe("evt_test");
    const changed = Buffer.from(payload.toString().replace("succeeded", "Succeeded"));
    expect(() => vectorGateway().readWebhook(changed, header, signed(0))).toThrow(WebhookSignatureError);
  });

  function arrived(type: string): ReceivedWebhook {
    const webhook = receiver.received.find((one) => one.type === type);
    if (webhook === undefined) throw new Error(`${type} did not come`);
    return webhook;
  }

  function read(type: string): ReturnType<StripeGateway["readWebhook"]> {
    const { body, signature } = arrived(type);
    return gateway.readWebhook(Buffer.from(body), signature);
  }

  it("tell of a paid session in the shape in which it is read", async () => {
    const { sessionId } = await gateway.openCheckoutSession(checkoutRequest());
    await pay(fake, sessionId, "4242424242424242");
    await receiver.types(4);
    expect(read("checkout.session.completed")).toMatchObject({
      kind: "checkout-completed",
      session: await gateway.readCheckoutSession(sessionId),
    });
    expect(read("charge.succeeded")).toMatchObject({ kind: "other", type: "charge.succeeded" });
  });

  it("tell of a refused card, an expired session and a refund", async () => {
    const request = checkoutRequest();
    const { sessionId } = await gateway.openCheckoutSession(request);
    await pay(fake, sessionId, "4000000000009995");
    await receiver.types(3);
    expect(read("payment_intent.payment_failed")).toMatchObject({
      kind: "payment-failed",
      payment: {
        orderId: request.orderId,
        paymentId: request.paymentId,
        amountCents: 285_100,
        code: "card_declined",
        declineCode: "insufficient_funds",
      },
    });
    await gateway.expireCheckoutSession(sessionId);
    await receiver.types(4);
    expect(read("checkout.session.expired")).toMatchObject({
      kind: "checkout-expired",
      session: { id: sessionId, status: "expired", orderId: request.orderId },
    });
    receiver.clear();
    const paid = await gateway.openCheckoutSession(checkoutRequest());
    await pay(fake, paid.sessionId, "4242424242424242");
    const { paymentIntentId } = await gateway.readCheckoutSession(paid.sessionId);
    const made = await gateway.refund({
      paymentIntentId: paymentIntentId ?? "",
      amountCents: 500,
      reason: "duplicate",
      idempotencyKey: `${paid.sessionId}-refund`,
      metadata: { refund_id: "ours" },
    });
    await receiver.types(7);
    expect(read("refund.created")).toMatchObject({
      kind: "refund-changed",
      refund: {
        ...made,
        amountCents: 500,
        paymentIntentId,
        metadata: { refund_id: "ours" },
        failureReason: null,
      },
    });
  });

  it.each([
    ["checkout.session.async_payment_succeeded", { payment_status: "paid" }, "checkout-completed"],
    ["checkout.session.async_payment_failed", { payment_status: "unpaid" }, "payment-failed"],
  ])("%s is understood", (type, changes, kind) => {
    const session = {
      id: "cs_test_late",
      object: "checkout.session",
      amount_total: 5000,
      currency: "usd",
      client_reference_id: "order-late",
      metadata: { order_id: "order-late", payment_id: "payment-late" },
      payment_intent: "pi_late",
      status: "complete",
      url: null,
      ...changes,
    };
    const body = JSON.stringify({
      id: "evt_late",
      object: "event",
      created: 1_700_000_000,
      type,
      data: { object: session },
    });
    const signature = createHmac("sha256", fake.webhookSecret).update(`1700000000.${body}`).digest("hex");
    const event = gateway.readWebhook(Buffer.from(body), `t=1700000000,v1=${signature}`, signed(1));
    expect(event.kind).toBe(kind);
  });
});
