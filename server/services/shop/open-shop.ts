import { transaction } from "#server/database/transaction.ts";
import { ShopSettings } from "#server/models/shop-settings.ts";
import { publishCatalogue } from "#server/services/catalogue/publish-catalogue.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import type { Address } from "#shared/contracts/address.ts";
import type { PriceList } from "#shared/pricing/price-list.ts";

export interface ShopDetails {
  name: string;
  email: string;
  /** E.164. */
  phone: string;
  address: Address;
  /** IANA name. */
  timeZone: string;
}

/**
 * Writes whose shop this is and publishes what it sells, both or nothing.
 * @throws UniqueConstraintError for a version that is published already
 */
export async function openShop(shop: ShopDetails, catalogue: Catalogue, priceList: PriceList): Promise<void> {
  await transaction(async () => {
    const settings = await ShopSettings.findOne({ lock: true });
    await (settings ? settings.update(shop) : ShopSettings.create(shop));
    await publishCatalogue(catalogue, priceList);
  });
}
