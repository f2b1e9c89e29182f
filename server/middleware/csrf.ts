import { createHmac, randomBytes, timingSafeEqual } from "node:crypto";
import type { Request, RequestHandler, Response } from "express";
import { config } from "#server/config.ts";
import { Refusal } from "#server/services/refusal.ts";
import { cookieName, isSecure } from "./session.ts";

const cookie = cookieName("blockwright-csrf");
const safeMethods = new Set(["GET", "HEAD", "OPTIONS"]);

/** A signed-in session's token is worth nothing to any other session. */
function tokenFor(value: string, request: Request): string {
  const session = request.session.personId === undefined ? "" : request.sessionID;
  return createHmac("sha256", config.SESSION_SECRET).update(`csrf\n${value}\n${session}`).digest("base64url");
}

function valueOf(request: Request): string | null {
  const pairs = (request.headers.cookie ?? "").split(";").map((pair) => pair.trim());
  const value = pairs.find((pair) => pair.startsWith(`${cookie}=`))?.slice(cookie.length + 1);
  return value !== undefined && /^[\w-]{43}$/.test(value) ? value : null;
}

/** The token that this browser's changing requests must carry in X-CSRF-Token; sets the cookie that it belongs to. */
export function csrfToken(request: Request, response: Response): string {
  let value = valueOf(request);
  if (value === null) {
    value = randomBytes(32).toString("base64url");
    response.cookie(cookie, value, { httpOnly: true, sameSite: "lax", secure: isSecure, path: "/" });
  }
  return tokenFor(value, request);
}

/** Refuses changing requests that do not come from our own pages: the Origin must be ours, and the token must fit. */
export const csrf: RequestHandler = (request, _response, next) => {
  if (safeMethods.has(request.method)) {
    next();
    return;
  }
  if (request.headers.origin !== config.PUBLIC_ORIGIN)
    throw new Refusal("csrf", `Open the page at ${config.PUBLIC_ORIGIN} and try again.`);
  const value = valueOf(request);
  const given = Buffer.from(request.get("X-CSRF-Token") ?? "");
  const wanted = Buffer.from(value === null ? "" : tokenFor(value, request));
  if (wanted.length === 0 || given.length !== wanted.length || !timingSafeEqual(given, wanted))
    throw new Refusal(
      "csrf",
      "This page was open too long or your sign-in changed. Reload it and try again.",
    );
  next();
};
