import { beforeAll, describe, expect, it } from "vitest";
import { passesLuhn } from "#fake-services/stripe/luhn.ts";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import { pay, sdk, sessionParameters } from "./stripe-calls.ts";

let fake: FakeStripe;

beforeAll(async () => {
  fake = await startFakeStripe();
});

async function newSession(): Promise<string> {
  return (await sdk(fake).checkout.sessions.create(sessionParameters())).id;
}

// The payment service's published test numbers: references.md, 8.4.
describe("published test cards", () => {
  it.each(["4242424242424242", "5555555555554444", "378282246310005", "6011111111111117"])(
    "%s succeeds",
    async (card) => {
      const id = await newSession();
      expect(await pay(fake, id, card)).toEqual({
        status: 200,
        body: { outcome: "paid", successUrl: `http://127.0.0.1:9/paid?session=${id}` },
      });
      const session = await sdk(fake).checkout.sessions.retrieve(id);
      expect(session).toMatchObject({ status: "complete", payment_status: "paid", url: null });
    },
  );

  it.each([
    ["4000000000000002", "card_declined", "generic_decline"],
    ["4000000000009995", "card_declined", "insufficient_funds"],
    ["4000000000009987", "card_declined", "lost_card"],
    ["4000000000009979", "card_declined", "stolen_card"],
    ["4000000000006975", "card_declined", "card_velocity_exceeded"],
    ["4000000000000069", "expired_card", "expired_card"],
    ["4000000000000127", "incorrect_cvc", "incorrect_cvc"],
    ["4000000000000101", "incorrect_cvc", "incorrect_cvc"],
    ["4000000000000119", "processing_error", "processing_error"],
    ["4000000000000341", "card_declined", "generic_decline"],
    ["4100000000000019", "card_declined", "fraudulent"],
  ])("%s is refused with %s / %s", async (card, code, declineCode) => {
    const id = await newSession();
    expect(await pay(fake, id, card)).toMatchObject({
      status: 402,
      body: { outcome: "declined", code, declineCode },
    });
    const session = await sdk(fake).checkout.sessions.retrieve(id, {
      expand: ["payment_intent.latest_charge"],
    });
    expect(session).toMatchObject({
      status: "open",
      payment_status: "unpaid",
      payment_intent: {
        status: "requires_payment_method",
        last_payment_error: { code, decline_code: declineCode },
        latest_charge: { paid: false, failure_code: code },
      },
    });
  });

  it("refuses a number that fails its check digit without asking the bank", async () => {
    const id = await newSession();
    expect(await pay(fake, id, "4242424242424241")).toMatchObject({
      status: 402,
      body: { outcome: "invalid", problems: { number: { code: "incorrect_number" } } },
    });
    expect((await sdk(fake).checkout.sessions.retrieve(id)).payment_intent).toBeNull();
  });

  it("refuses a number that is no test number", async () => {
    // Passes its check digit, and belongs to nobody's test list.
    expect(await pay(fake, await newSession(), "4000000000000010")).toMatchObject({
      body: { outcome: "declined", declineCode: "test_mode_live_card" },
    });
  });

  it.each(["4000002760003184", "4000002500003155", "4000000000003220"])(
    "%s asks the buyer, then goes through",
    async (card) => {
      const id = await newSession();
      expect(await pay(fake, id, card)).toEqual({ status: 200, body: { outcome: "confirm" } });
      const waiting = await sdk(fake).checkout.sessions.retrieve(id, { expand: ["payment_intent"] });
      expect(waiting).toMatchObject({ status: "open", payment_intent: { status: "requires_action" } });
      expect(await pay(fake, id, card, { confirmation: "fail" })).toMatchObject({
        status: 402,
        body: { code: "payment_intent_authentication_failure" },
      });
      expect(await pay(fake, id, card, { confirmation: "complete" })).toMatchObject({
        body: { outcome: "paid" },
      });
    },
  );

  it("4000008260003178 asks the buyer and has too little money all the same", async () => {
    const result = await pay(fake, await newSession(), "4000008260003178", { confirmation: "complete" });
    expect(result).toMatchObject({ status: 402, body: { declineCode: "insufficient_funds" } });
  });

  it("a declined card leaves the session open for another, on the same payment", async () => {
    const id = await newSession();
    await pay(fake, id, "4000000000000002");
    const before = await sdk(fake).checkout.sessions.retrieve(id);
    expect(await pay(fake, id, "4242424242424242")).toMatchObject({ body: { outcome: "paid" } });
    const after = await sdk(fake).checkout.sessions.retrieve(id);
    expect(after.payment_intent).toBe(before.payment_intent);
  });
});

describe("what is typed", () => {
  it.each([
    ["an expiry in the past", { expiry: "01 / 20" }, "expiry", "invalid_expiry_year"],
    ["a month of 13", { expiry: "13 / 40" }, "expiry", "invalid_expiry_month"],
    ["a CVC too short", { cvc: "12" }, "cvc", "invalid_cvc"],
    ["no name", { name: " " }, "name", "incomplete_name"],
  ])("refuses %s", async (_what, typed, field, code) => {
    expect(await pay(fake, await newSession(), "4242424242424242", typed)).toMatchObject({
      status: 402,
      body: { outcome: "invalid", problems: { [field]: { code } } },
    });
  });

  it("takes spaces in the number and the expiry in several forms", async () => {
    for (const expiry of ["12/40", "12 / 2040", "1240"]) {
      const result = await pay(fake, await newSession(), "4242 4242 4242 4242", { expiry });
      expect(result).toMatchObject({ body: { outcome: "paid" } });
    }
  });
});

describe("check digits", () => {
  // ISO/IEC 7812-1 Annex B examples: references.md, 8.7.
  it.each(["79927398713", "49927398716", "1234567812345670"])("%s is sound", (number) => {
    expect(passesLuhn(number)).toBe(true);
  });

  it("only 3 completes 7992739871", () => {
    const sound = [..."0123456789"].filter((digit) => passesLuhn(`7992739871${digit}`));
    expect(sound).toEqual(["3"]);
  });
});
