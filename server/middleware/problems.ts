import type { ErrorRequestHandler, RequestHandler } from "express";
import { GatewayRefused, GatewayUnavailable } from "#server/gateways/stripe.ts";
import { RequestMismatch } from "#server/middleware/request-mismatch.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { Problem, ProblemKind } from "#shared/contracts/problem.ts";
import { requestId } from "./request-log.ts";

const kinds: Record<ProblemKind, { status: number; title: string }> = {
  validation: { status: 422, title: "Something has to be mended" },
  "not-signed-in": { status: 401, title: "Not signed in" },
  "not-allowed": { status: 403, title: "Not allowed" },
  "not-found": { status: 404, title: "Not found" },
  csrf: { status: 403, title: "This page has become too old" },
  "too-many-requests": { status: 429, title: "Too many tries" },
  conflict: { status: 409, title: "It has changed meanwhile" },
  "price-changed": { status: 409, title: "The price has changed" },
  "build-refused": { status: 422, title: "This build cannot be made" },
  "payment-closed": { status: 409, title: "Paid already" },
  "bad-signature": { status: 400, title: "The signature does not fit" },
  "gateway-unavailable": { status: 503, title: "A service we depend on does not answer" },
  "too-large": { status: 413, title: "Too large" },
  internal: { status: 500, title: "Something went wrong here" },
};

/** The HTTP status of each kind of problem, for the API document. */
export const problemStatus = (kind: ProblemKind): number => kinds[kind].status;

/** Anything under /api that no route answers. */
export const noSuchRoute: RequestHandler = () => {
  throw new Refusal("not-found", "There is no such address.");
};

/** Turns everything that was thrown into RFC 9457 problem details. What is not meant for the reader stays in the log. */
export const problemDetails: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const refusal = asRefusal(error);
  const { status, title } = kinds[refusal.kind];
  if (status >= 500) request.log.error({ err: error }, "request failed");
  else if (status === 401 || status === 403)
    request.log.warn({ kind: refusal.kind, action: refusal.action, personId: request.person?.id }, "refused");
  const problem: Problem & Record<string, unknown> = {
    ...refusal.extra,
    type: `/problems/${refusal.kind}`,
    title,
    status,
    detail: refusal.message,
    instance: `urn:uuid:${requestId(request)}`,
    ...(refusal.errors === undefined ? {} : { errors: refusal.errors }),
  };
  if (refusal.retryAfter !== undefined) response.setHeader("Retry-After", String(refusal.retryAfter));
  response.status(status).setHeader("Cache-Control", "no-store").type("application/problem+json");
  response.send(JSON.stringify(problem));
};

function asRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof RequestMismatch) return fromMismatch(error);
  if (error instanceof GatewayUnavailable || error instanceof GatewayRefused)
    return new Refusal(
      "gateway-unavailable",
      "Nothing was lost and nothing was charged. Try again in a minute.",
      { retryAfter: 60 },
    );
  if (error instanceof Error && "type" in error) {
    // What the body parser says.
    if (error.type === "entity.too.large")
      return new Refusal("too-large", "The request is larger than 100 kB.");
    if (error.type === "entity.parse.failed")
      return new Refusal("validation", "The request is not valid JSON.");
    if (typeof error.type === "string" && /^(encoding|charset|request|entity|parameters)\./.test(error.type))
      return new Refusal("validation", "The request could not be read.");
  }
  if (error instanceof URIError) return new Refusal("not-found", "There is no such address.");
  return new Refusal(
    "internal",
    "Nothing you did caused this. Try again; if it stays, tell the shop the number of this problem.",
  );
}

function fromMismatch(error: RequestMismatch): Refusal {
  if (error.part === "params") return new Refusal("not-found", "There is no such address.");
  const errors = error.issues.map((issue) => ({
    path: issue.path.map(String).join("."),
    message: issue.message,
  }));
  return new Refusal("validation", "Some fields have to be mended.", { errors });
}
