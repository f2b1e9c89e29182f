import Stripe from "stripe";

/** The payment service could not be reached, did not answer in time, or answered that it cannot serve now. Safe to ask again with the same key. */
export class GatewayUnavailable extends Error {
  override readonly name = "GatewayUnavailable";
}

/** The payment service understood and said no. Asking again with the same words will not help. */
export class GatewayRefused extends Error {
  override readonly name = "GatewayRefused";
  /** Stripe's error code (`charge_already_refunded`, `resource_missing` ...), or its error type where there is none. */
  readonly code: string;
  /** The bank's own reason, for a refused card. */
  readonly declineCode: string | null;
  readonly status: number | null;
  readonly requestId: string | null;

  constructor(refusal: {
    message: string;
    code: string;
    declineCode: string | null;
    status: number | null;
    requestId: string | null;
    cause?: unknown;
  }) {
    super(refusal.message, { cause: refusal.cause });
    this.code = refusal.code;
    this.declineCode = refusal.declineCode;
    this.status = refusal.status;
    this.requestId = refusal.requestId;
  }
}

/** The signature of a webhook does not match its bytes, or is too old. */
export class WebhookSignatureError extends Error {
  override readonly name = "WebhookSignatureError";
}

/** Runs one call of the SDK and turns its errors into the gateway's own. */
export async function callStripe<Answer>(call: () => Promise<Answer>): Promise<Answer> {
  try {
    return await call();
  } catch (error) {
    throw asGatewayError(error);
  }
}

function asGatewayError(error: unknown): unknown {
  if (!(error instanceof Stripe.errors.StripeError)) return error;
  const status = error.statusCode ?? null;
  const requestId = error.requestId ?? null;
  const mayTryAgain =
    error instanceof Stripe.errors.StripeConnectionError ||
    error instanceof Stripe.errors.StripeRateLimitError ||
    // 409: the first call with this key is still running.
    status === 409 ||
    // No status: the answer was not JSON, as from a broken proxy.
    status === null ||
    status >= 500;
  if (mayTryAgain) return new GatewayUnavailable(error.message, { cause: error });
  return new GatewayRefused({
    message: error.message,
    code: error.code ?? error.rawType ?? error.type,
    declineCode: error.decline_code ?? null,
    status,
    requestId,
    cause: error,
  });
}
