import type { RequestHandler } from "express";
import { presentPerson } from "#server/presenters/person.ts";
import { findSignedIn } from "#server/services/accounts/find-signed-in.ts";
import type { PersonView } from "#shared/contracts/person.ts";
import { regenerate } from "./browser-session.ts";
import { limitsOf } from "./session.ts";

declare module "express-serve-static-core" {
  interface Request {
    /** Not set where no session is looked at. */
    person?: PersonView | null;
  }
}

const MINUTE = 60_000;

/**
 * Says who asks. A session that was idle or open too long, whose person was disabled, or that was ended from elsewhere
 * (a new password) is over here and now.
 */
export const person: RequestHandler = async (request, _response, next) => {
  const { personId, signedInAt, startedAt, seenAt } = request.session;
  const found =
    personId === undefined || signedInAt === undefined ? null : await findSignedIn(personId, signedInAt);
  const view = found === null ? null : presentPerson(found);
  const now = Date.now();
  const limits = limitsOf(view);
  const isOver =
    (personId !== undefined && view === null) ||
    (startedAt !== undefined && now - startedAt > limits.absolute) ||
    (seenAt !== undefined && now - seenAt > limits.idle);
  if (isOver) {
    await regenerate(request);
    request.person = null;
  } else {
    request.person = view;
    request.session.cookie.maxAge = limits.idle;
    if (seenAt !== undefined && now - seenAt >= MINUTE) request.session.seenAt = now;
  }
  next();
};
