import { acceptedLoad } from "#server/services/orders/accepted-load.ts";
import { today } from "#server/services/shop/today.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";
import { newestCatalogue, priceListOn } from "./catalogue-versions.ts";

/** What every build is evaluated against now: newest catalogue, today's price list, the load of accepted orders. */
export async function currentContext(): Promise<EvaluationContext> {
  const day = await today();
  const [catalogue, priceList, load] = await Promise.all([
    newestCatalogue(),
    priceListOn(day),
    acceptedLoad(),
  ]);
  return { catalogue, priceList, load, today: day };
}
