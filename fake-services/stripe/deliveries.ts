import type { Delivery, State, StoredEvent } from "./records.ts";

export interface DeliveryPlan {
  /**
   * deliver: at once, in order. hold: kept until released. lose: never sent. duplicate: each twice.
   * reorder: what happens within `delayMs` goes out last first. delay: `delayMs` later.
   */
  mode: "deliver" | "hold" | "lose" | "duplicate" | "reorder" | "delay";
  delayMs: number;
}

const REORDER_MILLISECONDS = 300;

/** Decides when each event goes out. Keeps no record of its own but the plan. */
export class DeliveryPlanner {
  plan: DeliveryPlan = { mode: "deliver", delayMs: 0 };
  readonly #state: State;
  #windowEnd = 0;

  constructor(state: State) {
    this.#state = state;
  }

  add(event: StoredEvent): void {
    const now = Date.now();
    const { mode, delayMs } = this.plan;
    switch (mode) {
      case "deliver":
        this.#put(event, "waiting", now);
        break;
      case "hold":
        this.#put(event, "held", now);
        break;
      case "lose":
        this.#put(event, "lost", now);
        break;
      case "duplicate":
        this.#put(event, "waiting", now);
        this.#put(event, "waiting", now + delayMs);
        break;
      case "reorder":
        if (now >= this.#windowEnd) this.#windowEnd = now + (delayMs || REORDER_MILLISECONDS);
        this.#put(event, "waiting", this.#windowEnd, -1);
        break;
      case "delay":
        this.#put(event, "waiting", now + delayMs);
        break;
    }
  }

  /** Lets go of what was held, oldest first or newest first. Answers how many. */
  release(order: "as-happened" | "reversed"): number {
    const held = this.#state.deliveries.filter((delivery) => delivery.state === "held");
    const now = Date.now();
    for (const delivery of held) {
      delivery.state = "waiting";
      delivery.dueAt = now;
      if (order === "reversed") delivery.order = -delivery.order;
    }
    return held.length;
  }

  /** The delivery to send next, if any is waiting. */
  next(): Delivery | undefined {
    return this.#state.deliveries
      .filter((delivery) => delivery.state === "waiting")
      .reduce<Delivery | undefined>(
        (first, one) =>
          first === undefined ||
          one.dueAt < first.dueAt ||
          (one.dueAt === first.dueAt && one.order < first.order)
            ? one
            : first,
        undefined,
      );
  }

  #put(event: StoredEvent, state: Delivery["state"], dueAt: number, direction: 1 | -1 = 1): void {
    const order = (this.#state.deliveries.length + 1) * direction;
    this.#state.deliveries.push({ eventId: event.id, state, dueAt, order, attempts: [] });
  }
}
