import { quoteFreight, type Delivery } from "../freight/freight.ts";
import type { Cents } from "../money/cents.ts";
import type { PricedBuild } from "./price-build.ts";
import type { PriceList } from "./price-list.ts";

/** One visible line of an order's total. */
export interface OrderPriceLine {
  kind: "block" | "freight" | "tax";
  label: string;
  quantity: number;
  unitCents: Cents;
  amountCents: Cents;
}

export interface PricedOrder {
  lines: OrderPriceLine[];
  goodsCents: Cents;
  freightCents: Cents;
  taxCents: Cents;
  totalCents: Cents;
  currency: PriceList["currency"];
}

export interface OrderToPrice {
  priceList: PriceList;
  /** Each build with its price per block (from `priceBuild`) and how many. */
  lines: readonly { label: string; unit: PricedBuild; quantity: number }[];
  delivery: Delivery;
  /** As answered by the tax gateway; 0 while it is not known. */
  taxCents: Cents;
}

/**
 * Total of an order in whole cents, one visible line for each step: blocks, freight, tax. The lines add up to the total.
 * Throws RangeError on an empty order, a quantity below one, a ZIP code that is none, or a negative tax.
 */
export function priceOrder({ priceList, lines, delivery, taxCents }: OrderToPrice): PricedOrder {
  if (lines.length === 0) throw new RangeError("an order needs at least one line");
  if (!Number.isSafeInteger(taxCents) || taxCents < 0)
    throw new RangeError(`${taxCents} is no amount of tax`);
  const priced: OrderPriceLine[] = lines.map(({ label, unit, quantity }) => {
    if (!Number.isSafeInteger(quantity) || quantity < 1)
      throw new RangeError(`${quantity} is no quantity of blocks`);
    return {
      kind: "block",
      label,
      quantity,
      unitCents: unit.totalCents,
      amountCents: unit.totalCents * quantity,
    };
  });
  const goodsCents = priced.reduce((total, line) => total + line.amountCents, 0);
  const blocks = lines.reduce((total, line) => total + line.quantity, 0);
  const freight = quoteFreight(priceList, delivery, blocks);
  if (!freight.ok) throw new RangeError(freight.message);
  priced.push({
    kind: "freight",
    label: freight.zone === null ? "Pick-up at the shop" : `Freight to ZIP codes ${freight.zone}xxxx`,
    quantity: blocks,
    unitCents: freight.perBlockCents,
    amountCents: freight.totalCents,
  });
  if (taxCents > 0)
    priced.push({ kind: "tax", label: "Sales tax", quantity: 1, unitCents: taxCents, amountCents: taxCents });
  return {
    lines: priced,
    goodsCents,
    freightCents: freight.totalCents,
    taxCents,
    totalCents: goodsCents + freight.totalCents + taxCents,
    currency: priceList.currency,
  };
}
