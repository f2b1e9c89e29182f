import type { Request } from "express";
import { z } from "zod";
import { withOrderLink } from "#server/middleware/order-link-cookie.ts";
import type { Actor } from "#server/policies/actor.ts";
import { anyone, ownAccount } from "#server/policies/common.ts";
import { acceptOrders, declineOrders, readOrders, reviewOrders } from "#server/policies/orders.ts";
import {
  presentMyOrder,
  presentOrder,
  presentOrderReview,
  presentOrderSummary,
} from "#server/presenters/order.ts";
import { holderOf } from "#server/services/cart/find-cart.ts";
import { acceptOrder } from "#server/services/orders/accept-order.ts";
import { declineOrder } from "#server/services/orders/decline-order.ts";
import { listMyOrders, listOrders } from "#server/services/orders/list-orders.ts";
import { closeOrder, openOrder } from "#server/services/orders/open-order.ts";
import { sendOrderLink } from "#server/services/orders/order-link.ts";
import { placeOrder } from "#server/services/orders/place-order.ts";
import { proposeShipDate } from "#server/services/orders/propose-ship-date.ts";
import { readOrder } from "#server/services/orders/read-order.ts";
import { countTry } from "#server/services/rate-limits.ts";
import { Refusal } from "#server/services/refusal.ts";
import { acknowledgementSchema } from "#shared/contracts/account.ts";
import { placedOrderSchema, placeOrderRequestSchema } from "#shared/contracts/checkout.ts";
import {
  acceptOrderRequestSchema,
  declineOrderRequestSchema,
  myOrdersSchema,
  orderLinkRequestSchema,
  orderListQuerySchema,
  orderListSchema,
  orderNumberSchema,
  type OrderReview,
  orderReviewSchema,
  orderSchema,
} from "#shared/contracts/orders.ts";
import { defineRoute } from "./define-route.ts";

const params = z.object({ number: orderNumberSchema });

export const orderRoutes = [
  defineRoute({
    method: "post",
    path: "/api/orders",
    summary: "Place an order for the cart and open its payment page",
    access: anyone,
    body: placeOrderRequestSchema,
    response: placedOrderSchema,
    status: 201,
    problems: [
      "build-refused",
      "price-changed",
      "payment-closed",
      "conflict",
      "gateway-unavailable",
      "too-many-requests",
    ],
    handle: async ({ actor, body, session, request }) => {
      await countTry("order by address", request.ip ?? "");
      const { orderId, ...placed } = await placeOrder(holderOf(actor), body);
      if (actor.person === null) session.grantOrder(orderId);
      return placed;
    },
  }),
  defineRoute({
    method: "get",
    path: "/api/orders",
    summary: "The shop's orders in one state, oldest first",
    access: reviewOrders,
    query: orderListQuerySchema,
    response: orderListSchema,
    handle: async ({ query }) => {
      const { rows, total, pages } = await listOrders(query);
      return { orders: rows.map(presentOrderSummary), total, pages, page: query.page };
    },
  }),
  defineRoute({
    method: "get",
    path: "/api/account/orders",
    summary: "The signed-in person's own orders, newest first",
    access: ownAccount,
    response: myOrdersSchema,
    handle: async ({ actor }) => {
      if (actor.person === null) throw new Refusal("not-signed-in", "Sign in to see your orders.");
      return { orders: (await listMyOrders(actor.person)).map(presentMyOrder) };
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/orders/links",
    summary: "Mail a new link to an order to the address it was placed with",
    access: anyone,
    body: orderLinkRequestSchema,
    response: acknowledgementSchema,
    status: 202,
    problems: ["too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("order link by address", request.ip ?? "");
      await sendOrderLink(body.orderNumber, body.email);
      return { message: "If this order was placed with this address, a new link is on its way to it." };
    },
  }),
  defineRoute({
    method: "get",
    path: "/api/orders/:number",
    summary: "An order, for its buyer and for the shop",
    access: readOrders,
    params,
    response: orderSchema,
    problems: ["not-found"],
    handle: async ({ params: { number }, actor, request }) =>
      presentOrder(await readOwn(number, actor, request)),
  }),
  defineRoute({
    method: "get",
    path: "/api/orders/:number/review",
    summary: "An order as the shop reviews it",
    access: reviewOrders,
    params,
    response: orderReviewSchema,
    problems: ["not-found"],
    handle: ({ params: { number }, actor }) => review(number, actor),
  }),
  defineRoute({
    method: "post",
    path: "/api/orders/:number/open",
    summary: "Say that one has this order open; repeated every minute",
    access: reviewOrders,
    params,
    response: orderReviewSchema,
    problems: ["not-found"],
    handle: async ({ params: { number }, actor }) => {
      await openOrder(number, personOf(actor));
      return review(number, actor);
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/orders/:number/close",
    summary: "Say that one has put this order down",
    access: reviewOrders,
    params,
    problems: ["not-found"],
    handle: ({ params: { number }, actor }) => closeOrder(number, personOf(actor)),
  }),
  defineRoute({
    method: "post",
    path: "/api/orders/:number/accept",
    summary: "Accept an order with a promised ship date",
    access: acceptOrders,
    params,
    body: acceptOrderRequestSchema,
    response: orderReviewSchema,
    problems: ["not-found", "conflict"],
    handle: async ({ params: { number }, body, actor }) => {
      await acceptOrder(number, body, personOf(actor));
      return review(number, actor);
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/orders/:number/decline",
    summary: "Decline an order with a reason; the payment goes back",
    access: declineOrders,
    params,
    body: declineOrderRequestSchema,
    response: orderReviewSchema,
    problems: ["not-found", "conflict"],
    handle: async ({ params: { number }, body, actor }) => {
      await declineOrder(number, body.reason, personOf(actor));
      return review(number, actor);
    },
  }),
];

async function readOwn(number: string, actor: Actor, request: Request) {
  const record = await readOrder(number);
  const reader = await withOrderLink(actor, request, number);
  // Somebody else's order is answered like one that is not there: a number alone tells nothing.
  if (!readOrders.may(reader, record.order)) throw new Refusal("not-found", "There is no such order.");
  return record;
}

async function review(number: string, actor: Actor): Promise<OrderReview> {
  const record = await readOrder(number);
  const proposed = record.order.promisedShipOn ?? (await proposeShipDate(record.lines));
  return presentOrderReview(record, proposed, personOf(actor));
}

function personOf(actor: Actor): string {
  if (actor.person === null) throw new Refusal("not-signed-in", "Sign in to go on.");
  return actor.person.id;
}
