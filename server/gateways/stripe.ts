import Stripe from "stripe";
import {
  type CheckoutExpiry,
  type CheckoutRequest,
  type CheckoutSession,
  expireCheckoutSession,
  openCheckoutSession,
  type OpenedCheckoutSession,
  readCheckoutSession,
} from "./stripe/checkout.ts";
import { refund, type RefundAnswer, type RefundRequest } from "./stripe/refunds.ts";
import { askTax, type TaxAnswer, type TaxQuestion } from "./stripe/tax.ts";
import { readWebhook, type StripeEvent } from "./stripe/webhook.ts";

export type { CheckoutRequest, CheckoutSession } from "./stripe/checkout.ts";
export { GatewayRefused, GatewayUnavailable, WebhookSignatureError } from "./stripe/errors.ts";
export type { RefundAnswer } from "./stripe/refunds.ts";
export type { StripeEvent } from "./stripe/webhook.ts";

export interface StripeSettings {
  secretKey: string;
  webhookSecret: string;
  /** Left out: the real service. Set: a stand-in of ours, such as http://127.0.0.1:4801. */
  apiOrigin?: string | undefined;
  /** How long one try may take; 10 s if left out. */
  timeoutMilliseconds?: number | undefined;
}

/** Every method may throw GatewayUnavailable or GatewayRefused; `readWebhook` throws WebhookSignatureError. */
export interface StripeGateway {
  askTax(question: TaxQuestion): Promise<TaxAnswer>;
  openCheckoutSession(request: CheckoutRequest): Promise<OpenedCheckoutSession>;
  readCheckoutSession(sessionId: string): Promise<CheckoutSession>;
  expireCheckoutSession(sessionId: string): Promise<CheckoutExpiry>;
  refund(request: RefundRequest): Promise<RefundAnswer>;
  readWebhook(rawBody: Buffer, signature: string, receivedAt?: Date): StripeEvent;
}

const TIMEOUT_MILLISECONDS = 10_000;
const RETRIES = 2;

/** Makes the one way to the payment service. Opens no connection by itself. */
export function createStripeGateway(settings: StripeSettings): StripeGateway {
  const stripe = new Stripe(settings.secretKey, {
    timeout: settings.timeoutMilliseconds ?? TIMEOUT_MILLISECONDS,
    maxNetworkRetries: RETRIES,
    telemetry: false,
    ...addressOf(settings.apiOrigin),
  });
  return {
    askTax: (question) => askTax(stripe, question),
    openCheckoutSession: (request) => openCheckoutSession(stripe, request),
    readCheckoutSession: (sessionId) => readCheckoutSession(stripe, sessionId),
    expireCheckoutSession: (sessionId) => expireCheckoutSession(stripe, sessionId),
    refund: (request) => refund(stripe, request),
    readWebhook: (rawBody, signature, receivedAt) =>
      readWebhook(stripe, settings.webhookSecret, rawBody, signature, receivedAt),
  };
}

function addressOf(apiOrigin: string | undefined): Pick<Stripe.StripeConfig, "host" | "port" | "protocol"> {
  if (apiOrigin === undefined) return {};
  const { hostname, port, protocol } = new URL(apiOrigin);
  const scheme = protocol === "https:" ? "https" : "http";
  return { host: hostname, port: port === "" ? (scheme === "https" ? 443 : 80) : port, protocol: scheme };
}
