import type Stripe from "stripe";
import { callStripe } from "./errors.ts";

interface TaxAddress {
  line1: string;
  line2?: string | undefined;
  city: string;
  /** Two letters. */
  state: string;
  postalCode: string;
  country: "US";
}

export interface TaxQuestion {
  currency: string;
  /** Amounts are those of the whole line, in cents, without tax. References must differ. */
  lines: { reference: string; amountCents: number }[];
  freightCents: number;
  address: TaxAddress;
  idempotencyKey?: string | undefined;
}

export interface TaxAnswer {
  calculationId: string;
  taxCents: number;
  /** "TN sales tax 7 %" or "OR: no sales tax". */
  rateLabel: string;
  /** After this the calculation can no longer be committed with a payment. */
  expiresAt: Date | null;
}

/** Stripe's codes for tangible goods and for shipping (from memory). */
const GOODS = "txcd_99999999";
const SHIPPING = "txcd_92010001";

/**
 * Asks what tax an order owes. Cents in, cents out.
 * @throws GatewayUnavailable, GatewayRefused
 */
export async function askTax(stripe: Stripe, question: TaxQuestion): Promise<TaxAnswer> {
  const { address } = question;
  const calculation = await callStripe(() =>
    stripe.tax.calculations.create(
      {
        currency: question.currency,
        line_items: question.lines.map((line) => ({
          amount: line.amountCents,
          reference: line.reference,
          tax_behavior: "exclusive",
          tax_code: GOODS,
        })),
        shipping_cost: { amount: question.freightCents, tax_behavior: "exclusive", tax_code: SHIPPING },
        customer_details: {
          address: {
            line1: address.line1,
            ...(address.line2 ? { line2: address.line2 } : {}),
            city: address.city,
            state: address.state,
            postal_code: address.postalCode,
            country: address.country,
          },
          address_source: "shipping",
        },
        expand: ["line_items.data.tax_breakdown"],
      },
      question.idempotencyKey === undefined ? {} : { idempotencyKey: question.idempotencyKey },
    ),
  );
  if (calculation.id === null) throw new Error("the tax calculation came back without an id");
  return {
    calculationId: calculation.id,
    taxCents: calculation.tax_amount_exclusive,
    rateLabel: rateLabel(address.state, ratesOf(calculation)),
    expiresAt: calculation.expires_at === null ? null : new Date(calculation.expires_at * 1000),
  };
}

/** The rates that apply to the first line, one for each place that taxes it (state, county, city ...). */
function ratesOf(calculation: Stripe.Tax.Calculation): string[] {
  const breakdown = calculation.line_items?.data[0]?.tax_breakdown ?? [];
  return breakdown.flatMap((part) =>
    part.tax_rate_details === null ? [] : [part.tax_rate_details.percentage_decimal],
  );
}

function rateLabel(state: string, rates: string[]): string {
  const total = sumOfDecimals(rates);
  return total === "0" ? `${state}: no sales tax` : `${state} sales tax ${total} %`;
}

/** Adds decimals such as "7" and "2.25" exactly; up to six places. */
function sumOfDecimals(decimals: string[]): string {
  const millionths = decimals.reduce((sum, decimal) => {
    const [whole = "0", fraction = ""] = decimal.split(".");
    return sum + BigInt(whole) * 1_000_000n + BigInt(fraction.slice(0, 6).padEnd(6, "0"));
  }, 0n);
  const fraction = (millionths % 1_000_000n).toString().padStart(6, "0").replace(/0+$/, "");
  const whole = (millionths / 1_000_000n).toString();
  return fraction === "" ? whole : `${whole}.${fraction}`;
}
