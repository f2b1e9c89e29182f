import { z } from "zod";
import { acceptOrderRequestSchema, type OrderReview } from "#shared/contracts/orders.ts";
import { readKept } from "#web/lib/kept.ts";

/** Lines that ask for something; each must be answered before the order is accepted. */
export function linesToAnswer(review: OrderReview): OrderReview["lines"] {
  return review.lines.filter((line) => line.specialRequest !== "");
}

/** The contract's schema, with what the server asks besides: a reason for another date, an answer to every request. */
export function acceptSchema(review: OrderReview) {
  return acceptOrderRequestSchema.superRefine((request, context) => {
    if (request.promisedShipOn !== review.proposedShipOn && request.dateReason === "") {
      context.addIssue({
        code: "custom",
        path: ["dateReason"],
        message: "The date differs from the estimate. Say why.",
      });
    }
    for (const line of linesToAnswer(review)) {
      if ((request.answers[line.id] ?? "") !== "") continue;
      context.addIssue({
        code: "custom",
        path: ["answers", line.id],
        message: `Answer the special request for ${line.build.summary}.`,
      });
    }
  });
}
export type AcceptFields = z.input<typeof acceptOrderRequestSchema>;

const keptSchema = z.object({
  /** Null while the date is the estimate's own, which moves from day to day. */
  promisedShipOn: z.string().nullable(),
  dateReason: z.string(),
  answers: z.record(z.string(), z.string()),
});

/** Under what name the answers that were typed for an order are kept in this tab. */
export function acceptKeptUnder(number: string): string {
  return `accept ${number}`;
}

/** What was typed before in this tab, else the estimate and empty answers. */
export function startingAcceptFields(
  review: OrderReview,
): AcceptFields & { answers: Record<string, string> } {
  const kept = readKept(acceptKeptUnder(review.number), keptSchema);
  const answers = linesToAnswer(review).map((line) => [line.id, kept?.answers[line.id] ?? ""] as const);
  return {
    promisedShipOn: kept?.promisedShipOn ?? review.proposedShipOn,
    dateReason: kept?.dateReason ?? "",
    answers: Object.fromEntries(answers),
  };
}
