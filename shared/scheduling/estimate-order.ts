import { workCentreSchema, type WorkCentre } from "../catalogue/catalogue.ts";
import { estimateShipDate, type Load } from "./estimate.ts";

/** Alike blocks of one order line. */
export interface BlocksToMake {
  /** Minutes of one block at each work centre. */
  minutes: Partial<Record<WorkCentre, number>>;
  leadDays: number;
  quantity: number;
}

/**
 * Estimated ship date (ISO) of a whole order: each line stands behind the load and the lines before it, and the order
 * ships when its last block is ready. Throws RangeError for an order without lines and as `estimateShipDate` does.
 */
export function estimateOrderShipDate(lines: readonly BlocksToMake[], load: Load, today: string): string {
  if (lines.length === 0) throw new RangeError("an order without lines has no ship date");
  let ahead = load;
  let latest = today;
  for (const { minutes, leadDays, quantity } of lines) {
    const ready = estimateShipDate({ minutes, leadDays, quantity, load: ahead, today });
    if (ready > latest) latest = ready;
    ahead = { minutes: addWork(ahead.minutes, minutes, quantity) };
  }
  return latest;
}

function addWork(
  ahead: Load["minutes"],
  minutes: BlocksToMake["minutes"],
  quantity: number,
): Load["minutes"] {
  const sum = { ...ahead };
  for (const centre of workCentreSchema.options) {
    sum[centre] = (sum[centre] ?? 0) + (minutes[centre] ?? 0) * quantity;
  }
  return sum;
}
