import { beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import {
  orderListSchema,
  orderReviewSchema,
  type OrderReview,
  orderSchema,
} from "#shared/contracts/orders.ts";
import { startShop, type TestShop } from "../support/test-server.ts";
import {
  fillCart,
  freightToTennessee,
  marlSpecCode,
  placeOrder,
  signedIn,
  tryToPlaceOrder,
  Visitor,
} from "../support/visitor.ts";

let shop: TestShop;
let planner: Visitor;
let floor: Visitor;

beforeAll(async () => {
  shop = await startShop();
  planner = await signedIn(shop.origin, "planner");
  floor = await signedIn(shop.origin, "floor");
});

const problem = z.looseObject({
  type: z.string(),
  detail: z.string(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});

async function paidOrder(
  options: { specialRequest?: string; quantity?: number } = {},
): Promise<{ visitor: Visitor; number: string; paymentIntents: () => Promise<string> }> {
  const visitor = new Visitor(shop.origin);
  await fillCart(visitor, options);
  const { orderNumber, session } = await placeOrder(visitor, freightToTennessee);
  const paid = await fetch(`${shop.stripe.origin}/fake/checkout/${session}/pay`, {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify({ card: "4242424242424242" }),
  });
  expect(paid.status).toBe(200);
  await expect
    .poll(async () => orderSchema.parse((await visitor.get(`/api/orders/${orderNumber}`)).body).state)
    .toBe("placed");
  const paymentIntents = async () => (await fetch(`${shop.stripe.origin}/fake/state`)).text();
  return { visitor, number: orderNumber, paymentIntents };
}

async function review(number: string): Promise<OrderReview> {
  return orderReviewSchema.parse((await planner.get(`/api/orders/${number}/review`)).body);
}

describe("the server's own word on builds and prices", () => {
  it("refuses a price that the browser made up, and says its own", async () => {
    const visitor = new Visitor(shop.origin);
    const reply = await visitor.post("/api/cart/lines", { specCode: marlSpecCode, expectedPriceCents: 100 });
    expect(reply.status).toBe(409);
    const refusal = problem.extend({ priceCents: z.int() }).parse(reply.body);
    expect(refusal.type).toMatch(/price-changed$/);
    expect(refusal.priceCents).toBeGreaterThan(100);
    expect((await visitor.get("/api/cart")).body).toMatchObject({ blocks: 0 });
  });

  it("refuses a total that the browser made up", async () => {
    const visitor = new Visitor(shop.origin);
    await fillCart(visitor);
    const reply = await visitor.post("/api/orders", {
      contact: { name: "Ada", email: "ada@example.com", phone: "6155550134" },
      delivery: { method: "pick-up" },
      expectedTotalCents: 1,
    });
    expect(reply.status).toBe(409);
    expect(problem.parse(reply.body).type).toMatch(/price-changed$/);
  });

  it("refuses a spec code with a slip, naming where", async () => {
    const slip = marlSpecCode.slice(0, -1) + (marlSpecCode.endsWith("0") ? "1" : "0");
    const reply = await new Visitor(shop.origin).post("/api/cart/lines", {
      specCode: slip,
      expectedPriceCents: 0,
    });
    expect(reply.status).toBe(422);
    expect(problem.parse(reply.body).errors?.[0]?.path).toBe("specCode");
  });

  it("answers 404 for somebody else's order and for one that is not there", async () => {
    const { number } = await paidOrder();
    expect((await new Visitor(shop.origin).get(`/api/orders/${number}`)).status).toBe(404);
    expect((await new Visitor(shop.origin).get("/api/orders/K7Q4-M2XD")).status).toBeGreaterThanOrEqual(404);
    expect((await (await signedIn(shop.origin, "customer")).get(`/api/orders/${number}`)).status).toBe(404);
  });

  it("refuses what is no order at all, with a path for each field", async () => {
    const visitor = new Visitor(shop.origin);
    await fillCart(visitor);
    const reply = await visitor.post("/api/orders", {
      contact: { name: "", email: "nobody", phone: "12" },
      delivery: { method: "freight", address: { line1: "", city: "", state: "XX", postalCode: "1" } },
      expectedTotalCents: 1,
    });
    expect(reply.status).toBe(422);
    expect(problem.parse(reply.body).errors?.map((error) => error.path)).toEqual(
      expect.arrayContaining([
        "contact.name",
        "contact.email",
        "contact.phone",
        "delivery.address.postalCode",
      ]),
    );
  });
});

describe("the payment service's door", () => {
  const event = JSON.stringify({
    id: "evt_made_up",
    object: "event",
    type: "checkout.session.completed",
    data: {},
  });
  const knock = (signature: string | null) =>
    fetch(`${shop.origin}/api/stripe-webhook`, {
      method: "POST",
      headers: {
        "Content-Type": "application/json",
        ...(signature === null ? {} : { "Stripe-Signature": signature }),
      },
      body: event,
    });

  it.each([
    ["no signature", null],
    ["a made-up one", `t=${Math.floor(Date.now() / 1000)},v1=${"0".repeat(64)}`],
    ["nonsense", "hello"],
  ])("refuses %s", async (_what, signature) => {
    const reply = await knock(signature);
    expect(reply.status).toBe(400);
    expect(reply.headers.get("content-type")).toContain("application/problem+json");
  });

  it("does not open for a browser's session instead of a signature", async () => {
    const visitor = new Visitor(shop.origin);
    expect((await visitor.post("/api/stripe-webhook", JSON.parse(event))).status).toBe(400);
  });
});

describe("the shop's queue", () => {
  it("shows paid orders only, oldest first, and finds them", async () => {
    const waiting = new Visitor(shop.origin);
    await fillCart(waiting);
    const unpaid = await placeOrder(waiting);
    const first = await paidOrder();
    const second = await paidOrder({ quantity: 2, specialRequest: "Please leave the pump pad rough." });
    const list = orderListSchema.parse((await floor.get("/api/orders?state=placed")).body);
    const numbers = list.orders.map((order) => order.number);
    expect(numbers).not.toContain(unpaid.orderNumber);
    expect(numbers.indexOf(first.number)).toBeLessThan(numbers.indexOf(second.number));
    const found = orderListSchema.parse(
      (await floor.get(`/api/orders?search=${second.number.toLowerCase()}`)).body,
    );
    expect(found.orders).toHaveLength(1);
    expect(found.orders[0]).toMatchObject({ blocks: 2, hasSpecialRequest: true, contactName: "Ada Farrow" });
    expect((await floor.get("/api/orders?search=100%25")).body).toMatchObject({ total: 0 });
  });

  it("says who has an order open until that person puts it down", async () => {
    const { number } = await paidOrder();
    await planner.post(`/api/orders/${number}/open`);
    const seen = orderReviewSchema.parse((await floor.post(`/api/orders/${number}/open`)).body);
    expect(seen.openedBy).toMatchObject({ me: false });
    expect((await review(number)).openedBy).toMatchObject({ me: true });
    await planner.post(`/api/orders/${number}/close`);
    expect((await review(number)).openedBy).toBeNull();
  });
});

describe("accepting", () => {
  it("promises the date, tells the customer once, and cannot be done twice", async () => {
    const { number, visitor } = await paidOrder();
    const { proposedShipOn } = await review(number);
    const both = await Promise.all([
      planner.post(`/api/orders/${number}/accept`, { promisedShipOn: proposedShipOn }),
      planner.post(`/api/orders/${number}/accept`, { promisedShipOn: proposedShipOn }),
    ]);
    expect(both.map((reply) => reply.status).sort()).toEqual([200, 409]);
    const order = orderSchema.parse((await visitor.get(`/api/orders/${number}`)).body);
    expect(order).toMatchObject({ state: "accepted", promisedShipOn: proposedShipOn });
    const message = await shop.mail.waitForMessage("ada@example.com", new RegExp(`${number}: accepted`));
    expect(message.text).toContain("Promised ship date");
  });

  it("asks for an answer to a special request and for the reason of another date", async () => {
    const { number } = await paidOrder({ specialRequest: "Can it ship with the lifter bores at 0.8425?" });
    const before = await review(number);
    const line = before.lines[0]?.id ?? "";
    const early = await planner.post(`/api/orders/${number}/accept`, { promisedShipOn: "2020-01-01" });
    expect(problem.parse(early.body).errors?.map((error) => error.path)).toEqual([
      `answers.${line}`,
      "promisedShipOn",
    ]);
    const other = await planner.post(`/api/orders/${number}/accept`, {
      promisedShipOn: "2030-05-06",
      answers: { [line]: "No, 0.8420 it is." },
    });
    expect(problem.parse(other.body).errors?.map((error) => error.path)).toEqual(["dateReason"]);
    const accepted = await planner.post(`/api/orders/${number}/accept`, {
      promisedShipOn: "2030-05-06",
      dateReason: "Customer asked for spring.",
      answers: { [line]: "No, 0.8420 it is." },
    });
    expect(accepted.status).toBe(200);
    const after = await review(number);
    expect(after.lines[0]?.specialRequestAnswer).toBe("No, 0.8420 it is.");
    expect(after.history.at(-1)?.text).toContain("Customer asked for spring.");
    const message = await shop.mail.waitForMessage("ada@example.com", new RegExp(`${number}: accepted`));
    expect(message.text).toContain("No, 0.8420 it is.");
  });

  it("moves the estimate of the next order: its minutes count as load", async () => {
    const big = await paidOrder({ quantity: 20 });
    const small = await paidOrder();
    const before = (await review(small.number)).proposedShipOn;
    const { proposedShipOn } = await review(big.number);
    await planner.post(`/api/orders/${big.number}/accept`, { promisedShipOn: proposedShipOn });
    expect((await review(small.number)).proposedShipOn > before).toBe(true);
  });

  it("is not for the floor", async () => {
    const { number } = await paidOrder();
    const reply = await floor.post(`/api/orders/${number}/accept`, { promisedShipOn: "2030-05-06" });
    expect(reply.status).toBe(403);
    expect((await review(number)).state).toBe("placed");
  });
});

describe("declining", () => {
  it("sends the whole payment back by itself, once, and tells why", async () => {
    const { number, visitor } = await paidOrder();
    const reason = "We have no casting of this family before June.";
    const both = await Promise.all([
      planner.post(`/api/orders/${number}/decline`, { reason }),
      planner.post(`/api/orders/${number}/decline`, { reason }),
    ]);
    expect(both.map((reply) => reply.status).sort()).toEqual([200, 409]);
    await expect
      .poll(async () => orderSchema.parse((await visitor.get(`/api/orders/${number}`)).body), {
        timeout: 20_000,
      })
      .toMatchObject({ state: "declined", declineReason: reason });
    await expect
      .poll(
        async () => {
          const order = orderSchema.parse((await visitor.get(`/api/orders/${number}`)).body);
          return order.paidCents - order.returnedCents;
        },
        { timeout: 20_000 },
      )
      .toBe(0);
    const message = await shop.mail.waitForMessage("ada@example.com", new RegExp(`${number}: declined`));
    expect(message.text).toContain(reason);
    const late = await planner.post(`/api/orders/${number}/accept`, {
      promisedShipOn: "2030-05-06",
      dateReason: "x",
    });
    expect(late.status).toBe(409);
  });

  it("needs a reason that says something", async () => {
    const { number } = await paidOrder();
    const reply = await planner.post(`/api/orders/${number}/decline`, { reason: "no" });
    expect(reply.status).toBe(422);
    expect(problem.parse(reply.body).errors?.[0]).toMatchObject({ path: "reason" });
  });
});

describe("the mailed link", () => {
  it("opens its order, and only that one, again and again", async () => {
    const mine = await paidOrder();
    const other = await paidOrder();
    const message = await shop.mail.waitForMessage("ada@example.com", new RegExp(`${mine.number}: receipt`));
    const link = /http:\/\/\S+\/order-link\/\S+/.exec(message.text)?.[0] ?? "";
    for (let times = 0; times < 2; times += 1) {
      const reader = new Visitor(shop.origin);
      const opened = await reader.get(new URL(link).pathname);
      expect(opened.status).toBe(303);
      expect(opened.headers.get("location")).toBe(`/orders/${mine.number}`);
      expect(opened.headers.get("referrer-policy")).toBe("no-referrer");
      expect((await reader.get(`/api/orders/${mine.number}`)).status).toBe(200);
      expect((await reader.get(`/api/orders/${other.number}`)).status).toBe(404);
    }
  });

  it("that was never one leads to a page that helps", async () => {
    const opened = await new Visitor(shop.origin).get(
      "/order-link/AAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAA",
    );
    expect(opened.headers.get("location")).toBe("/orders/link-ended");
  });

  it("is sent anew to the order's own address, and to no other", async () => {
    const { number } = await paidOrder();
    const visitor = new Visitor(shop.origin);
    const wrong = await visitor.post("/api/orders/links", { orderNumber: number, email: "eve@example.com" });
    const right = await visitor.post("/api/orders/links", { orderNumber: number, email: "ADA@example.com" });
    expect(wrong.status).toBe(202);
    expect(right.body).toEqual(wrong.body);
    await shop.mail.waitForMessage("ada@example.com", new RegExp(`${number}: your new link`));
    expect(await shop.mail.messages("eve@example.com")).toEqual([]);
  });
});

describe("a cart", () => {
  it("takes no more than a line allows, and no line of another's cart", async () => {
    const visitor = new Visitor(shop.origin);
    const cart = await fillCart(visitor);
    const other = await new Visitor(shop.origin).post(`/api/cart/lines/${cart.lines[0]?.id ?? ""}`);
    expect(other.status).toBe(404);
    expect((await tryToPlaceOrder(new Visitor(shop.origin))).status).toBe(409);
  });

  it("follows its visitor into the account at sign-in", async () => {
    const visitor = new Visitor(shop.origin);
    await fillCart(visitor, { quantity: 3 });
    await visitor.post("/api/account/sign-in", {
      email: "dealer@osiercreek.example",
      password: "osier-creek-demo",
    });
    expect((await visitor.get("/api/cart")).body).toMatchObject({ blocks: 3 });
    expect((await (await signedIn(shop.origin, "dealer")).get("/api/cart")).body).toMatchObject({
      blocks: 3,
    });
  });
});
