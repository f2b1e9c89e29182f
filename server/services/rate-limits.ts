import { createHash } from "node:crypto";
import { RateLimiterPostgres, RateLimiterRes } from "rate-limiter-flexible";
import { sequelize } from "#server/database/connection.ts";
import { Refusal } from "./refusal.ts";

const MINUTE = 60;
const HOUR = 60 * MINUTE;

/** Tries within a time, seconds. Kept in PostgreSQL, so that all processes count together. */
const limits = {
  "sign-in by account and address": { points: 10, duration: 15 * MINUTE },
  "sign-in by address": { points: 100, duration: HOUR },
  "register by address": { points: 20, duration: HOUR },
  "forgotten password by account": { points: 5, duration: HOUR },
  "forgotten password by address": { points: 30, duration: HOUR },
  "confirmation by account": { points: 5, duration: HOUR },
  "token by address": { points: 60, duration: HOUR },
  "password by account": { points: 10, duration: 15 * MINUTE },
  "order by address": { points: 200, duration: HOUR },
  "order link by address": { points: 30, duration: HOUR },
  "target by address": { points: 600, duration: HOUR },
  "mend by address": { points: 1200, duration: HOUR },
} as const;

export type RateLimit = keyof typeof limits;

const limiters = new Map<RateLimit, RateLimiterPostgres>();

function limiterOf(limit: RateLimit): RateLimiterPostgres {
  const made = limiters.get(limit);
  if (made) return made;
  const limiter = new RateLimiterPostgres({
    storeClient: sequelize,
    storeType: "sequelize",
    tableName: "rate_limits",
    tableCreated: true,
    keyPrefix: limit,
    ...limits[limit],
  });
  limiters.set(limit, limiter);
  return limiter;
}

/** Addresses are not kept as they are written. */
const keyOf = (who: string): string => createHash("sha256").update(who.toLowerCase()).digest("base64url");

/**
 * Counts one try of somebody.
 * @throws Refusal too-many-requests, with the seconds to wait
 */
export async function countTry(limit: RateLimit, who: string): Promise<void> {
  try {
    await limiterOf(limit).consume(keyOf(who));
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const seconds = Math.max(1, Math.ceil(error.msBeforeNext / 1000));
    const wait = seconds < 120 ? `${seconds} seconds` : `${Math.ceil(seconds / MINUTE)} minutes`;
    throw new Refusal("too-many-requests", `Too many tries. Wait ${wait}, then try again.`, {
      retryAfter: seconds,
    });
  }
}

/** Takes a try back that turned out well. */
export async function forgiveTry(limit: RateLimit, who: string): Promise<void> {
  await limiterOf(limit).reward(keyOf(who));
}

/** Forgets all tries of somebody. */
export async function forgetTries(limit: RateLimit, who: string): Promise<void> {
  await limiterOf(limit).delete(keyOf(who));
}
