import { z } from "zod";
import type { Endpoint } from "./endpoint.ts";
import { noSuchRecord } from "./errors.ts";
import { listPage, newestFirst } from "./lists.ts";
import { listParameters, parseParameters, text } from "./parameters.ts";

const expand = z.array(text).optional();

export const paymentEndpoints: Endpoint[] = [
  {
    method: "get",
    path: "/payment_intents",
    run(work, { parameters }) {
      const request = parseParameters(z.strictObject({ ...listParameters, expand }), parameters);
      return listPage(newestFirst(work.state.intents), request, "/v1/payment_intents");
    },
  },
  {
    method: "get",
    path: "/payment_intents/:id",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({ expand, client_secret: text.optional() }), parameters);
      const intent = work.state.intents[id];
      if (intent === undefined) throw noSuchRecord("payment_intent", id, "intent");
      return intent;
    },
  },
  {
    method: "get",
    path: "/charges",
    run(work, { parameters }) {
      const schema = z.strictObject({ ...listParameters, payment_intent: text.optional(), expand });
      const request = parseParameters(schema, parameters);
      const charges = newestFirst(work.state.charges).filter(
        (charge) => request.payment_intent === undefined || charge.payment_intent === request.payment_intent,
      );
      return listPage(charges, request, "/v1/charges");
    },
  },
  {
    method: "get",
    path: "/charges/:id",
    run(work, { id, parameters }) {
      parseParameters(z.strictObject({ expand }), parameters);
      const charge = work.state.charges[id];
      if (charge === undefined) throw noSuchRecord("charge", id);
      return charge;
    },
  },
];
