import type Stripe from "stripe";
import { beforeAll, describe, expect, it } from "vitest";
import { demoStateTaxRates } from "#fake-services/stripe/state-tax-rates.ts";
import { taxOf } from "#fake-services/stripe/tax-calculations.ts";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import { errorOf, sdk } from "./stripe-calls.ts";

let fake: FakeStripe;

beforeAll(async () => {
  fake = await startFakeStripe();
});

function ask(
  state: string,
  amounts: number[],
  more: Partial<Stripe.Tax.CalculationCreateParams> = {},
): Promise<Stripe.Response<Stripe.Tax.Calculation>> {
  return sdk(fake).tax.calculations.create({
    currency: "usd",
    line_items: amounts.map((amount, place) => ({ amount, reference: `line ${String(place)}` })),
    customer_details: { address: { country: "US", state, postal_code: "37000" }, address_source: "shipping" },
    ...more,
  });
}

describe("tax of one amount", () => {
  // Worked by hand: exact products, a half goes up.
  it.each([
    [150, "7", 11], // 10.5
    [149, "7", 10], // 10.43
    [1000, "6.625", 66], // 66.25
    [120, "6.875", 8], // 8.25
    [1000, "4.25", 43], // 42.5
    [99_999_999, "7.25", 7_250_000], // 7249999.9275
    [0, "7", 0],
    [12_345, "0", 0],
  ])("%i cents at %s %% is %i", (cents, percent, tax) => {
    expect(taxOf(cents, percent)).toBe(tax);
  });
});

describe("tax calculations", () => {
  it("round each line by itself and tax the freight", async () => {
    const answer = await ask("TN", [150, 150, 150], { shipping_cost: { amount: 1000 } });
    // Three times 10.5 is 33 by line, not 32 by the sum of 450.
    expect(answer).toMatchObject({ tax_amount_exclusive: 33 + 70, amount_total: 450 + 1000 + 103 });
    expect(answer.shipping_cost).toMatchObject({ amount: 1000, amount_tax: 70 });
    expect(answer.tax_breakdown).toMatchObject([
      { amount: 103, taxable_amount: 1450, tax_rate_details: { percentage_decimal: "7", state: "TN" } },
    ]);
    const lines = await sdk(fake).tax.calculations.listLineItems(answer.id ?? "");
    expect(lines.data.map((line) => [line.reference, line.amount_tax])).toEqual([
      ["line 0", 11],
      ["line 1", 11],
      ["line 2", 11],
    ]);
    expect(await sdk(fake).tax.calculations.retrieve(answer.id ?? "")).toEqual(answer);
  });

  it("shows the lines and their taxes only when asked", async () => {
    expect((await ask("TN", [100])).line_items).toBeUndefined();
    const lines = await ask("TN", [100], { expand: ["line_items"] });
    expect(lines.line_items?.data[0]?.tax_breakdown).toBeUndefined();
    const taxes = await ask("TN", [100], { expand: ["line_items.data.tax_breakdown"] });
    expect(taxes.line_items?.data[0]?.tax_breakdown).toMatchObject([
      { amount: 7, jurisdiction: { state: "TN" } },
    ]);
  });

  it("ask nothing of who is exempt or lives where there is no sales tax", async () => {
    const exempt = await ask("TN", [10_000], {
      customer_details: { address: { country: "US", state: "TN" }, taxability_override: "customer_exempt" },
    });
    expect(exempt).toMatchObject({
      tax_amount_exclusive: 0,
      tax_breakdown: [{ taxability_reason: "customer_exempt" }],
    });
    expect((await ask("MT", [10_000])).tax_amount_exclusive).toBe(0);
  });

  it("refuse a state that is not known, and one reference for two lines", async () => {
    expect(await errorOf(ask("ZZ", [100]))).toMatchObject({ code: "customer_tax_location_invalid" });
    const twice = [
      { amount: 1, reference: "same" },
      { amount: 2, reference: "same" },
    ];
    expect(await errorOf(ask("TN", [1], { line_items: twice }))).toMatchObject({ param: "line_items" });
  });

  it("have a demo rate for each state and the capital's district", () => {
    expect(Object.keys(demoStateTaxRates)).toHaveLength(51);
    // Five states levy no state sales tax: from memory.
    const free = Object.entries(demoStateTaxRates).filter(([, rate]) => rate === "0");
    expect(free.map(([state]) => state).sort()).toEqual(["AK", "DE", "MT", "NH", "OR"]);
    for (const rate of Object.values(demoStateTaxRates)) expect(rate).toMatch(/^\d{1,2}(\.\d{1,3})?$/);
  });
});
