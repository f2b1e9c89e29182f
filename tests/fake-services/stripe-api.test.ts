import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import { control, errorOf, line, paidSession, pay, sdk, sessionParameters } from "./stripe-calls.ts";

let fake: FakeStripe;

beforeAll(async () => {
  const folder = await mkdtemp(join(tmpdir(), "payment-state-"));
  atEndOfFile(() => rm(folder, { recursive: true }));
  fake = await startFakeStripe({ stateFile: join(folder, "state.json") });
});

describe("the API's manners", () => {
  it("refuses a wrong key with 401", async () => {
    const error = await errorOf(sdk(fake, "sk_test_wrong").checkout.sessions.list());
    expect(error).toMatchObject({ type: "StripeAuthenticationError", statusCode: 401 });
  });

  it("names an unknown record", async () => {
    const error = await errorOf(sdk(fake).checkout.sessions.retrieve("cs_test_none"));
    expect(error).toMatchObject({ statusCode: 404, code: "resource_missing", param: "session" });
    expect(error.requestId).toMatch(/^req_/);
  });

  it("echoes the version and gives each request an id", async () => {
    const { lastResponse } = await sdk(fake).refunds.list();
    expect(lastResponse.apiVersion).toBe("2026-10-28.endive");
    expect(lastResponse.requestId).toMatch(/^req_/);
  });

  it("answers 404 in its own error shape where there is nothing", async () => {
    const response = await fetch(`${fake.origin}/v1/nothing`);
    expect(response.status).toBe(404);
    expect(await response.json()).toMatchObject({ error: { type: "invalid_request_error" } });
  });

  it.each([
    ["a missing parameter", { success_url: "" }, "parameter_invalid_empty", "success_url"],
    [
      "a broken number",
      { line_items: [line("Block", 10.5)] },
      "parameter_invalid_integer",
      "line_items[0][price_data][unit_amount]",
    ],
    ["an unknown parameter", { locale: "en" as const }, "parameter_unknown", "locale"],
  ])("names %s", async (_what, changes, code, param) => {
    const error = await errorOf(sdk(fake).checkout.sessions.create(sessionParameters(changes)));
    expect(error).toMatchObject({ statusCode: 400, code, param });
  });

  it("names a parameter that was left out", async () => {
    const error = await errorOf(sdk(fake).checkout.sessions.create({ mode: "payment" }));
    expect(error).toMatchObject({ code: "parameter_missing", param: "line_items" });
  });
});

describe("checkout sessions", () => {
  it("adds up more lines than two digits of brackets", async () => {
    const stripe = sdk(fake);
    const lines = Array.from({ length: 30 }, (_, place) => line(`Part ${String(place)}`, 100 + place, 2));
    const session = await stripe.checkout.sessions.create(sessionParameters({ line_items: lines }));
    expect(session).toMatchObject({ amount_total: 6870, status: "open", payment_status: "unpaid" });
    const all = await stripe.checkout.sessions
      .listLineItems(session.id, { limit: 10 })
      .autoPagingToArray({ limit: 100 });
    expect(all.map((item) => item.description)).toEqual(lines.map((_, place) => `Part ${String(place)}`));
  });

  it("lists newest first, page by page, and expands what is asked", async () => {
    const stripe = sdk(fake);
    const first = await stripe.checkout.sessions.create(sessionParameters());
    const second = await stripe.checkout.sessions.create(sessionParameters());
    const page = await stripe.checkout.sessions.list({ limit: 1 });
    expect(page.data.map((one) => one.id)).toEqual([second.id]);
    expect(page.has_more).toBe(true);
    const next = await stripe.checkout.sessions.list({ limit: 1, starting_after: second.id });
    expect(next.data.map((one) => one.id)).toEqual([first.id]);
    await pay(fake, first.id, "4242424242424242");
    const whole = await stripe.checkout.sessions.retrieve(first.id, {
      expand: ["line_items", "payment_intent.latest_charge"],
    });
    expect(whole.line_items?.data).toHaveLength(1);
    expect(whole.payment_intent).toMatchObject({ latest_charge: { object: "charge", paid: true } });
  });

  // 30 minutes to 24 hours: from memory of the service's manual.
  it.each([29 * 60, 24 * 60 * 60 + 60])("refuses to live %i seconds", async (seconds) => {
    const expires_at = Math.floor(Date.now() / 1000) + seconds;
    const error = await errorOf(sdk(fake).checkout.sessions.create(sessionParameters({ expires_at })));
    expect(error).toMatchObject({ statusCode: 400, param: "expires_at" });
  });

  // Smallest and largest payment: references.md, 8.1.
  it.each([
    [49, "amount_too_small"],
    [100_000_000, "parameter_invalid"],
  ])("refuses a payment of %i cents", async (cents, code) => {
    const error = await errorOf(
      sdk(fake).checkout.sessions.create(sessionParameters({ line_items: [line("Block", cents)] })),
    );
    expect(error.code).toBe(code);
  });

  it("can be expired once, and then not be paid", async () => {
    const stripe = sdk(fake);
    const { id } = await stripe.checkout.sessions.create(sessionParameters());
    expect(await stripe.checkout.sessions.expire(id)).toMatchObject({ status: "expired", url: null });
    expect(await errorOf(stripe.checkout.sessions.expire(id))).toMatchObject({ statusCode: 400 });
    expect(await pay(fake, id, "4242424242424242")).toMatchObject({
      status: 410,
      body: { outcome: "closed", status: "expired" },
    });
  });

  it("expires by the clock", async () => {
    const stripe = sdk(fake);
    const { id } = await stripe.checkout.sessions.create(sessionParameters());
    await control(fake, `/clock/expire-session/${id}`, {});
    expect((await stripe.checkout.sessions.retrieve(id)).status).toBe("expired");
    const events = await stripe.events.list({ type: "checkout.session.expired", limit: 1 });
    expect(events.data[0]?.data.object).toMatchObject({ id });
  });

  it("is paid once, whoever tries again", async () => {
    const { id } = await sdk(fake).checkout.sessions.create(sessionParameters());
    const results = await Promise.all([1, 2, 3].map(() => pay(fake, id, "4242424242424242")));
    expect(results.map((result) => result.status).sort()).toEqual([200, 410, 410]);
    const charges = await sdk(fake).charges.list({ limit: 100 });
    const session = await sdk(fake).checkout.sessions.retrieve(id);
    expect(charges.data.filter((charge) => charge.payment_intent === session.payment_intent)).toHaveLength(1);
  });
});

describe("refunds", () => {
  it("returns all when no amount is given, and nothing twice", async () => {
    const stripe = sdk(fake);
    const { paymentIntent } = await paidSession(fake, 10_000);
    const refund = await stripe.refunds.create({ payment_intent: paymentIntent });
    expect(refund).toMatchObject({ amount: 10_000, status: "succeeded", payment_intent: paymentIntent });
    const again = await errorOf(stripe.refunds.create({ payment_intent: paymentIntent }));
    expect(again).toMatchObject({ statusCode: 400, code: "charge_already_refunded" });
  });

  it("returns parts up to what was captured, and no more", async () => {
    const stripe = sdk(fake);
    const { paymentIntent } = await paidSession(fake, 10_000);
    await stripe.refunds.create({ payment_intent: paymentIntent, amount: 6000, reason: "duplicate" });
    const tooMuch = await errorOf(stripe.refunds.create({ payment_intent: paymentIntent, amount: 4001 }));
    expect(tooMuch).toMatchObject({ code: "amount_too_large", param: "amount" });
    const rest = await stripe.refunds.create({ payment_intent: paymentIntent, amount: 4000 });
    const listed = await stripe.refunds.list({ payment_intent: paymentIntent });
    expect(listed.data.map((one) => one.amount)).toEqual([4000, 6000]);
    const whole = await stripe.refunds.retrieve(rest.id, { expand: ["charge"] });
    expect(whole.charge).toMatchObject({ amount_refunded: 10_000, refunded: true });
  });

  it("has nothing to return of a declined payment", async () => {
    const stripe = sdk(fake);
    const { id } = await stripe.checkout.sessions.create(sessionParameters());
    await pay(fake, id, "4000000000000002");
    const [intent] = (await stripe.paymentIntents.list({ limit: 1 })).data;
    const error = await errorOf(stripe.refunds.create({ payment_intent: intent?.id ?? "" }));
    expect(error.code).toBe("payment_intent_unexpected_state");
  });
});

describe("a kill", () => {
  it("loses nothing that was answered", async () => {
    const stripe = sdk(fake);
    const { paymentIntent } = await paidSession(fake, 12_345);
    const refund = await stripe.refunds.create(
      { payment_intent: paymentIntent, amount: 45 },
      { idempotencyKey: "kill" },
    );
    await fake.kill9();
    await fake.restart();
    const after = sdk(fake);
    expect(await after.refunds.retrieve(refund.id)).toEqual(refund);
    const intent = await after.paymentIntents.retrieve(paymentIntent);
    expect(intent).toMatchObject({ status: "succeeded", amount_received: 12_345 });
    const again = await after.refunds.create(
      { payment_intent: paymentIntent, amount: 45 },
      { idempotencyKey: "kill" },
    );
    expect(again.id).toBe(refund.id);
    expect(again.lastResponse.headers["idempotent-replayed"]).toBe("true");
  });
});
