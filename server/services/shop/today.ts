import { DateTime } from "luxon";
import { shopSettings } from "./shop-settings.ts";

/** Today's date (ISO) by the shop's own clock. */
export async function today(): Promise<string> {
  const { timeZone } = await shopSettings();
  const now = DateTime.now().setZone(timeZone);
  if (!now.isValid) throw new Error(`The shop's time zone "${timeZone}" is not known`);
  return now.toISODate();
}
