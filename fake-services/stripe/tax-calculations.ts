import { z } from "zod";
import type { Endpoint } from "./endpoint.ts";
import { invalidRequest, noSuchRecord } from "./errors.ts";
import { newId } from "./identifiers.ts";
import { listPage } from "./lists.ts";
import { amount, integer, listParameters, metadataParameter, parseParameters, text } from "./parameters.ts";
import type { Calculation, CalculationLine, LineTax } from "./records.ts";
import { demoStateTaxRates } from "./state-tax-rates.ts";
import type { Work } from "./work.ts";

const KEPT_SECONDS = 90 * 24 * 60 * 60;
const GOODS = "txcd_99999999";
const SHIPPING = "txcd_92010001";

const expand = z.array(text).optional();
const taxBehavior = z.literal("exclusive").default("exclusive");

const createParameters = z.strictObject({
  currency: z.string().regex(/^[a-z]{3}$/i),
  line_items: z
    .array(
      z.strictObject({
        amount,
        reference: text.optional(),
        quantity: integer.pipe(z.number().min(1)).default(1),
        tax_behavior: taxBehavior,
        tax_code: text.default(GOODS),
        metadata: metadataParameter.optional(),
      }),
    )
    .min(1)
    .max(1000),
  shipping_cost: z
    .strictObject({ amount, tax_behavior: taxBehavior, tax_code: text.default(SHIPPING) })
    .optional(),
  customer_details: z.strictObject({
    address: z.strictObject({
      line1: z.string().optional(),
      line2: z.string().optional(),
      city: z.string().optional(),
      state: text,
      postal_code: z.string().optional(),
      country: text,
    }),
    address_source: z.enum(["shipping", "billing"]).optional(),
    taxability_override: z.enum(["none", "customer_exempt"]).default("none"),
  }),
  expand,
});

type Request = z.output<typeof createParameters>;

export const taxCalculationEndpoints: Endpoint[] = [
  {
    method: "post",
    path: "/tax/calculations",
    run: (work, { parameters }) => calculate(work, parseParameters(createParameters, parameters)),
  },
  {
    method: "get",
    path: "/tax/calculations/:id",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({ expand }), parameters);
      return findCalculation(work, id);
    },
  },
  {
    method: "get",
    path: "/tax/calculations/:id/line_items",
    run(work, { id, parameters }) {
      const request = parseParameters(z.strictObject({ ...listParameters, expand }), parameters);
      findCalculation(work, id);
      return listPage(calculationLinesOf(work, id), request, `/v1/tax/calculations/${id}/line_items`);
    },
  },
];

/**
 * Tax of one amount in cents at a rate in percent with up to three decimals, in integers; half a
 * cent goes up.
 */
export function taxOf(amountCents: number, percent: string): number {
  const [whole = "0", fraction = ""] = percent.split(".");
  const thousandths = BigInt(whole) * 1000n + BigInt(fraction.padEnd(3, "0"));
  return Number((BigInt(amountCents) * thousandths + 50_000n) / 100_000n);
}

export function calculationLinesOf(work: Work, id: string): CalculationLine[] {
  return work.state.calculationLines[id] ?? [];
}

function findCalculation(work: Work, id: string): Calculation {
  const calculation = work.state.calculations[id];
  if (calculation === undefined || calculation.expires_at <= work.now) {
    throw noSuchRecord("tax calculation", id, "calculation");
  }
  return calculation;
}

function calculate(work: Work, request: Request): Calculation {
  const state = stateOf(request);
  const percent = demoStateTaxRates[state] ?? "0";
  const exempt = request.customer_details.taxability_override === "customer_exempt";
  const taxed = (cents: number): LineTax => lineTax(cents, state, percent, exempt);
  const lines = request.line_items.map((line, place) => calculationLine(line, place, taxed(line.amount)));
  refuseRepeatedReferences(lines);
  const shipping = request.shipping_cost && {
    cost: request.shipping_cost,
    tax: taxed(request.shipping_cost.amount),
  };
  const taxes = [...lines.flatMap((line) => line.tax_breakdown), ...(shipping ? [shipping.tax] : [])];
  const tax = taxes.reduce((sum, part) => sum + part.amount, 0);
  const goods = lines.reduce((sum, line) => sum + line.amount, 0);
  const { address, address_source: source, taxability_override: override } = request.customer_details;
  const calculation: Calculation = {
    id: newId("taxcalc", 16),
    object: "tax.calculation",
    amount_total: goods + (shipping?.cost.amount ?? 0) + tax,
    currency: request.currency.toLowerCase(),
    customer: null,
    customer_details: {
      address: {
        line1: address.line1 ?? null,
        line2: address.line2 ?? null,
        city: address.city ?? null,
        state: address.state,
        postal_code: address.postal_code ?? null,
        country: address.country,
      },
      address_source: source ?? null,
      ip_address: null,
      tax_ids: [],
      taxability_override: override,
    },
    expires_at: work.now + KEPT_SECONDS,
    livemode: false,
    ship_from_details: null,
    shipping_cost: shipping
      ? {
          amount: shipping.cost.amount,
          amount_tax: shipping.tax.amount,
          tax_behavior: "exclusive",
          tax_breakdown: [shipping.tax],
          tax_code: shipping.cost.tax_code,
        }
      : null,
    tax_amount_exclusive: tax,
    tax_amount_inclusive: 0,
    tax_breakdown: [breakdownOf(taxes, state, percent)],
    tax_date: work.now,
  };
  work.state.calculations[calculation.id] = calculation;
  work.state.calculationLines[calculation.id] = lines;
  return calculation;
}

function stateOf(request: Request): string {
  const { country, state } = request.customer_details.address;
  if (country === "US" && demoStateTaxRates[state] !== undefined) return state;
  throw invalidRequest("This address is in no state that is known here", {
    code: "customer_tax_location_invalid",
    param: "customer_details[address]",
  });
}

function refuseRepeatedReferences(lines: CalculationLine[]): void {
  if (new Set(lines.map((line) => line.reference)).size === lines.length) return;
  throw invalidRequest("Each line needs a reference of its own", { param: "line_items", beforeWork: true });
}

function calculationLine(line: Request["line_items"][number], place: number, tax: LineTax): CalculationLine {
  return {
    id: newId("tax_li", 16),
    object: "tax.calculation_line_item",
    amount: line.amount,
    amount_tax: tax.amount,
    livemode: false,
    metadata: line.metadata ?? null,
    product: null,
    quantity: line.quantity,
    reference: line.reference ?? `L${place + 1}`,
    tax_behavior: line.tax_behavior,
    tax_breakdown: [tax],
    tax_code: line.tax_code,
  };
}

function lineTax(cents: number, state: string, percent: string, exempt: boolean): LineTax {
  const rated = percent !== "0" && !exempt;
  return {
    amount: rated ? taxOf(cents, percent) : 0,
    jurisdiction: { country: "US", display_name: state, level: "state", state },
    sourcing: "destination",
    tax_rate_details: rated
      ? { display_name: "Sales tax (demo rate)", percentage_decimal: percent, tax_type: "sales_tax" }
      : null,
    taxability_reason: exempt ? "customer_exempt" : rated ? "standard_rated" : "not_subject_to_tax",
    taxable_amount: rated ? cents : 0,
  };
}

function breakdownOf(taxes: LineTax[], state: string, percent: string): Calculation["tax_breakdown"][number] {
  const reason = taxes[0]?.taxability_reason ?? "not_subject_to_tax";
  const rated = reason === "standard_rated";
  return {
    amount: taxes.reduce((sum, part) => sum + part.amount, 0),
    inclusive: false,
    tax_rate_details: {
      country: "US",
      flat_amount: null,
      percentage_decimal: rated ? percent : "0.0",
      rate_type: rated ? "percentage" : null,
      state,
      tax_type: rated ? "sales_tax" : null,
    },
    taxability_reason: reason,
    taxable_amount: taxes.reduce((sum, part) => sum + part.taxable_amount, 0),
  };
}
