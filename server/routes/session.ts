import { config } from "#server/config.ts";
import { demoAccounts } from "#server/demo/accounts.ts";
import type { BrowserSession } from "#server/middleware/browser-session.ts";
import type { Actor } from "#server/policies/actor.ts";
import { anyone } from "#server/policies/common.ts";
import { presentShop } from "#server/presenters/shop.ts";
import { countCart, holderOf } from "#server/services/cart/find-cart.ts";
import { shopSettings } from "#server/services/shop/shop-settings.ts";
import { sessionSchema, type SessionView } from "#shared/contracts/session.ts";
import { defineRoute } from "./define-route.ts";

/** Who is here, as the browser is told. */
export async function presentSession(actor: Actor, session: BrowserSession): Promise<SessionView> {
  return {
    csrfToken: session.csrfToken(),
    person: actor.person,
    cartCount: await countCart(holderOf(actor)),
    shop: presentShop(await shopSettings()),
    demo: config.DEMO ? demoAccounts : null,
  };
}

export const sessionRoutes = [
  defineRoute({
    method: "get",
    path: "/api/session",
    summary: "Who is signed in, the shop's letterhead, and the token for changing requests",
    access: anyone,
    response: sessionSchema,
    handle: ({ actor, session }) => presentSession(actor, session),
  }),
];
