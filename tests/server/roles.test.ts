import { beforeAll, describe, expect, test } from "vitest";
import { z } from "zod";
import { createApp } from "#server/app.ts";
import { routes } from "#server/routes/index.ts";
import { type Role, roleSchema } from "#shared/contracts/person.ts";
import { Browser } from "#tests/support/api.ts";
import { makeShop, makeSignedIn } from "#tests/support/factories.ts";

const app = createApp();
beforeAll(makeShop);

type Identity = Role | "stranger";
const identities: readonly Identity[] = ["stranger", ...roleSchema.options];

const everyone = identities;
const people = roleSchema.options;
const shop: readonly Identity[] = ["floor", "planner", "office"];
const planners: readonly Identity[] = ["planner", "office"];
const office: readonly Identity[] = ["office"];

/**
 * Every route and who may ask for it. A new route is a new line here; whose record it is, where that matters, is tested
 * beside the route.
 */
const table: Record<string, readonly Identity[]> = {
  "GET /api/session": everyone,
  "POST /api/account/register": everyone,
  "POST /api/account/verify": everyone,
  "POST /api/account/resend-verification": people,
  "POST /api/account/sign-in": everyone,
  "POST /api/account/sign-out": everyone,
  "POST /api/account/forgot": everyone,
  "POST /api/account/reset": everyone,
  "POST /api/account/change-password": people,
  "GET /api/account/orders": people,
  "GET /api/catalogue": everyone,
  "GET /api/catalogue/:version": everyone,
  "POST /api/builds": everyone,
  "POST /api/builds/mend": everyone,
  "POST /api/targets": everyone,
  "GET /api/cart": everyone,
  "POST /api/cart/lines": everyone,
  "PATCH /api/cart/lines/:id": everyone,
  "DELETE /api/cart/lines/:id": everyone,
  "POST /api/checkout/total": everyone,
  "GET /api/checkout/result": everyone,
  "POST /api/orders": everyone,
  "GET /api/orders": shop,
  "POST /api/orders/links": everyone,
  // The record decides: tests/server/orders.test.ts.
  "GET /api/orders/:number": everyone,
  "GET /api/orders/:number/review": shop,
  "POST /api/orders/:number/open": shop,
  "POST /api/orders/:number/close": shop,
  "POST /api/orders/:number/accept": planners,
  "POST /api/orders/:number/decline": planners,
  "GET /order-link/:token": everyone,
  "GET /api/messages": office,
  "GET /api/messages/:id": office,
  "POST /api/messages/:id/send-again": office,
};

/** Served without asking a policy, each for its own reason. */
const outsideOfPolicies = new Set([
  "GET /healthz", // says only that the process lives
  "GET /readyz", // says only what is missing
  "GET /api/openapi.json", // describes what is written in this repository
  "POST /api/stripe-webhook", // the signature is the permission
  "GET /{*path}", // files of the built client
]);

const values: Record<string, string> = {
  number: "0000-0000",
  id: "00000000-0000-4000-8000-000000000000",
  version: "1",
  token: "t".repeat(43),
};

const routeLayer = z.object({
  route: z.object({ path: z.string(), methods: z.record(z.string(), z.boolean()) }),
});

/** A router is a function with a stack, its layers are objects with a route or a handle. */
function stackOf(router: unknown): unknown[] {
  const hasStack = typeof router === "function" && "stack" in router && Array.isArray(router.stack);
  return hasStack ? (router.stack as unknown[]) : [];
}

/** What Express itself has registered, however it came there. */
function registered(router: unknown): string[] {
  return stackOf(router).flatMap((layer) => {
    const parsed = routeLayer.safeParse(layer);
    if (parsed.success) {
      const { path, methods } = parsed.data.route;
      return Object.keys(methods).map((method) => `${method.toUpperCase()} ${path}`);
    }
    return typeof layer === "object" && layer !== null && "handle" in layer ? registered(layer.handle) : [];
  });
}

describe("the table of routes", () => {
  test("has every route that is declared, and no other", () => {
    const declared = routes.map((route) => `${route.method.toUpperCase()} ${route.path}`);
    expect([...declared].sort()).toEqual(Object.keys(table).sort());
  });

  test("has every route that the application answers", () => {
    const all = registered(app.router);
    expect(all.length).toBeGreaterThan(Object.keys(table).length);
    expect(all.filter((one) => table[one] === undefined && !outsideOfPolicies.has(one))).toEqual([]);
  });
});

describe.each(identities)("as %s", (identity) => {
  test("every route lets in whom the table says", async () => {
    const enter = async (): Promise<Browser> =>
      identity === "stranger" ? new Browser(app) : (await makeSignedIn(app, identity)).browser;
    let browser = await enter();
    const found: Record<string, boolean> = {};
    for (const route of routes) {
      const path = route.path.replace(/:(\w+)/g, (_all, name: string) => values[name] ?? "");
      const answer =
        route.method === "get" ? await browser.get(path) : await browser.send(route.method, path, {});
      const refused = answer.status === 401 || answer.status === 403;
      if (refused) expect(answer.status).toBe(identity === "stranger" ? 401 : 403);
      else expect(answer.status).toBeLessThan(500);
      found[`${route.method.toUpperCase()} ${route.path}`] = !refused;
      if (route.path.endsWith("/sign-out")) browser = await enter();
    }
    const expected = Object.fromEntries(
      Object.entries(table).map(([key, who]) => [key, who.includes(identity)]),
    );
    expect(found).toEqual(expected);
  });
});
