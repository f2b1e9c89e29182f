import type { ShopSettings } from "#server/models/shop-settings.ts";
import type { ShopView } from "#shared/contracts/session.ts";

/** The shop as everybody may know it: its letterhead. */
export function presentShop(settings: ShopSettings): ShopView {
  const { line1, line2, city, state, postalCode } = settings.address;
  return {
    name: settings.name,
    email: settings.email,
    phone: settings.phone,
    addressLines: [line1, line2, `${city}, ${state} ${postalCode}`].filter((line) => line !== ""),
    timeZone: settings.timeZone,
  };
}
