import type { Delivery } from "../contracts/address.ts";
import type { Totals } from "../contracts/checkout.ts";
import type { Cents } from "../money/cents.ts";

export interface OrderToPrice {
  /** Alike blocks at the price of one. */
  lines: readonly { label: string; quantity: number; unitCents: Cents }[];
  delivery: Delivery;
  freightCents: Cents;
  /** As the tax service named and answered it. */
  tax: { label: string; cents: Cents };
}

/**
 * Total of an order in whole cents, one visible line for each step: blocks, freight, tax. The lines add up to the total
 * by construction. Throws RangeError on an empty order, a quantity below one, a fraction of a cent, or less than nothing.
 */
export function priceOrder({ lines, delivery, freightCents, tax }: OrderToPrice): Totals {
  if (lines.length === 0) throw new RangeError("an order needs at least one line");
  requireWhole(freightCents, 0, "freight");
  requireWhole(tax.cents, 0, "tax");
  const blocks = lines.map(({ label, quantity, unitCents }) => {
    requireWhole(quantity, 1, "quantity");
    requireWhole(unitCents, 0, "price");
    return { kind: "block" as const, label, quantity, amountCents: unitCents * quantity };
  });
  const goodsCents = blocks.reduce((total, line) => total + line.amountCents, 0);
  return {
    currency: "USD",
    lines: [
      ...blocks,
      { kind: "freight", label: freightLabel(delivery), quantity: 1, amountCents: freightCents },
      { kind: "tax", label: tax.label, quantity: 1, amountCents: tax.cents },
    ],
    goodsCents,
    freightCents,
    taxCents: tax.cents,
    totalCents: goodsCents + freightCents + tax.cents,
  };
}

function freightLabel(delivery: Delivery): string {
  if (delivery.method === "pick-up") return "Pick-up at the shop";
  return `Freight to ${delivery.address.state} ${delivery.address.postalCode.slice(0, 5)}`;
}

function requireWhole(figure: number, least: number, what: string): void {
  if (!Number.isSafeInteger(figure) || figure < least) {
    throw new RangeError(`${what}: ${figure} is not a whole number of at least ${least}`);
  }
}
