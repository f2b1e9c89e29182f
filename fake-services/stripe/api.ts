import { timingSafeEqual } from "node:crypto";
import express, { type Request, type Response, Router } from "express";
import { z } from "zod";
import { checkoutSessionEndpoints } from "./checkout-sessions.ts";
import type { Endpoint } from "./endpoint.ts";
import { ApiError, type ApiErrorDetails, errorBody, invalidRequest } from "./errors.ts";
import { eventEndpoints } from "./event-log.ts";
import { expanded } from "./expand.ts";
import { parseForm } from "./form-body.ts";
import { fingerprintOf } from "./idempotency.ts";
import { newId } from "./identifiers.ts";
import { paymentEndpoints } from "./payment-intents.ts";
import { refundEndpoints } from "./refunds.ts";
import type { FakeStripe } from "./service.ts";
import { taxCalculationEndpoints } from "./tax-calculations.ts";
import { API_VERSION } from "./work.ts";

interface Answer {
  status: number;
  body: Record<string, unknown>;
  headers?: Record<string, string>;
  lost?: boolean;
}

const endpoints: Endpoint[] = [
  ...checkoutSessionEndpoints,
  ...paymentEndpoints,
  ...refundEndpoints,
  ...taxCalculationEndpoints,
  ...eventEndpoints,
];

/** The v1 API. */
export function apiRoutes(fake: FakeStripe): Router {
  const router = Router();
  router.use(express.text({ type: "application/x-www-form-urlencoded", limit: "1mb" }));
  for (const endpoint of endpoints) {
    router[endpoint.method](endpoint.path, (request, response) => serve(fake, endpoint, request, response));
  }
  router.use((request, response) => {
    const requestId = newId("req", 14);
    const details = invalidRequest(`There is nothing at ${request.method} ${request.originalUrl}`, {
      status: 404,
    }).details;
    send(request, response, requestId, { status: 404, body: { ...errorBody(details, requestId) } });
  });
  return router;
}

async function serve(
  fake: FakeStripe,
  endpoint: Endpoint,
  request: Request,
  response: Response,
): Promise<void> {
  const requestId = newId("req", 14);
  const gone = new AbortController();
  response.on("close", () => {
    gone.abort();
  });
  const answer = await answerTo(fake, endpoint, request, requestId, gone.signal);
  if (answer === undefined || gone.signal.aborted) return;
  if (answer.lost) {
    response.destroy();
    return;
  }
  send(request, response, requestId, answer);
}

/** Does the work, or answers what it came to before. Undefined when the caller left while it hung. */
async function answerTo(
  fake: FakeStripe,
  endpoint: Endpoint,
  request: Request,
  requestId: string,
  gone: AbortSignal,
): Promise<Answer | undefined> {
  const body = typeof request.body === "string" ? request.body : "";
  const key = endpoint.method === "post" ? (request.get("idempotency-key") ?? null) : null;
  const fingerprint = fingerprintOf(endpoint.method, request.path, body);
  try {
    authenticate(fake, request);
    const stored = key === null ? undefined : fake.idempotency.begin(key, fingerprint);
    if (stored !== undefined) {
      return {
        status: stored.status,
        body: stored.body,
        headers: { "Idempotent-Replayed": "true", "Original-Request": stored.requestId },
      };
    }
  } catch (error) {
    return refusal(error, requestId);
  }
  const answer = await workFor(fake, endpoint, request, body, { id: requestId, idempotency_key: key }, gone);
  if (key !== null) {
    if (answer === undefined || answer.beforeWork) fake.idempotency.forget(key);
    else fake.idempotency.keep(key, fingerprint, { status: answer.status, body: answer.body, requestId });
  }
  if (endpoint.method === "post") fake.commit();
  else fake.commitEvents();
  return answer;
}

async function workFor(
  fake: FakeStripe,
  endpoint: Endpoint,
  request: Request,
  body: string,
  origin: { id: string; idempotency_key: string | null },
  gone: AbortSignal,
): Promise<(Answer & { beforeWork: boolean }) | undefined> {
  let lost = false;
  try {
    lost = (await fake.faults.pass(`/v1${request.path}`, gone)).loseAnswer;
    if (gone.aborted) return undefined;
    const query = request.originalUrl.split("?")[1] ?? "";
    const parameters = parseForm(endpoint.method === "post" ? body : query);
    const work = fake.work(origin);
    const record = endpoint.run(work, { id: String(request.params["id"] ?? ""), parameters });
    const paths = z.array(z.string()).catch([]).parse(parameters["expand"]);
    return { status: 200, body: expanded(work, record, paths), lost, beforeWork: false };
  } catch (error) {
    return { ...refusal(error, origin.id), lost };
  }
}

function refusal(error: unknown, requestId: string): Answer & { beforeWork: boolean } {
  const details = detailsOf(error);
  return {
    status: details.status,
    body: { ...errorBody(details, requestId) },
    beforeWork: details.beforeWork ?? false,
  };
}

function detailsOf(error: unknown): ApiErrorDetails {
  if (error instanceof ApiError) return error.details;
  process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  return { status: 500, type: "api_error", message: "Something broke in the stand-in itself" };
}

/** The key comes as a bearer token, or as the name of basic authentication. */
function authenticate(fake: FakeStripe, request: Request): void {
  const [scheme = "", value = ""] = (request.get("authorization") ?? "").split(" ");
  const key =
    scheme.toLowerCase() === "basic"
      ? (Buffer.from(value, "base64").toString("utf8").split(":")[0] ?? "")
      : value;
  const given = Buffer.from(key);
  const wanted = Buffer.from(fake.settings.secretKey);
  if (given.length === wanted.length && timingSafeEqual(given, wanted)) return;
  throw invalidRequest(key === "" ? "No API key was given" : "This API key is not known", {
    status: 401,
    beforeWork: true,
  });
}

function send(request: Request, response: Response, requestId: string, answer: Answer): void {
  response
    .status(answer.status)
    .set({
      "Request-Id": requestId,
      "Stripe-Version": request.get("stripe-version") ?? API_VERSION,
      ...answer.headers,
    })
    .json(answer.body);
}
