import { Client } from "pg";
import { beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { checkoutResultSchema } from "#shared/contracts/checkout.ts";
import { orderSchema, type OrderView } from "#shared/contracts/orders.ts";
import { startShop, type TestShop } from "../support/test-server.ts";
import { fillCart, freightToTennessee, placeOrder, tryToPlaceOrder, Visitor } from "../support/visitor.ts";

/** Published test cards (references.md 8.4). */
const succeeds = "4242424242424242";
const declined = "4000000000000002";

let shop: TestShop;

beforeAll(async () => {
  shop = await startShop();
});

const problem = z.looseObject({ type: z.string(), detail: z.string() });

async function onStripe(path: string, body: unknown): Promise<{ status: number; body: unknown }> {
  const response = await fetch(`${shop.stripe.origin}/fake${path}`, {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify(body),
  });
  return { status: response.status, body: await response.json() };
}

const pay = (session: string, card: string) => onStripe(`/checkout/${session}/pay`, { card });
const webhooks = (mode: string) => onStripe("/webhooks", { mode });

async function rows(sql: string, values: unknown[] = []): Promise<Record<string, unknown>[]> {
  const client = new Client({ connectionString: shop.server.databaseUrl });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql, values)).rows;
  } finally {
    await client.end();
  }
}

async function readOrder(visitor: Visitor, number: string): Promise<OrderView> {
  return orderSchema.parse((await visitor.get(`/api/orders/${number}`)).body);
}

async function orderInState(visitor: Visitor, number: string, state: string): Promise<OrderView> {
  await expect.poll(async () => (await readOrder(visitor, number)).state, { timeout: 20_000 }).toBe(state);
  return readOrder(visitor, number);
}

async function receipts(number: string): Promise<string[]> {
  const messages = await shop.mail.messages();
  return messages
    .filter((message) => message.subject.includes(number) && message.subject.includes("receipt"))
    .map((message) => message.messageId);
}

/** One order placed, one charge, one receipt: what every story below must end in. */
async function expectPaidOnce(visitor: Visitor, number: string): Promise<void> {
  const order = await orderInState(visitor, number, "placed");
  expect(order.paidCents).toBe(order.totals.totalCents);
  await expect.poll(async () => new Set(await receipts(number)).size, { timeout: 20_000 }).toBe(1);
  const cart = (await rows("SELECT cart_id FROM orders WHERE number = $1", [number]))[0]?.["cart_id"];
  const placed = await rows("SELECT number FROM orders WHERE cart_id = $1 AND placed_at IS NOT NULL", [cart]);
  expect(placed).toEqual([{ number }]);
  expect(await rows("SELECT state FROM payments WHERE cart_id = $1 AND paid_at IS NOT NULL", [cart])).toEqual(
    [{ state: "paid" }],
  );
}

async function visitorWithCart(): Promise<Visitor> {
  const visitor = new Visitor(shop.origin);
  expect((await fillCart(visitor)).blocks).toBe(1);
  return visitor;
}

describe("a payment", () => {
  it("makes the order although the buyer never comes back", async () => {
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor, freightToTennessee);
    expect((await readOrder(visitor, orderNumber)).state).toBe("awaiting-payment");
    expect((await pay(session, succeeds)).status).toBe(200);
    await expectPaidOnce(visitor, orderNumber);
    expect((await visitor.get("/api/cart")).body).toMatchObject({ lines: [], totalCents: 0 });
  });

  it("that is declined leaves the order waiting, and the next card pays it", async () => {
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    expect((await pay(session, declined)).status).toBe(402);
    expect((await readOrder(visitor, orderNumber)).state).toBe("awaiting-payment");
    expect((await pay(session, succeeds)).status).toBe(200);
    await expectPaidOnce(visitor, orderNumber);
  });

  it("survives a server killed between payment and webhook", async () => {
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    await webhooks("hold");
    expect((await pay(session, succeeds)).status).toBe(200);
    await shop.server.kill9();
    await webhooks("deliver");
    await onStripe("/webhooks/release", {});
    await shop.server.restart();
    await expectPaidOnce(visitor, orderNumber);
  });

  it("survives a server killed while it takes the webhook, again and again", async () => {
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    await pay(session, succeeds);
    for (let times = 0; times < 3; times += 1) {
      await shop.server.kill9();
      await shop.server.restart();
    }
    await expectPaidOnce(visitor, orderNumber);
  });

  it.each(["duplicate", "reorder"])("counts once when its webhooks come in mode %s", async (mode) => {
    await webhooks(mode);
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    await pay(session, succeeds);
    await expectPaidOnce(visitor, orderNumber);
    await webhooks("deliver");
  });

  it("is found by asking when its webhook was lost and the buyer pays again", async () => {
    await webhooks("lose");
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    await pay(session, succeeds);
    const again = await tryToPlaceOrder(visitor, freightToTennessee);
    expect(again.status).toBe(409);
    expect(problem.parse(again.body)).toMatchObject({ orderNumber });
    await expectPaidOnce(visitor, orderNumber);
    await webhooks("deliver");
  });

  it("is never taken at the word of the return page", async () => {
    await webhooks("hold");
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    const result = async () =>
      checkoutResultSchema.parse((await visitor.get(`/api/checkout/result?session=${session}`)).body).state;
    expect(await result()).toBe("waiting");
    await pay(session, succeeds);
    expect(await result()).toBe("waiting");
    expect((await new Visitor(shop.origin).get(`/api/checkout/result?session=${session}`)).status).toBe(404);
    await webhooks("deliver");
    await onStripe("/webhooks/release", {});
    await expectPaidOnce(visitor, orderNumber);
    expect(await result()).toBe("paid");
  });
});

describe("two tabs with one cart", () => {
  it("that pay at the same moment share one payment page", async () => {
    const visitor = await visitorWithCart();
    const [one, two] = await Promise.all([placeOrder(visitor), placeOrder(visitor)]);
    expect(two).toEqual(one);
    await pay(one.session, succeeds);
    await expectPaidOnce(visitor, one.orderNumber);
  });

  it("that order different things leave one page that can be paid", async () => {
    const visitor = await visitorWithCart();
    const first = await placeOrder(visitor);
    const second = await placeOrder(visitor, freightToTennessee);
    expect(second.orderNumber).not.toBe(first.orderNumber);
    expect((await pay(first.session, succeeds)).status).toBe(410);
    expect((await readOrder(visitor, first.orderNumber)).state).toBe("cancelled");
    await pay(second.session, succeeds);
    await expectPaidOnce(visitor, second.orderNumber);
  });

  it("that race with different things are charged once", async () => {
    const visitor = await visitorWithCart();
    const replies = await Promise.all([
      tryToPlaceOrder(visitor),
      tryToPlaceOrder(visitor, freightToTennessee),
    ]);
    expect(replies.filter((reply) => reply.status === 201).length).toBeGreaterThanOrEqual(1);
    const open = await rows(
      `SELECT payments.checkout_session AS session, orders.number FROM payments JOIN orders ON orders.id = payments.order_id
        WHERE payments.state = 'open' AND orders.state = 'awaiting-payment' ORDER BY payments.created_at DESC LIMIT 1`,
    );
    await pay(z.string().parse(open[0]?.["session"]), succeeds);
    await expectPaidOnce(visitor, z.string().parse(open[0]?.["number"]));
  });
});

describe("a cart that is paid twice all the same", () => {
  it("has the second payment sent back by itself, and its buyer told", async () => {
    const visitor = await visitorWithCart();
    const first = await placeOrder(visitor);
    // As if Stripe had said that this page was over while it could still be paid.
    await rows("UPDATE payments SET state = 'expired' WHERE checkout_session = $1", [first.session]);
    await rows("UPDATE orders SET state = 'cancelled' WHERE number = $1", [first.orderNumber]);
    const second = await placeOrder(visitor);
    await pay(second.session, succeeds);
    await expectPaidOnce(visitor, second.orderNumber);
    await pay(first.session, succeeds);
    await expect
      .poll(async () => (await readOrder(visitor, first.orderNumber)).returnedCents, { timeout: 20_000 })
      .toBe((await readOrder(visitor, first.orderNumber)).totals.totalCents);
    expect((await readOrder(visitor, first.orderNumber)).state).toBe("cancelled");
    const result = await visitor.get(`/api/checkout/result?session=${first.session}`);
    expect(result.body).toMatchObject({ state: "returned" });
    await shop.mail.waitForMessage("ada@example.com", /second payment/);
    expect((await readOrder(visitor, second.orderNumber)).state).toBe("placed");
  });
});

describe("an order that is never paid", () => {
  it("ends with its payment page, is told plainly, and keeps the cart", async () => {
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    await onStripe(`/clock/expire-session/${session}`, {});
    await orderInState(visitor, orderNumber, "cancelled");
    const result = await visitor.get(`/api/checkout/result?session=${session}`);
    expect(result.body).toMatchObject({ state: "expired", orderNumber });
    expect((await visitor.get("/api/cart")).body).toMatchObject({ blocks: 1 });
    expect(await receipts(orderNumber)).toEqual([]);
    const next = await placeOrder(visitor);
    expect(next.orderNumber).not.toBe(orderNumber);
  });
});

describe("with the payment service down", () => {
  it.each(["500", "429", "lose-answer"])("in mode %s no order is lost or doubled", async (mode) => {
    const visitor = await visitorWithCart();
    await onStripe("/faults", { mode, paths: ["/v1/checkout/sessions"], count: 4 });
    const refused = await tryToPlaceOrder(visitor);
    await onStripe("/faults", { mode: "none" });
    expect([201, 503]).toContain(refused.status);
    if (refused.status === 503) expect(problem.parse(refused.body).type).toMatch(/gateway-unavailable$/);
    const { orderNumber, session } = await placeOrder(visitor);
    await pay(session, succeeds);
    await expectPaidOnce(visitor, orderNumber);
  });

  it("a tax that cannot be asked is said so, and nothing is written", async () => {
    const visitor = await visitorWithCart();
    const before = await rows("SELECT count(*) FROM orders");
    await onStripe("/faults", { mode: "500", paths: ["/v1/tax/calculations"] });
    const total = await visitor.post("/api/checkout/total", { delivery: { method: "pick-up" } });
    await onStripe("/faults", { mode: "none" });
    expect(total.status).toBe(503);
    expect(await rows("SELECT count(*) FROM orders")).toEqual(before);
  });
});

describe("with the mail server down", () => {
  it("the receipt comes late, and once", async () => {
    await shop.mail.control("refuse");
    const visitor = await visitorWithCart();
    const { orderNumber, session } = await placeOrder(visitor);
    await pay(session, succeeds);
    await orderInState(visitor, orderNumber, "placed");
    await expect
      .poll(
        async () =>
          (
            await rows(
              "SELECT attempts FROM emails JOIN orders ON orders.id = emails.order_id WHERE number = $1 AND attempts > 0",
              [orderNumber],
            )
          ).length,
        { timeout: 20_000 },
      )
      .toBe(1);
    expect(await receipts(orderNumber)).toEqual([]);
    await shop.mail.control("accept");
    await expectPaidOnce(visitor, orderNumber);
  });
});
