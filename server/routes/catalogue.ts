import { z } from "zod";
import { anyone } from "#server/policies/common.ts";
import { findCatalogue } from "#server/services/catalogue/catalogue-versions.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { Refusal } from "#server/services/refusal.ts";
import { catalogueSchema } from "#shared/catalogue/catalogue.ts";
import { currentCatalogueSchema } from "#shared/contracts/catalogue.ts";
import { defineRoute } from "./define-route.ts";

export const catalogueRoutes = [
  defineRoute({
    method: "get",
    path: "/api/catalogue",
    summary: "The catalogue, prices and load of today, for evaluating builds in the browser",
    access: anyone,
    response: currentCatalogueSchema,
    caching: "revalidate",
    handle: () => currentContext(),
  }),
  defineRoute({
    method: "get",
    path: "/api/catalogue/:version",
    summary: "One version of the catalogue; it never changes",
    access: anyone,
    params: z.object({ version: z.coerce.number().int().min(1).max(1_000_000) }),
    response: catalogueSchema,
    caching: "forever",
    problems: ["not-found"],
    handle: async ({ params }) => {
      const catalogue = await findCatalogue(params.version);
      if (!catalogue) throw new Refusal("not-found", `There is no catalogue ${params.version}.`);
      return catalogue;
    },
  }),
];
