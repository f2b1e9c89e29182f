import { type Request, type Response, Router } from "express";
import { actorOf, browserSession } from "#server/middleware/browser-session.ts";
import { refused } from "#server/policies/policy.ts";
import { Answer, type Route } from "./define-route.ts";

const cacheControl: Record<Route["caching"], string> = {
  never: "no-store",
  revalidate: "no-cache",
  forever: "public, max-age=31536000, immutable",
};

/** Makes an Express router of routes: each asks its policy, then runs, then answers what its schema lets through. */
export function routerOf(routes: readonly Route[]): Router {
  const router = Router();
  for (const route of routes) {
    router[route.method](route.path, (request, response) => answer(route, request, response));
  }
  return router;
}

async function answer(route: Route, request: Request, response: Response): Promise<void> {
  const actor = actorOf(request, request.person ?? null);
  if (!route.access.mayAsk(actor)) throw refused(route.access.action, actor);
  const body: unknown = request.body;
  const result = await route.run({
    params: request.params,
    query: request.query,
    body: body ?? {},
    actor,
    session: browserSession(request, response),
    request,
    response,
  });
  if (result instanceof Answer) {
    result.send(response);
    return;
  }
  response.status(route.status);
  if (route.response === undefined) response.end();
  else response.setHeader("Cache-Control", cacheControl[route.caching]).json(route.response.parse(result));
}
