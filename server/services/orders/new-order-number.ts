import { randomInt } from "node:crypto";
import { makeOrderNumber } from "#shared/orders/order-number.ts";

/** A fresh order number. 31^7 of them: a clash is left to the unique constraint, and the transaction runs again. */
export function newOrderNumber(): string {
  return makeOrderNumber(Array.from({ length: 7 }, () => randomInt(31)));
}
