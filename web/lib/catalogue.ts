import { queryOptions } from "@tanstack/react-query";
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
