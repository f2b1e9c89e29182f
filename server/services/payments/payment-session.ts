import { GatewayRefused } from "#server/gateways/stripe.ts";
import type { Payment } from "#server/models/payment.ts";
import { openPayment } from "./open-payment.ts";

/** What an order's history says when its payment page has ended. */
export const NEVER_PAID = "The payment page ended without a payment; nothing was charged.";

/**
 * The checkout session of an unfinished payment; null when Stripe refuses to make one. Where a first call had made it,
 * the same key brings it back, so a refusal (such as an end that is too near by now) means that none was ever made.
 * @throws GatewayUnavailable
 */
export async function sessionOf(payment: Payment): Promise<string | null> {
  try {
    return (await openPayment(payment.id)).sessionId;
  } catch (error) {
    if (error instanceof GatewayRefused && payment.state === "opening") return null;
    throw error;
  }
}
