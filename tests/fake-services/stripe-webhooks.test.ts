import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import Stripe from "stripe";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { z } from "zod";
import { signatureHeader } from "#fake-services/stripe/webhooks.ts";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import {
  control,
  eventsOfSuccess,
  paidSession,
  pay,
  sdk,
  sessionParameters,
  startReceiver,
  type WebhookReceiver,
} from "./stripe-calls.ts";

let fake: FakeStripe;
let receiver: WebhookReceiver;

beforeAll(async () => {
  receiver = await startReceiver();
  const folder = await mkdtemp(join(tmpdir(), "payment-state-"));
  atEndOfFile(() => rm(folder, { recursive: true }));
  fake = await startFakeStripe({ webhookUrl: receiver.url, stateFile: join(folder, "state.json") });
});

beforeEach(async () => {
  await control(fake, "/webhooks", { mode: "deliver" });
  receiver.answerWith(200);
  receiver.clear();
});

describe("signatures", () => {
  it("are those of the published scheme", () => {
    // references.md, 8.5: vector checked with SDK 23.1.0.
    const payload = '{"id":"evt_test","object":"event","type":"payment_intent.succeeded"}';
    expect(signatureHeader("whsec_test_secret", 1_700_000_000, payload)).toBe(
      "t=1700000000,v1=f457ee3d89f52f9f02936e1cd1173dd5dfa132cdc78ec55ea964a53098c5a1c0",
    );
  });

  it("are accepted by the SDK as they arrive", async () => {
    await paidSession(fake, 5000);
    await receiver.types(4);
    const stripe = sdk(fake);
    const events = receiver.received.map((one) =>
      stripe.webhooks.constructEvent(one.body, one.signature, fake.webhookSecret),
    );
    expect(events.map((event) => event.type)).toEqual(eventsOfSuccess);
    expect(events[3]?.data.object).toMatchObject({ payment_status: "paid", amount_total: 5000 });
    const [first] = receiver.received;
    expect(() =>
      stripe.webhooks.constructEvent(`${first?.body ?? ""} `, first?.signature ?? "", fake.webhookSecret),
    ).toThrow(Stripe.errors.StripeSignatureVerificationError);
  });
});

describe("what is told", () => {
  it("a declined card", async () => {
    const { id } = await sdk(fake).checkout.sessions.create(sessionParameters());
    await pay(fake, id, "4000000000009995");
    expect(await receiver.types(3)).toEqual([
      "payment_intent.created",
      "charge.failed",
      "payment_intent.payment_failed",
    ]);
  });

  it("an expired session", async () => {
    const { id } = await sdk(fake).checkout.sessions.create(sessionParameters());
    await control(fake, `/clock/expire-session/${id}`, {});
    expect(await receiver.types(1)).toEqual(["checkout.session.expired"]);
  });

  it("a refund", async () => {
    const { paymentIntent } = await paidSession(fake, 5000);
    await receiver.types(4);
    receiver.clear();
    await sdk(fake).refunds.create({ payment_intent: paymentIntent, amount: 1 });
    expect(await receiver.types(3)).toEqual(["refund.created", "charge.refunded", "refund.updated"]);
  });
});

describe("delivery on demand", () => {
  it("tries again after a growing wait until it is taken, with the same event", async () => {
    receiver.answerWith(500);
    const { id } = await sdk(fake).checkout.sessions.create(sessionParameters());
    await control(fake, `/clock/expire-session/${id}`, {});
    await receiver.types(3);
    receiver.answerWith(204);
    await receiver.types(4);
    const times = receiver.received.map((one) => one.at);
    const waits = times.slice(1).map((time, place) => time - (times[place] ?? 0));
    const [first = 0, second = 0, third = 0] = waits;
    expect(second).toBeGreaterThan(first * 1.5);
    expect(third).toBeGreaterThan(second * 1.5);
    expect(new Set(receiver.received.map((one) => one.id)).size).toBe(1);
    const attempts = z.object({
      attempts: z.array(z.object({ eventId: z.string(), status: z.number().nullable() })),
    });
    const noted = attempts.parse((await control(fake, "/webhooks/attempts")).body).attempts;
    const own = noted.filter((attempt) => attempt.eventId === receiver.received[0]?.id);
    expect(own.map((attempt) => attempt.status)).toEqual([500, 500, 500, 204]);
  });

  it("holds until released, in order or reversed", async () => {
    await control(fake, "/webhooks", { mode: "hold" });
    await paidSession(fake, 5000);
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(receiver.received).toEqual([]);
    expect((await control(fake, "/webhooks/release", {})).body).toEqual({ released: 4 });
    expect(await receiver.types(4)).toEqual(eventsOfSuccess);
    receiver.clear();
    await paidSession(fake, 5000);
    await control(fake, "/webhooks/release", { order: "reversed" });
    expect(await receiver.types(4)).toEqual(eventsOfSuccess.toReversed());
  });

  it("reorders: the last comes first", async () => {
    await control(fake, "/webhooks", { mode: "reorder" });
    await paidSession(fake, 5000);
    expect(await receiver.types(4)).toEqual(eventsOfSuccess.toReversed());
  });

  it("repeats each", async () => {
    await control(fake, "/webhooks", { mode: "duplicate" });
    await paidSession(fake, 5000);
    await receiver.types(8);
    const ids = receiver.received.map((one) => one.id);
    expect(new Set(ids).size).toBe(4);
  });

  it("delays", async () => {
    await control(fake, "/webhooks", { mode: "delay", delayMs: 400 });
    const start = Date.now();
    await paidSession(fake, 5000);
    await receiver.types(4);
    expect(Math.min(...receiver.received.map((one) => one.at)) - start).toBeGreaterThanOrEqual(400);
  });

  it("loses, and still knows what happened when asked", async () => {
    await control(fake, "/webhooks", { mode: "lose" });
    const { sessionId } = await paidSession(fake, 5000);
    await control(fake, "/webhooks", { mode: "deliver" });
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(receiver.received).toEqual([]);
    const events = await sdk(fake).events.list({ type: "checkout.session.completed", limit: 1 });
    expect(events.data[0]?.data.object).toMatchObject({ id: sessionId });
    const event = await sdk(fake).events.retrieve(events.data[0]?.id ?? "");
    expect(event.type).toBe("checkout.session.completed");
  });

  it("sends after a kill what it had not sent before", async () => {
    receiver.answerWith(503);
    await paidSession(fake, 5000);
    await receiver.types(1);
    await fake.kill9();
    receiver.clear();
    receiver.answerWith(200);
    await fake.restart();
    expect((await receiver.types(4)).toSorted()).toEqual(eventsOfSuccess.toSorted());
  });
});
