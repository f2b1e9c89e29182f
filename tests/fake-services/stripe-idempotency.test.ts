import { beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import { control, errorOf, paidSession, sdk, sessionParameters } from "./stripe-calls.ts";

let fake: FakeStripe;

beforeAll(async () => {
  fake = await startFakeStripe();
});

async function untilHanging(): Promise<void> {
  const summary = z.object({ hangingRequests: z.number() });
  for (let tries = 0; tries < 200; tries += 1) {
    if (summary.parse((await control(fake, "/state")).body).hangingRequests > 0) return;
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
  throw new Error("no request hangs");
}

// How keys behave: references.md, 8.6.
describe("idempotency keys", () => {
  it("give the first result again", async () => {
    const stripe = sdk(fake);
    const first = await stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "twice" });
    const second = await stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "twice" });
    expect(second).toEqual(first);
    expect(first.lastResponse.headers["idempotent-replayed"]).toBeUndefined();
    expect(second.lastResponse.headers["idempotent-replayed"]).toBe("true");
  });

  it("belong to one set of parameters", async () => {
    const stripe = sdk(fake);
    await stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "other" });
    const error = await errorOf(
      stripe.checkout.sessions.create(sessionParameters({ customer_email: "x@example.com" }), {
        idempotencyKey: "other",
      }),
    );
    expect(error).toMatchObject({ statusCode: 400, type: "StripeIdempotencyError" });
  });

  it("keep an error that came out of the work", async () => {
    const stripe = sdk(fake);
    const { paymentIntent } = await paidSession(fake, 1000);
    const refundTooMuch = (): Promise<unknown> =>
      stripe.refunds.create({ payment_intent: paymentIntent, amount: 1001 }, { idempotencyKey: "too much" });
    const first = await errorOf(refundTooMuch());
    const second = await errorOf(refundTooMuch());
    expect(second).toMatchObject({ code: first.code, statusCode: 400 });
    expect(second.headers?.["idempotent-replayed"]).toBe("true");
  });

  it("keep nothing of a request that was refused before any work", async () => {
    const stripe = sdk(fake);
    await errorOf(stripe.checkout.sessions.create({ mode: "payment" }, { idempotencyKey: "mended" }));
    const mended = await stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "mended" });
    expect(mended.status).toBe("open");
  });

  it("are held while the first request runs", async () => {
    const stripe = sdk(fake);
    await control(fake, "/faults", { mode: "hang", count: 1 });
    const first = stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "at once" });
    await untilHanging();
    const second = await errorOf(
      stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "at once" }),
    );
    expect(second).toMatchObject({ statusCode: 409, code: "idempotency_key_in_use" });
    await control(fake, "/faults", { mode: "none" });
    const done = await first;
    const third = await stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "at once" });
    expect(third.id).toBe(done.id);
  });

  it("make work whose answer was lost happen once", async () => {
    const stripe = sdk(fake);
    const { paymentIntent } = await paidSession(fake, 5000);
    await control(fake, "/faults", { mode: "lose-answer", paths: ["/v1/refunds"], count: 1 });
    // The SDK itself tries a broken connection once more, with the same key.
    const refund = await stripe.refunds.create(
      { payment_intent: paymentIntent, amount: 1000 },
      { idempotencyKey: "lost" },
    );
    expect(refund.lastResponse.headers["idempotent-replayed"]).toBe("true");
    const refunds = await stripe.refunds.list({ payment_intent: paymentIntent });
    expect(refunds.data.map((one) => one.amount)).toEqual([1000]);
  });

  it("have at most 255 characters", async () => {
    const stripe = sdk(fake);
    await stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "k".repeat(255) });
    const error = await errorOf(
      stripe.checkout.sessions.create(sessionParameters(), { idempotencyKey: "k".repeat(256) }),
    );
    expect(error.statusCode).toBe(400);
  });
});
