import { OpenApiGeneratorV31, OpenAPIRegistry } from "@asteasolutions/zod-to-openapi";
import { Router } from "express";
import { z } from "zod";
import { config } from "#server/config.ts";
import { problemStatus } from "#server/middleware/problems.ts";
import { problemSchema, type ProblemKind } from "#shared/contracts/problem.ts";
import type { Route } from "./define-route.ts";

const problemContent = { "application/problem+json": { schema: problemSchema } };

/** Problems that a route may answer with by what it is, whether it says so or not. */
function usualProblems(route: Route): ProblemKind[] {
  const kinds: ProblemKind[] = ["internal"];
  if (route.access.action !== "public") kinds.push("not-signed-in", "not-allowed");
  if (route.body !== undefined || route.query !== undefined) kinds.push("validation");
  if (route.params !== undefined) kinds.push("not-found");
  if (route.method !== "get") kinds.push("csrf");
  return kinds;
}

function responsesOf(route: Route): Record<string, { description: string; content?: object }> {
  const byStatus = new Map<number, Set<ProblemKind>>();
  for (const kind of [...usualProblems(route), ...route.problems]) {
    const status = problemStatus(kind);
    const known = byStatus.get(status) ?? new Set<ProblemKind>();
    byStatus.set(status, known.add(kind));
  }
  const isPage = !route.path.startsWith("/api/");
  const success = isPage
    ? { 303: { description: "Goes on to a page." } }
    : {
        [route.status]:
          route.response === undefined
            ? { description: "Done." }
            : { description: "Done.", content: { "application/json": { schema: route.response } } },
      };
  const answers: Record<string, { description: string; content?: object }> = { ...success };
  for (const [status, kinds] of byStatus)
    answers[String(status)] = { description: [...kinds].join(", "), content: problemContent };
  return answers;
}

function asObject(schema: z.ZodType | undefined): z.ZodObject | undefined {
  return schema instanceof z.ZodObject ? schema : undefined;
}

/** The OpenAPI 3.1 document of these routes, made from the very schemas that they parse with. */
function openApiDocument(routes: readonly Route[]): object {
  const registry = new OpenAPIRegistry();
  for (const route of routes) {
    const params = asObject(route.params);
    const query = asObject(route.query);
    registry.registerPath({
      method: route.method,
      path: route.path.replace(/:(\w+)/g, "{$1}"),
      summary: route.summary,
      operationId: `${route.method} ${route.path}`
        .replace(/\/api\//, "")
        .replace(/[^\w]+(\w?)/g, (_all, next: string) => next.toUpperCase()),
      description: `Permission: ${route.access.action}`,
      request: {
        ...(params === undefined ? {} : { params }),
        ...(query === undefined ? {} : { query }),
        ...(route.body === undefined
          ? {}
          : { body: { required: true, content: { "application/json": { schema: route.body } } } }),
      },
      responses: responsesOf(route),
    });
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: "3.1.0",
    info: {
      title: "Blockwright",
      version: "1",
      description:
        "Changing requests carry the Origin of the shop's own pages and the token of GET /api/session in X-CSRF-Token. Problems are RFC 9457 problem details; amounts are whole cents.",
    },
    servers: [{ url: config.PUBLIC_ORIGIN }],
  });
}

export function openApiRouter(routes: readonly Route[]): Router {
  const router = Router();
  let document: object | undefined;
  router.get("/api/openapi.json", (_request, response) => {
    document ??= openApiDocument(routes);
    response.setHeader("Cache-Control", "no-cache").json(document);
  });
  return router;
}
