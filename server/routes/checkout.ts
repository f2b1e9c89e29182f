import { z } from "zod";
import { anyone } from "#server/policies/common.ts";
import { readOrders } from "#server/policies/orders.ts";
import { holderOf } from "#server/services/cart/find-cart.ts";
import { checkoutResult } from "#server/services/checkout/checkout-result.ts";
import { totalCart } from "#server/services/checkout/total-cart.ts";
import { Refusal } from "#server/services/refusal.ts";
import { checkoutResultSchema, totalRequestSchema, totalsSchema } from "#shared/contracts/checkout.ts";
import { defineRoute } from "./define-route.ts";

export const checkoutRoutes = [
  defineRoute({
    method: "post",
    path: "/api/checkout/total",
    summary: "What the cart costs, delivered: blocks, freight and tax",
    access: anyone,
    body: totalRequestSchema,
    response: totalsSchema,
    problems: ["build-refused", "conflict", "gateway-unavailable"],
    handle: async ({ actor, body }) => (await totalCart(holderOf(actor), body.delivery)).totals,
  }),
  defineRoute({
    method: "get",
    path: "/api/checkout/result",
    summary: "How the payment behind a checkout session stands; only reads",
    access: anyone,
    query: z.object({ session: z.string().min(1).max(200) }),
    response: checkoutResultSchema,
    problems: ["not-found"],
    handle: async ({ actor, query }) => {
      const found = await checkoutResult(query.session);
      // The same answer for a session that is not this browser's as for one that is not there.
      if (!found || !readOrders.may(actor, found.order)) {
        throw new Refusal(
          "not-found",
          "This browser knows no such payment. The receipt in your e-mail opens the order.",
        );
      }
      return found.result;
    },
  }),
];
