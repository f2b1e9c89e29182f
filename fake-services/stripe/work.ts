import { newId } from "./identifiers.ts";
import type { State, StoredEvent } from "./records.ts";

export const API_VERSION = "2026-10-28.endive";

/** What one piece of work may touch and needs to know. */
export interface Work {
  state: State;
  /** Unix seconds. */
  now: number;
  /** Where this service is reached, such as http://127.0.0.1:4801. */
  origin: string;
  request: { id: string | null; idempotency_key: string | null };
  /** Puts an event on its way, as the webhook controls say. */
  planDelivery(event: StoredEvent): void;
}

/** Notes that something happened; the event carries the record as it is at this moment. */
export function recordEvent(
  work: Work,
  type: string,
  object: object,
  previousAttributes?: Record<string, unknown>,
): void {
  const event: StoredEvent = {
    id: newId("evt"),
    object: "event",
    api_version: API_VERSION,
    created: work.now,
    data: {
      object: { ...structuredClone(object) },
      ...(previousAttributes === undefined ? {} : { previous_attributes: previousAttributes }),
    },
    livemode: false,
    pending_webhooks: 1,
    request: work.request,
    type,
  };
  work.state.events[event.id] = event;
  work.planDelivery(event);
}
