import { config } from "#server/config.ts";
import { createStripeGateway } from "./stripe.ts";

/** The process's one way to the payment service, as the environment names it. */
export const paymentGateway = createStripeGateway({
  secretKey: config.STRIPE_SECRET_KEY,
  webhookSecret: config.STRIPE_WEBHOOK_SECRET,
  apiOrigin: config.STRIPE_API_ORIGIN,
});
