import { randomUUID } from "node:crypto";
import type { IncomingMessage } from "node:http";
import type { RequestHandler } from "express";
import { pinoHttp } from "pino-http";
import { log } from "#server/log.ts";

/** The path of a request without what may be secret: the query, and the token of an order's link. */
export function loggedPath(url: string): string {
  const path = url.split("?", 1)[0] ?? "";
  return path.replace(/^(\/order-link\/).+/, "$1(hidden)");
}

const quiet = new Set(["/healthz", "/readyz"]);

/** Gives every request an id, answers it in X-Request-Id, and writes one line when it is done. */
export const requestLog: RequestHandler = pinoHttp({
  logger: log,
  genReqId: (_request, response) => {
    const id = randomUUID();
    response.setHeader("X-Request-Id", id);
    return id;
  },
  autoLogging: { ignore: (request) => quiet.has(request.url) },
  customLogLevel: (_request, response, error) => {
    if (error !== undefined || response.statusCode >= 500) return "error";
    return response.statusCode >= 400 ? "warn" : "info";
  },
  // Headers stay out of the log altogether.
  serializers: {
    req: (request: { id: unknown; method: string; url: string; remoteAddress: string }) => ({
      id: request.id,
      method: request.method,
      path: loggedPath(request.url),
      address: request.remoteAddress,
    }),
    res: (response: { statusCode: number }) => ({ status: response.statusCode }),
  },
});

/** The id that the answer carries. */
export function requestId(request: IncomingMessage): string {
  return typeof request.id === "string" ? request.id : "";
}
