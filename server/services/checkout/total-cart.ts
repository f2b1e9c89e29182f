import { createHash } from "node:crypto";
import { paymentGateway } from "#server/gateways/payment-gateway.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { readCart } from "#server/services/cart/read-cart.ts";
import { shopSettings } from "#server/services/shop/shop-settings.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { CartHolder } from "#server/services/cart/find-cart.ts";
import type { Address, Delivery } from "#shared/contracts/address.ts";
import type { CartView } from "#shared/contracts/cart.ts";
import type { Totals } from "#shared/contracts/checkout.ts";
import { quoteFreight } from "#shared/freight/freight.ts";
import { priceOrder } from "#shared/pricing/price-order.ts";
import type { PriceList } from "#shared/pricing/price-list.ts";
import { estimateOrderShipDate } from "#shared/scheduling/estimate-order.ts";

/** A cart with all that it costs, delivered, and who said what the tax is. */
export interface TotalledCart {
  cart: CartView;
  totals: Totals;
  taxLabel: string;
  taxCalculation: string;
  catalogueVersion: number;
  priceListVersion: number;
  /** Of the whole order, ISO. */
  estimatedShipOn: string;
}

/**
 * Prices the holder's cart anew and asks for its tax (a call to the outside: never within a transaction).
 * @throws Refusal conflict for an empty cart, build-refused when a line can no longer be made; GatewayUnavailable
 */
export async function totalCart(holder: CartHolder, delivery: Delivery): Promise<TotalledCart> {
  const cart = await readCart(holder);
  if (cart.refused.length > 0) {
    throw new Refusal(
      "build-refused",
      "A block in the cart can no longer be made as it stands. Open the cart to mend or remove it.",
    );
  }
  if (cart.lines.length === 0) throw new Refusal("conflict", "The cart is empty.");
  const { catalogue, priceList, load, today } = await currentContext();
  const freight = freightOf(priceList, delivery, cart.blocks);
  const address = delivery.method === "freight" ? delivery.address : await shopAddress();
  const lines = cart.lines.map((line) => ({ reference: line.id, amountCents: line.totalCents }));
  const tax = await paymentGateway.askTax({
    currency: "usd",
    lines,
    freightCents: freight,
    address,
    idempotencyKey: `tax-${hashOf({ lines, freight, address, on: new Date().toISOString().slice(0, 13) })}`,
  });
  return {
    cart,
    totals: priceOrder({
      lines: cart.lines.map(({ build, quantity }) => ({
        label: build.summary,
        quantity,
        unitCents: build.priceCents,
      })),
      delivery,
      freightCents: freight,
      tax: { label: tax.rateLabel, cents: tax.taxCents },
    }),
    taxLabel: tax.rateLabel,
    taxCalculation: tax.calculationId,
    catalogueVersion: catalogue.version,
    priceListVersion: priceList.version,
    estimatedShipOn: estimateOrderShipDate(
      cart.lines.map(({ quantity, build }) => ({
        quantity,
        minutes: build.minutes,
        leadDays: build.leadDays,
      })),
      load,
      today,
    ),
  };
}

async function shopAddress(): Promise<Address> {
  return (await shopSettings()).address;
}

/** @throws Refusal validation, with a path, where no rate is known */
function freightOf(priceList: PriceList, delivery: Delivery, blocks: number): number {
  if (delivery.method === "pick-up") return 0;
  const quote = quoteFreight(priceList, delivery.address.postalCode, blocks);
  if (!quote.ok) {
    const errors = [{ path: "delivery.address.postalCode", message: quote.message }];
    throw new Refusal("validation", "There is no freight to this address.", { errors });
  }
  return quote.cents;
}

/** A short fingerprint of plain data. */
export function hashOf(value: unknown): string {
  return createHash("sha256").update(JSON.stringify(value)).digest("hex");
}
