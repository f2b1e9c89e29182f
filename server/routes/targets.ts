import { anyone } from "#server/policies/common.ts";
import { countTry } from "#server/services/rate-limits.ts";
import { findByTarget } from "#server/services/targets/find-by-target.ts";
import { targetRequestSchema, targetResultSchema } from "#shared/contracts/target.ts";
import { defineRoute } from "./define-route.ts";

export const targetRoutes = [
  defineRoute({
    method: "post",
    path: "/api/targets",
    summary: "The best complete builds for a target, or which wish stands in the way of any",
    access: anyone,
    body: targetRequestSchema,
    response: targetResultSchema,
    problems: ["validation", "too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("target by address", request.ip ?? "");
      return findByTarget(body);
    },
  }),
];
