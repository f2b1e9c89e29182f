import { createHmac } from "node:crypto";
import type { DeliveryPlanner } from "./deliveries.ts";
import type { Delivery } from "./records.ts";
import type { Store } from "./state.ts";

const ANSWER_MILLISECONDS = 10_000;
const LONGEST_WAIT_MILLISECONDS = 15_000;

/** The header of a signed webhook: HMAC-SHA256 over the time, a dot and the body's bytes. */
export function signatureHeader(secret: string, unixSeconds: number, body: string): string {
  const signature = createHmac("sha256", secret).update(`${unixSeconds}.${body}`).digest("hex");
  return `t=${unixSeconds},v1=${signature}`;
}

/** Sends webhooks one after another; what is not answered with 2xx is sent again, after a growing wait. */
export class WebhookSender {
  url: string | undefined;
  readonly #store: Store;
  readonly #planner: DeliveryPlanner;
  readonly #secret: string;
  readonly #retryMilliseconds: number;
  readonly #stopping = new AbortController();
  #timer: NodeJS.Timeout | undefined;
  #sending = false;

  constructor(parts: {
    store: Store;
    planner: DeliveryPlanner;
    url: string | undefined;
    secret: string;
    retryMilliseconds: number;
  }) {
    this.#store = parts.store;
    this.#planner = parts.planner;
    this.url = parts.url;
    this.#secret = parts.secret;
    this.#retryMilliseconds = parts.retryMilliseconds;
  }

  /** Looks for work; call after deliveries were planned, released or given an address. */
  wake(): void {
    clearTimeout(this.#timer);
    const next = this.#planner.next();
    if (this.#sending || this.url === undefined || next === undefined || this.#stopping.signal.aborted)
      return;
    const url = this.url;
    this.#timer = setTimeout(() => void this.#sendNext(url, next), Math.max(0, next.dueAt - Date.now()));
  }

  stop(): void {
    clearTimeout(this.#timer);
    this.#stopping.abort();
  }

  async #sendNext(url: string, delivery: Delivery): Promise<void> {
    this.#sending = true;
    const at = Date.now();
    const result = await this.#post(url, delivery);
    this.#sending = false;
    // Cut off by our own end: it counts as not sent, and goes out after the next start.
    if (this.#stopping.signal.aborted) return;
    delivery.attempts.push({ at, ...result });
    if (result.status !== null && result.status >= 200 && result.status < 300) {
      delivery.state = "delivered";
    } else {
      const wait = this.#retryMilliseconds * 2 ** Math.min(delivery.attempts.length - 1, 20);
      delivery.dueAt = Date.now() + Math.min(wait, LONGEST_WAIT_MILLISECONDS);
    }
    this.#store.save();
    this.wake();
  }

  async #post(url: string, delivery: Delivery): Promise<{ status: number | null; error: string | null }> {
    const body = JSON.stringify(this.#store.state.events[delivery.eventId], null, 2);
    try {
      const response = await fetch(url, {
        method: "POST",
        headers: {
          "content-type": "application/json; charset=utf-8",
          "stripe-signature": signatureHeader(this.#secret, Math.floor(Date.now() / 1000), body),
        },
        body,
        redirect: "manual",
        signal: AbortSignal.any([this.#stopping.signal, AbortSignal.timeout(ANSWER_MILLISECONDS)]),
      });
      await response.arrayBuffer();
      return { status: response.status, error: null };
    } catch (error) {
      return { status: null, error: error instanceof Error ? error.message : String(error) };
    }
  }
}
