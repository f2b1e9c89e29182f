import { anyone } from "#server/policies/common.ts";
import { requireOrderable } from "#server/services/builds/check-build.ts";
import { buildRequestSchema, buildViewSchema } from "#shared/contracts/build.ts";
import { defineRoute } from "./define-route.ts";

export const buildRoutes = [
  defineRoute({
    method: "post",
    path: "/api/builds",
    summary: "Evaluate a complete build: figures, findings, price, weight and ship date",
    access: anyone,
    body: buildRequestSchema,
    response: buildViewSchema,
    problems: ["validation", "build-refused"],
    handle: async ({ body }) => (await requireOrderable(body)).view,
  }),
];
