import { ShopSettings } from "#server/models/shop-settings.ts";

/**
 * Whose shop this is.
 * @throws Error when the settings were never written; /readyz tells before anybody is served
 */
export async function shopSettings(): Promise<ShopSettings> {
  const settings = await ShopSettings.findOne();
  if (!settings) throw new Error("The shop's settings are not there");
  return settings;
}
