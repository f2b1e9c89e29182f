import { queryOptions } from "@tanstack/react-query";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { api } from "./api.ts";

/** What can be chosen today, what it costs and how busy the shop is: all that the browser needs to evaluate a build. */
export const catalogueQuery = queryOptions({
  queryKey: ["catalogue"],
  staleTime: 5 * 60_000,
  queryFn: async ({ signal }): Promise<CurrentCatalogue> => {
    // The schema is fetched while the answer is on its way.
    const [answer, { currentCatalogueSchema }] = await Promise.all([
      api.get("/api/catalogue", { parse: (value) => value }, { signal }),
      import("#shared/contracts/catalogue.ts"),
    ]);
    return currentCatalogueSchema.parse(answer);
  },
});

/** A catalogue of an earlier version, for codes that were made with it. It never changes. */
export function earlierCatalogueQuery(version: number) {
  return queryOptions({
    queryKey: ["catalogue", version],
    staleTime: Infinity,
    queryFn: async ({ signal }): Promise<Catalogue> => {
      const { catalogueSchema } = await import("#shared/catalogue/catalogue.ts");
      return api.get(`/api/catalogue/${version}`, catalogueSchema, { signal });
    },
  });
}
