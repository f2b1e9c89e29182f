import { transaction } from "#server/database/transaction.ts";
import { CatalogueVersion } from "#server/models/catalogue-version.ts";
import { PriceListVersion } from "#server/models/price-list-version.ts";
import { type Catalogue, catalogueSchema } from "#shared/catalogue/catalogue.ts";
import { type PriceList, priceListSchema } from "#shared/pricing/price-list.ts";

/**
 * Publishes a catalogue and the price list that goes with it. A version is never published twice.
 * @throws ZodError for a document that is not one, UniqueConstraintError for a version that exists
 */
export async function publishCatalogue(catalogue: Catalogue, priceList: PriceList): Promise<void> {
  await transaction(async () => {
    await CatalogueVersion.create({ version: catalogue.version, document: catalogueSchema.parse(catalogue) });
    await PriceListVersion.create({
      version: priceList.version,
      document: priceListSchema.parse(priceList),
      effectiveOn: priceList.effectiveOn,
    });
  });
}
