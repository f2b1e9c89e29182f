import { expireDueSessions } from "./checkout-sessions.ts";
import { DeliveryPlanner } from "./deliveries.ts";
import { Faults } from "./faults.ts";
import { Idempotency } from "./idempotency.ts";
import type { Settings } from "./settings.ts";
import { openStore, type Store } from "./state.ts";
import { WebhookSender } from "./webhooks.ts";
import type { Work } from "./work.ts";

const SWEEP_MILLISECONDS = 1000;

/** The whole stand-in but for its addresses: records, webhooks, faults, and the clock that closes sessions. */
export class FakeStripe {
  readonly settings: Settings;
  readonly store: Store;
  readonly planner: DeliveryPlanner;
  readonly webhooks: WebhookSender;
  readonly faults = new Faults();
  readonly idempotency: Idempotency;
  /** Known once it listens. */
  origin = "";
  readonly #sweep: NodeJS.Timeout;
  #eventsToSend = false;

  constructor(settings: Settings) {
    this.settings = settings;
    this.store = openStore(settings.stateFile);
    this.planner = new DeliveryPlanner(this.store.state);
    this.idempotency = new Idempotency(this.store.state);
    this.webhooks = new WebhookSender({
      store: this.store,
      planner: this.planner,
      url: settings.webhookUrl,
      secret: settings.webhookSecret,
      retryMilliseconds: settings.retryMilliseconds,
    });
    this.#sweep = setInterval(() => {
      expireDueSessions(this.work());
      this.commitEvents();
    }, SWEEP_MILLISECONDS);
    this.webhooks.wake();
  }

  work(request: Work["request"] = { id: null, idempotency_key: null }): Work {
    return {
      state: this.store.state,
      now: Math.floor(Date.now() / 1000),
      origin: this.origin,
      request,
      planDelivery: (event) => {
        this.planner.add(event);
        this.#eventsToSend = true;
      },
    };
  }

  /** Writes down what was done, then lets its webhooks go. Call before answering. */
  commit(): void {
    this.#eventsToSend = false;
    this.store.save();
    this.webhooks.wake();
  }

  /** The same, only if something happened: a session found to be over its time, say. */
  commitEvents(): void {
    if (this.#eventsToSend) this.commit();
  }

  stop(): void {
    clearInterval(this.#sweep);
    this.webhooks.stop();
    this.faults.set({ mode: "none", paths: [], count: null });
    this.store.save();
  }
}
