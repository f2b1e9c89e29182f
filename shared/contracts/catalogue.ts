import { z } from "zod";
import { catalogueSchema } from "../catalogue/catalogue.ts";
import { priceListSchema } from "../pricing/price-list.ts";

/** GET /api/catalogue: all that the browser needs to evaluate a build by itself. */
export const currentCatalogueSchema = z.object({
  catalogue: catalogueSchema,
  priceList: priceListSchema,
  load: z.object({ minutes: z.record(z.string(), z.int()) }),
  today: z.iso.date(),
});
export type CurrentCatalogue = z.infer<typeof currentCatalogueSchema>;
