import { z } from "zod";
import { anyone } from "#server/policies/common.ts";
import { addCartLine } from "#server/services/cart/add-cart-line.ts";
import { changeCartLine, removeCartLine } from "#server/services/cart/change-cart-line.ts";
import { holderOf } from "#server/services/cart/find-cart.ts";
import { readCart } from "#server/services/cart/read-cart.ts";
import { addCartLineRequestSchema, cartSchema, changeCartLineRequestSchema } from "#shared/contracts/cart.ts";
import { defineRoute } from "./define-route.ts";

const lineParams = z.object({ id: z.uuid() });

export const cartRoutes = [
  defineRoute({
    method: "get",
    path: "/api/cart",
    summary: "The cart of this person or this browser, at today's prices",
    access: anyone,
    response: cartSchema,
    handle: ({ actor }) => readCart(holderOf(actor)),
  }),
  defineRoute({
    method: "post",
    path: "/api/cart/lines",
    summary: "Put a build in the cart",
    access: anyone,
    body: addCartLineRequestSchema,
    response: cartSchema,
    status: 201,
    problems: ["build-refused", "price-changed", "conflict"],
    handle: async ({ actor, body, session }) => {
      const cartId = await addCartLine(holderOf(actor), body);
      if (actor.person === null) session.keepCart(cartId);
      return readCart({ ...holderOf(actor), cartId });
    },
  }),
  defineRoute({
    method: "patch",
    path: "/api/cart/lines/:id",
    summary: "Change how many blocks a line asks for",
    access: anyone,
    params: lineParams,
    body: changeCartLineRequestSchema,
    response: cartSchema,
    handle: async ({ actor, params, body }) => {
      await changeCartLine(holderOf(actor), params.id, body.quantity);
      return readCart(holderOf(actor));
    },
  }),
  defineRoute({
    method: "delete",
    path: "/api/cart/lines/:id",
    summary: "Take a line out of the cart",
    access: anyone,
    params: lineParams,
    response: cartSchema,
    handle: async ({ actor, params }) => {
      await removeCartLine(holderOf(actor), params.id);
      return readCart(holderOf(actor));
    },
  }),
];
