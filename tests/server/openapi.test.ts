import { expect, test } from "vitest";
import supertest from "supertest";
import { z } from "zod";
import { createApp } from "#server/app.ts";
import { routes } from "#server/routes/index.ts";

const operation = z.object({
  operationId: z.string().regex(/^\w+$/),
  summary: z.string().min(5),
  parameters: z
    .array(
      z.object({
        name: z.string(),
        in: z.enum(["path", "query"]),
        required: z.boolean().optional(),
        schema: z.unknown(),
      }),
    )
    .optional(),
  requestBody: z.object({ content: z.record(z.string(), z.object({ schema: z.unknown() })) }).optional(),
  responses: z.record(z.string().regex(/^[1-5]\d\d$/), z.object({ description: z.string().min(1) })),
});
const documentSchema = z.object({
  openapi: z.literal("3.1.0"),
  info: z.object({ title: z.string(), version: z.string() }),
  paths: z.record(
    z.string(),
    z
      .record(z.enum(["get", "post", "patch", "delete"]), operation)
      .or(z.partialRecord(z.enum(["get", "post", "patch", "delete"]), operation)),
  ),
});

test("the API document is OpenAPI 3.1 and has every route with its parameters", async () => {
  const answer = await supertest(createApp()).get("/api/openapi.json").expect(200);
  const document = documentSchema.parse(answer.body);
  const documented = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  );
  expect(documented.sort()).toEqual(
    routes.map((route) => `${route.method} ${route.path.replace(/:(\w+)/g, "{$1}")}`).sort(),
  );
  const ids: string[] = [];
  for (const [path, methods] of Object.entries(document.paths)) {
    for (const one of Object.values(methods)) {
      ids.push(one.operationId);
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]);
      const named = (one.parameters ?? []).filter((parameter) => parameter.in === "path");
      expect(named.map((parameter) => parameter.name).sort()).toEqual([...inPath].sort());
      for (const parameter of named) expect(parameter.required).toBe(true);
    }
  }
  expect(new Set(ids).size).toBe(ids.length);
});
