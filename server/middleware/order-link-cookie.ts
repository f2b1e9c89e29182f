import type { Request, Response } from "express";
import type { Actor } from "#server/policies/actor.ts";
import { orderOfLink } from "#server/services/orders/order-link.ts";
import { cookieName, isSecure } from "./session.ts";

const KEPT_FOR = 30 * 24 * 3600_000;

/** One cookie for each order that a mailed link opened; its value is the link's token, so that revoking the link ends it. */
function orderCookie(orderNumber: string): string {
  return cookieName(`blockwright-order-${orderNumber}`);
}

/** Lets this browser see the one order that its link is for. */
export function setOrderCookie(response: Response, orderNumber: string, token: string): void {
  response.cookie(orderCookie(orderNumber), token, {
    httpOnly: true,
    sameSite: "lax",
    secure: isSecure,
    path: "/",
    maxAge: KEPT_FOR,
  });
}

/** The actor with the order added that this browser's cookie for that number opens, if it does. */
export async function withOrderLink(actor: Actor, request: Request, orderNumber: string): Promise<Actor> {
  const token = cookieOf(request, orderCookie(orderNumber));
  if (token === null) return actor;
  const order = await orderOfLink(token);
  if (order?.number !== orderNumber) return actor;
  return { ...actor, orderGrants: [...actor.orderGrants, order.id] };
}

function cookieOf(request: Request, name: string): string | null {
  const pairs = (request.headers.cookie ?? "").split(";").map((pair) => pair.trim().split("="));
  return pairs.find(([key]) => key === name)?.[1] ?? null;
}
