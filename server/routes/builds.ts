import { anyone } from "#server/policies/common.ts";
import { requireOrderable } from "#server/services/builds/check-build.ts";
import { mendBuild } from "#server/services/builds/mend-build.ts";
import { countTry } from "#server/services/rate-limits.ts";
import {
  buildRequestSchema,
  buildViewSchema,
  mendRequestSchema,
  mendResultSchema,
} from "#shared/contracts/build.ts";
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
  defineRoute({
    method: "post",
    path: "/api/builds/mend",
    summary: "Why an option is closed, or a build no longer stands, and the cheapest mend",
    access: anyone,
    body: mendRequestSchema,
    response: mendResultSchema,
    problems: ["validation", "too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("mend by address", request.ip ?? "");
      return mendBuild(body);
    },
  }),
];
