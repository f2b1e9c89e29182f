import { z } from "zod";
import { setOrderCookie } from "#server/middleware/order-link-cookie.ts";
import { anyone } from "#server/policies/common.ts";
import { orderOfLink } from "#server/services/orders/order-link.ts";
import { Answer, defineRoute } from "./define-route.ts";

/** Mail scanners open links: this only sets a cookie for the one order and goes on to a clean address. */
export const orderLinkRoutes = [
  defineRoute({
    method: "get",
    path: "/order-link/:token",
    summary: "Open an order by its mailed link",
    access: anyone,
    params: z.object({ token: z.string().min(1).max(200) }),
    handle: async ({ params: { token } }) => {
      const order = await orderOfLink(token);
      return new Answer((response) => {
        response.set({
          "Cache-Control": "no-store",
          "Referrer-Policy": "no-referrer",
          "X-Robots-Tag": "noindex",
        });
        if (order) setOrderCookie(response, order.number, token);
        response.redirect(303, order ? `/orders/${order.number}` : "/orders/link-ended");
      });
    },
  }),
];
