import { transaction } from "#server/database/transaction.ts";
import { lockOrder } from "./lock-order.ts";

/** How long an order counts as open after the page last said so. The page says so every minute. */
export const OPEN_FOR = 3 * 60_000;

/**
 * Notes who has an order open, unless somebody else has it open right now. It only tells the others; it locks nothing.
 * @throws Refusal not-found
 */
export async function openOrder(number: string, personId: string): Promise<void> {
  await transaction(async () => {
    const order = await lockOrder({ number });
    const isOthers =
      order.openedBy !== null &&
      order.openedBy !== personId &&
      Date.now() - (order.openedAt?.getTime() ?? 0) < OPEN_FOR;
    if (!isOthers) await order.update({ openedBy: personId, openedAt: new Date() });
  });
}

/**
 * Notes that somebody has put an order down.
 * @throws Refusal not-found
 */
export async function closeOrder(number: string, personId: string): Promise<void> {
  await transaction(async () => {
    const order = await lockOrder({ number });
    if (order.openedBy === personId) await order.update({ openedBy: null, openedAt: null });
  });
}
