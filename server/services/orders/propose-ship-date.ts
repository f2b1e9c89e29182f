import type { OrderLine } from "#server/models/order-line.ts";
import { today } from "#server/services/shop/today.ts";
import { estimateOrderShipDate } from "#shared/scheduling/estimate-order.ts";
import { acceptedLoad } from "./accepted-load.ts";

/** The ship date (ISO) that the present load allows for all blocks of an order that is not accepted yet. */
export async function proposeShipDate(lines: OrderLine[]): Promise<string> {
  const blocks = lines.map(({ quantity, build }) => ({
    quantity,
    minutes: build.minutes,
    leadDays: build.leadDays,
  }));
  return estimateOrderShipDate(blocks, await acceptedLoad(), await today());
}
