import { createHash } from "node:crypto";
import { ApiError, invalidRequest } from "./errors.ts";
import type { State } from "./records.ts";

export interface StoredResult {
  status: number;
  body: Record<string, unknown>;
  requestId: string;
}

const KEPT_MILLISECONDS = 24 * 60 * 60 * 1000;
const LONGEST_KEY = 255;

/** Remembers the first result of each Idempotency-Key for a day. */
export class Idempotency {
  readonly #state: State;
  /** Only in memory: after a kill nothing is running. */
  readonly #running = new Set<string>();

  constructor(state: State) {
    this.#state = state;
    const oldest = Date.now() - KEPT_MILLISECONDS;
    for (const [key, result] of Object.entries(state.idempotentResults)) {
      if (result.createdAt < oldest) delete state.idempotentResults[key];
    }
  }

  /**
   * Answers the stored result, or undefined when the work is to be done now.
   * @throws ApiError for a key that is too long, belongs to other parameters, or is in use
   */
  begin(key: string, fingerprint: string): StoredResult | undefined {
    if (key.length > LONGEST_KEY) {
      throw invalidRequest(`An idempotency key has at most ${LONGEST_KEY} characters`, { beforeWork: true });
    }
    if (this.#running.has(key)) {
      throw new ApiError({
        status: 409,
        type: "idempotency_error",
        code: "idempotency_key_in_use",
        message: "Another request with this idempotency key is still running",
        beforeWork: true,
      });
    }
    const stored = this.#state.idempotentResults[key];
    if (stored === undefined || stored.createdAt < Date.now() - KEPT_MILLISECONDS) {
      this.#running.add(key);
      return undefined;
    }
    if (stored.fingerprint !== fingerprint) {
      throw new ApiError({
        status: 400,
        type: "idempotency_error",
        message: `The idempotency key '${key}' was used before with other parameters`,
        beforeWork: true,
      });
    }
    return stored;
  }

  keep(key: string, fingerprint: string, result: StoredResult): void {
    this.#running.delete(key);
    this.#state.idempotentResults[key] = { fingerprint, createdAt: Date.now(), ...result };
  }

  forget(key: string): void {
    this.#running.delete(key);
  }
}

/** Tells apart requests by what they ask: address and body. */
export function fingerprintOf(method: string, path: string, body: string): string {
  const fields = [...new URLSearchParams(body)].map(([name, value]) => JSON.stringify([name, value])).sort();
  return createHash("sha256")
    .update(JSON.stringify([method, path, fields]))
    .digest("hex");
}
