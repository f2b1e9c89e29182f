import { Op } from "sequelize";
import { CatalogueVersion } from "#server/models/catalogue-version.ts";
import { PriceListVersion } from "#server/models/price-list-version.ts";
import { type Catalogue, catalogueSchema } from "#shared/catalogue/catalogue.ts";
import { type PriceList, priceListSchema } from "#shared/pricing/price-list.ts";

// Published documents never change, so that what was read once need not be read again; which one holds is always asked.
const catalogues = new Map<number, Catalogue>();
const priceLists = new Map<number, PriceList>();

/** The catalogue of a version; null when there is none such. */
export async function findCatalogue(version: number): Promise<Catalogue | null> {
  const kept = catalogues.get(version);
  if (kept) return kept;
  const row = await CatalogueVersion.findByPk(version);
  if (!row) return null;
  const catalogue = catalogueSchema.parse(row.document);
  catalogues.set(version, catalogue);
  return catalogue;
}

/**
 * The newest catalogue.
 * @throws Error when none was ever published; /readyz tells before anybody is served
 */
export async function newestCatalogue(): Promise<Catalogue> {
  const version = await CatalogueVersion.max<number | null, CatalogueVersion>("version");
  const catalogue = version === null ? null : await findCatalogue(version);
  if (!catalogue) throw new Error("No catalogue is published");
  return catalogue;
}

/**
 * The price list that holds on a day (ISO): of those in effect, the latest.
 * @throws Error when none is in effect
 */
export async function priceListOn(day: string): Promise<PriceList> {
  const row = await PriceListVersion.findOne({
    attributes: ["version"],
    where: { effectiveOn: { [Op.lte]: day } },
    order: [
      ["effectiveOn", "DESC"],
      ["version", "DESC"],
    ],
  });
  if (!row) throw new Error(`No price list is in effect on ${day}`);
  const kept = priceLists.get(row.version);
  if (kept) return kept;
  const { document } = await PriceListVersion.findByPk(row.version, { rejectOnEmpty: true });
  const priceList = priceListSchema.parse(document);
  priceLists.set(row.version, priceList);
  return priceList;
}
