import type { BrowserContext } from "playwright-core";
import { expect, vi } from "vitest";
import { orderSchema } from "#shared/contracts/orders.ts";
import type { TestShop } from "../support/test-server.ts";
import { fillCart, freightToTennessee, placeOrder, Visitor } from "../support/visitor.ts";

/** What a story begins with, made over HTTP, since the screens of it have stories of their own. */

/** Published test card that succeeds (references.md 8.4). */
const succeeds = "4242424242424242";

async function onPayments(shop: TestShop, path: string, body: unknown): Promise<void> {
  const response = await fetch(`${shop.stripe.origin}/fake${path}`, {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify(body),
  });
  expect(response.status).toBe(200);
}

/** An order, paid and in the shop's queue; of a guest unless somebody else is named. */
export async function paidOrder(
  shop: TestShop,
  options: { buyer?: Visitor; specialRequest?: string } = {},
): Promise<{ buyer: Visitor; number: string; session: string }> {
  const { buyer = new Visitor(shop.origin), ...cart } = options;
  await fillCart(buyer, cart);
  const { orderNumber, session } = await placeOrder(buyer, freightToTennessee);
  await onPayments(shop, `/checkout/${session}/pay`, { card: succeeds });
  await vi.waitFor(
    async () => {
      const order = orderSchema.parse((await buyer.get(`/api/orders/${orderNumber}`)).body);
      expect(order.state).toBe("placed");
    },
    { timeout: 20_000, interval: 100 },
  );
  return { buyer, number: orderNumber, session };
}

/** A cart whose payment page was opened and ran out. */
export async function expiredPayment(shop: TestShop): Promise<{ guest: Visitor; session: string }> {
  const guest = new Visitor(shop.origin);
  await fillCart(guest);
  const { session } = await placeOrder(guest);
  await onPayments(shop, `/clock/expire-session/${session}`, {});
  return { guest, session };
}

/** Lets a browser be somebody who came over HTTP. */
export async function become(context: BrowserContext, visitor: Visitor): Promise<void> {
  await context.clearCookies();
  await context.addCookies(visitor.cookies());
}
