import { paymentGateway } from "#server/gateways/payment-gateway.ts";
import { type StripeEvent, WebhookSignatureError } from "#server/gateways/stripe.ts";
import { Refusal } from "#server/services/refusal.ts";
import { receiveStripeEvent } from "./receive-stripe-event.ts";

/**
 * Checks a webhook's signature over its raw bytes and acts on it.
 * @returns what came of it
 * @throws Refusal bad-signature; whatever acting throws, so that Stripe sends it again
 */
export async function receiveWebhook(rawBody: Buffer, signature: string): Promise<string> {
  return receiveStripeEvent(verified(rawBody, signature));
}

function verified(rawBody: Buffer, signature: string): StripeEvent {
  try {
    return paymentGateway.readWebhook(rawBody, signature);
  } catch (error) {
    if (error instanceof WebhookSignatureError)
      throw new Refusal("bad-signature", "Sign the bytes as they are sent, with the secret of this address.");
    throw error;
  }
}
