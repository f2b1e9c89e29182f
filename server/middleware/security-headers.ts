import type { RequestHandler } from "express";
import helmet from "helmet";
import { isSecure } from "./session.ts";

const YEAR = 365 * 24 * 3600;

/** Strict by default: files of our own only, nothing inline, no frames. */
export const securityHeaders: RequestHandler = helmet({
  contentSecurityPolicy: {
    useDefaults: false,
    directives: {
      defaultSrc: ["'none'"],
      scriptSrc: ["'self'"],
      styleSrc: ["'self'"],
      imgSrc: ["'self'", "data:"],
      fontSrc: ["'self'"],
      connectSrc: ["'self'"],
      manifestSrc: ["'self'"],
      formAction: ["'self'"],
      baseUri: ["'none'"],
      frameAncestors: ["'none'"],
      ...(isSecure ? { upgradeInsecureRequests: [] } : {}),
    },
  },
  strictTransportSecurity: isSecure ? { maxAge: YEAR, includeSubDomains: false } : false,
  referrerPolicy: { policy: "strict-origin-when-cross-origin" },
  frameguard: { action: "deny" },
});

const tokenPage = /^\/(account\/(verify|reset)|order-link\/)/;

/** Pages whose address holds a mailed token tell it to nobody and are kept nowhere. */
export const tokenPageHeaders: RequestHandler = (request, response, next) => {
  if (tokenPage.test(request.path)) {
    response.setHeader("Referrer-Policy", "no-referrer");
    response.setHeader("Cache-Control", "no-store");
    response.setHeader("X-Robots-Tag", "noindex, nofollow");
  }
  next();
};
