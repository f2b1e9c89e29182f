import { z } from "zod";
import { formatCents } from "#shared/money/cents.ts";
import type { LetterPart } from "./letter.ts";

/** What every message about an order is written from. */
export const orderEmailSchema = z.object({
  orderNumber: z.string(),
  name: z.string(),
  lines: z.array(
    z.object({
      summary: z.string(),
      specCode: z.string(),
      quantity: z.int(),
      totalCents: z.int(),
      weight: z.number(),
      specialRequest: z.string(),
      specialRequestAnswer: z.string(),
    }),
  ),
  goodsCents: z.int(),
  freightCents: z.int(),
  taxCents: z.int(),
  taxLabel: z.string(),
  totalCents: z.int(),
  pickUp: z.boolean(),
  estimatedShipOn: z.iso.date(),
  promisedShipOn: z.iso.date().nullable(),
  declineReason: z.string().nullable(),
});
export type OrderEmailData = z.infer<typeof orderEmailSchema>;

export type OrderEmailKind =
  "order-placed" | "order-accepted" | "order-declined" | "payment-returned" | "order-link";

/** Each block with its spec code and amount. */
export function blockRows(data: OrderEmailData): LetterPart {
  return {
    part: "rows",
    rows: data.lines.map((line) => [
      `${line.quantity} x ${line.summary} (spec code ${line.specCode})`,
      formatCents(line.totalCents),
    ]),
  };
}

/** What was paid, line by line. */
export function totalRows(data: OrderEmailData): LetterPart {
  return {
    part: "rows",
    rows: [
      ["Blocks", formatCents(data.goodsCents)],
      [data.pickUp ? "Pick-up at the shop" : "Freight", formatCents(data.freightCents)],
      [data.taxLabel, formatCents(data.taxCents)],
      ["Total paid", formatCents(data.totalCents)],
    ],
  };
}

/** The one-line warning that goes with every block on its way to somebody. */
export function liftingCaution(data: OrderEmailData): LetterPart {
  const heaviest = Math.ceil(Math.max(...data.lines.map((line) => line.weight)));
  const arrival = data.pickUp
    ? "Bring a vehicle and straps rated for it."
    : "It arrives on a pallet by freight.";
  return {
    part: "caution",
    text: `A bare block weighs about ${heaviest} lb. ${arrival} Lift it with a hoist and stand rated for the load, never by hand.`,
  };
}
