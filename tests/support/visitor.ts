import { z } from "zod";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { encodeSpec } from "#shared/catalogue/spec-code.ts";
import { type CartView, cartSchema } from "#shared/contracts/cart.ts";
import type { Delivery } from "#shared/contracts/address.ts";
import { placedOrderSchema, totalsSchema } from "#shared/contracts/checkout.ts";
import type { Role } from "#shared/contracts/person.ts";
import { sessionSchema } from "#shared/contracts/session.ts";
import { marl400 } from "../shared/demo/context.ts";

export interface Reply {
  status: number;
  body: unknown;
  headers: Headers;
}

/** A visitor over real HTTP: keeps cookies, sends Origin and the CSRF token as our own pages do. */
export class Visitor {
  readonly #origin: string;
  readonly #cookies = new Map<string, string>();

  constructor(origin: string) {
    this.#origin = origin;
  }

  /** What a browser must hold to be this visitor. */
  cookies(): { name: string; value: string; url: string }[] {
    return [...this.#cookies].map(([name, value]) => ({ name, value, url: this.#origin }));
  }

  async get(path: string): Promise<Reply> {
    return this.#send("GET", path);
  }

  async post(path: string, body: unknown = {}): Promise<Reply> {
    const session = sessionSchema.parse((await this.get("/api/session")).body);
    return this.#send("POST", path, body, { "X-CSRF-Token": session.csrfToken });
  }

  async #send(
    method: string,
    path: string,
    body?: unknown,
    headers: Record<string, string> = {},
  ): Promise<Reply> {
    const response = await fetch(new URL(path, this.#origin), {
      method,
      redirect: "manual",
      headers: {
        ...headers,
        Origin: this.#origin,
        Cookie: [...this.#cookies].map(([name, value]) => `${name}=${value}`).join("; "),
        ...(body === undefined ? {} : { "Content-Type": "application/json" }),
      },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
    for (const line of response.headers.getSetCookie()) this.#keep(line);
    const text = await response.text();
    const isJson = response.headers.get("content-type")?.includes("json") ?? false;
    return { status: response.status, body: isJson ? JSON.parse(text) : text, headers: response.headers };
  }

  #keep(line: string): void {
    const [, name = "", value = ""] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
    if (value === "") this.#cookies.delete(name);
    else this.#cookies.set(name, value);
  }
}

/** Somebody signed in with a demo account, named by its role. */
export async function signedIn(origin: string, role: Role): Promise<Visitor> {
  const visitor = new Visitor(origin);
  const reply = await visitor.post("/api/account/sign-in", {
    email: `${role}@osiercreek.example`,
    password: "osier-creek-demo",
  });
  if (reply.status >= 300) throw new Error(`${role} could not sign in: ${JSON.stringify(reply.body)}`);
  return visitor;
}

/** The demo's Marl of 400 cu in, whole and free of stops. */
export const marlSpecCode = encodeSpec(demoCatalogue, marl400.answers);

export const contact = { name: "Ada Farrow", email: "ada@example.com", phone: "615 555 0134" };

export const freightToTennessee: Delivery = {
  method: "freight",
  address: {
    line1: "12 Mill Lane",
    line2: "",
    city: "Ashford",
    state: "TN",
    postalCode: "37203",
    country: "US",
  },
};

/** Puts a Marl in the visitor's cart. */
export async function fillCart(
  visitor: Visitor,
  more: { specialRequest?: string; quantity?: number } = {},
): Promise<CartView> {
  const probe = await visitor.post("/api/cart/lines", {
    specCode: marlSpecCode,
    expectedPriceCents: -1,
    ...more,
  });
  const { priceCents } = z.object({ priceCents: z.int() }).parse(probe.body);
  const added = await visitor.post("/api/cart/lines", {
    specCode: marlSpecCode,
    expectedPriceCents: priceCents,
    ...more,
  });
  return cartSchema.parse(added.body);
}

/** Asks for the total as the checkout page does, then places the order. */
export async function tryToPlaceOrder(
  visitor: Visitor,
  delivery: Delivery = { method: "pick-up" },
): Promise<Reply> {
  const total = await visitor.post("/api/checkout/total", { delivery });
  if (total.status !== 200) return total;
  const expectedTotalCents = totalsSchema.parse(total.body).totalCents;
  return visitor.post("/api/orders", { contact, delivery, expectedTotalCents });
}

/** Places the order; the session's id is the last part of the payment page's address. */
export async function placeOrder(
  visitor: Visitor,
  delivery: Delivery = { method: "pick-up" },
): Promise<{ orderNumber: string; paymentUrl: string; session: string }> {
  const reply = await tryToPlaceOrder(visitor, delivery);
  if (reply.status !== 201) throw new Error(`The order was not placed: ${JSON.stringify(reply.body)}`);
  const placed = placedOrderSchema.parse(reply.body);
  const session = /cs_[\w]+/.exec(placed.paymentUrl)?.[0] ?? "";
  return { ...placed, session };
}
