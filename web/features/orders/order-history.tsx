import { Timeline } from "#web/components/timeline.tsx";
import { dateTime } from "#web/lib/format.ts";
import { orderStateNames } from "#shared/orders/order-state.ts";
import type { OrderReview, OrderView } from "#shared/contracts/orders.ts";

interface OrderHistoryProps {
  events: OrderView["history"] | OrderReview["history"];
  timeZone: string;
}

/** What happened to the order, oldest first; with names where the reader may see them. */
export function OrderHistory({ events, timeZone }: OrderHistoryProps) {
  return (
    <Timeline
      entries={events.map((event, index) => ({
        id: event.id,
        when: dateTime(event.at, timeZone),
        title: orderStateNames[event.state],
        text: (
          <>
            {event.text}
            {"by" in event && event.by !== "" && <span className="block text-sm text-iron">{event.by}</span>}
          </>
        ),
        current: index === events.length - 1,
      }))}
    />
  );
}
