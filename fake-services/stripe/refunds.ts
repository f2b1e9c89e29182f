import { z } from "zod";
import type { Endpoint } from "./endpoint.ts";
import { invalidRequest, noSuchRecord } from "./errors.ts";
import { newId } from "./identifiers.ts";
import { listPage, newestFirst } from "./lists.ts";
import { integer, listParameters, metadataParameter, parseParameters, text } from "./parameters.ts";
import type { Charge, Refund } from "./records.ts";
import { recordEvent, type Work } from "./work.ts";

const expand = z.array(text).optional();

const createParameters = z.strictObject({
  payment_intent: text.optional(),
  charge: text.optional(),
  amount: integer.pipe(z.number().min(1)).optional(),
  reason: z.enum(["requested_by_customer", "duplicate", "fraudulent"]).optional(),
  metadata: metadataParameter.optional(),
  expand,
});

export const refundEndpoints: Endpoint[] = [
  {
    method: "post",
    path: "/refunds",
    run: (work, { parameters }) => create(work, parseParameters(createParameters, parameters)),
  },
  {
    method: "get",
    path: "/refunds",
    run(work, { parameters }) {
      const schema = z.strictObject({
        ...listParameters,
        charge: text.optional(),
        payment_intent: text.optional(),
        expand,
      });
      const request = parseParameters(schema, parameters);
      const refunds = newestFirst(work.state.refunds).filter(
        (refund) =>
          (request.charge === undefined || refund.charge === request.charge) &&
          (request.payment_intent === undefined || refund.payment_intent === request.payment_intent),
      );
      return listPage(refunds, request, "/v1/refunds");
    },
  },
  {
    method: "get",
    path: "/refunds/:id",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({ expand }), parameters);
      const refund = work.state.refunds[id];
      if (refund === undefined) throw noSuchRecord("refund", id);
      return refund;
    },
  },
];

function create(work: Work, request: z.output<typeof createParameters>): Refund {
  const charge = chargeFor(work, request);
  const left = charge.amount_captured - charge.amount_refunded;
  if (left === 0) {
    throw invalidRequest(`Charge ${charge.id} has already been refunded`, {
      code: "charge_already_refunded",
    });
  }
  const amount = request.amount ?? left;
  if (amount > left) {
    throw invalidRequest(`A refund of ${amount} is more than the ${left} that are left on the charge`, {
      code: "amount_too_large",
      param: "amount",
    });
  }
  const refund: Refund = {
    id: newId("re"),
    object: "refund",
    amount,
    charge: charge.id,
    created: work.now,
    currency: charge.currency,
    customer: null,
    metadata: request.metadata ?? {},
    payment_intent: charge.payment_intent,
    reason: request.reason ?? null,
    receipt_number: null,
    status: "succeeded",
  };
  const refundedBefore = charge.amount_refunded;
  work.state.refunds[refund.id] = refund;
  charge.amount_refunded += amount;
  charge.refunded = charge.amount_refunded === charge.amount_captured;
  recordEvent(work, "refund.created", refund);
  recordEvent(work, "charge.refunded", charge, {
    amount_refunded: refundedBefore,
    ...(charge.refunded ? { refunded: false } : {}),
  });
  recordEvent(work, "refund.updated", refund, {});
  return refund;
}

function chargeFor(work: Work, request: z.output<typeof createParameters>): Charge {
  if (request.charge !== undefined) {
    const charge = work.state.charges[request.charge];
    if (charge === undefined) throw noSuchRecord("charge", request.charge, "charge");
    return captured(charge, request.charge);
  }
  if (request.payment_intent === undefined) {
    throw invalidRequest("Missing required parameter: payment_intent or charge", {
      code: "parameter_missing",
      param: "payment_intent",
      beforeWork: true,
    });
  }
  const intent = work.state.intents[request.payment_intent];
  if (intent === undefined) throw noSuchRecord("payment_intent", request.payment_intent, "payment_intent");
  const charge = intent.latest_charge === null ? undefined : work.state.charges[intent.latest_charge];
  return captured(charge, intent.id);
}

function captured(charge: Charge | undefined, id: string): Charge {
  if (charge?.paid) return charge;
  throw invalidRequest(`${id} has no successful charge to refund`, {
    code: "payment_intent_unexpected_state",
  });
}
