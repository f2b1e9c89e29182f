import session from "express-session";
import createStoreClass from "connect-session-sequelize";
import type { RequestHandler } from "express";
import { config } from "#server/config.ts";
import { sequelize } from "#server/database/connection.ts";
import { Session } from "#server/models/session.ts";
import type { PersonView } from "#shared/contracts/person.ts";

declare module "express-session" {
  interface SessionData {
    /** When the session began, milliseconds. Not set: nothing was kept yet, and no cookie was sent. */
    startedAt: number;
    /** When it was last used, to the minute. */
    seenAt: number;
    personId: string;
    signedInAt: number;
    cartId: string;
    orderGrants: string[];
  }
}

export const isSecure = new URL(config.PUBLIC_ORIGIN).protocol === "https:";

/** The browser itself holds a __Host- cookie to this host and to https. */
export const cookieName = (name: string): string => (isSecure ? `__Host-${name}` : name);

const sessionCookie = cookieName("blockwright-session");

const HOUR = 3_600_000;
const DAY = 24 * HOUR;

interface Limits {
  /** Milliseconds without a request after which the session is over. */
  idle: number;
  /** Milliseconds after which it is over however much it was used. */
  absolute: number;
}

const staff: Limits = { idle: HOUR, absolute: 12 * HOUR };
const buyer: Limits = { idle: 2 * HOUR, absolute: 14 * DAY };
/** A visitor's session holds a cart and the orders bought with it, and no rights beyond. */
const visitor: Limits = { idle: 14 * DAY, absolute: 30 * DAY };

/** How long a session lasts for whom it belongs to. */
export function limitsOf(person: PersonView | null): Limits {
  if (person === null) return visitor;
  return person.role === "customer" || person.role === "dealer" ? buyer : staff;
}

const SequelizeStore = createStoreClass(session.Store);

/** Sessions kept in PostgreSQL, shared by all processes. */
export function sessions(): RequestHandler {
  const options = {
    db: sequelize,
    table: Session.name,
    expiration: visitor.idle,
    // A request that changes nothing writes nothing; middleware/person.ts notes the use once a minute.
    disableTouch: true,
    checkExpirationInterval: 15 * 60_000,
    extendDefaultFields: (defaults: object, data: Partial<session.SessionData>) => ({
      ...defaults,
      personId: data.personId ?? null,
    }),
  };
  return session({
    name: sessionCookie,
    secret: config.SESSION_SECRET,
    store: new SequelizeStore(options),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: "lax", secure: isSecure, path: "/", maxAge: visitor.idle },
  });
}
