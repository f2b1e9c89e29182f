import type { BrowserContext } from "playwright-core";
import { expect } from "vitest";
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

/** An order of a guest, paid and in the shop's queue. */
export async function paidOrder(
  shop: TestShop,
  cart: { specialRequest?: string } = {},
): Promise<{ guest: Visitor; number: string; session: string }> {
  const guest = new Visitor(shop.origin);
  await fillCart(guest, cart);
  const { orderNumber, session } = await placeOrder(guest, freightToTennessee);
  await onPayments(shop, `/checkout/${session}/pay`, { card: succeeds });
  await expect
    .poll(async () => orderSchema.parse((await guest.get(`/api/orders/${orderNumber}`)).body).state, {
      timeout: 20_000,
    })
    .toBe("placed");
  return { guest, number: orderNumber, session };
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
