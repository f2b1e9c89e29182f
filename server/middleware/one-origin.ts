import type { RequestHandler } from "express";
import { config } from "#server/config.ts";

const publicHost = new URL(config.PUBLIC_ORIGIN).host;

/** Whoever types "localhost" is sent to the address that the product printed: cookies and the CSRF check know one only. */
export const oneOrigin: RequestHandler = (request, response, next) => {
  const { host } = request.headers;
  const reads = request.method === "GET" || request.method === "HEAD";
  if (reads && host !== undefined && host !== publicHost && /^localhost(:\d+)?$/i.test(host)) {
    response.redirect(308, new URL(request.originalUrl.replace(/^\/+/, "/"), config.PUBLIC_ORIGIN).href);
    return;
  }
  next();
};
