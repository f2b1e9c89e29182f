import express, { Router } from "express";
import { receiveWebhook } from "#server/services/payments/receive-webhook.ts";

/**
 * Stripe's door. Mounted before session and JSON parsing: the signature is over the bytes as they came, and it is the
 * only permission that counts here.
 */
export const stripeWebhookRouter = Router();

stripeWebhookRouter.post(
  "/api/stripe-webhook",
  express.raw({ type: () => true, limit: "1mb" }),
  async (request, response) => {
    const body: unknown = request.body;
    const outcome = await receiveWebhook(
      Buffer.isBuffer(body) ? body : Buffer.alloc(0),
      request.get("stripe-signature") ?? "",
    );
    if (outcome === "does not match")
      request.log.error({ outcome }, "an event of Stripe fits no payment of ours");
    response.json({ received: true, outcome });
  },
);
