import type { ReactNode } from "react";
import { useNarrow } from "#web/components/narrow.ts";
import type { OrderLineView, OrderView } from "#shared/contracts/orders.ts";
import { OrderLine } from "./order-line.tsx";

interface OrderLinesProps {
  order: Pick<OrderView, "lines">;
  /** What stands under a line's special request. */
  answerTo?: (line: OrderLineView) => ReactNode;
}

/** The builds of an order. One stands open where there is room; of several, each is folded to its heading. */
export function OrderLines({ order, answerTo }: OrderLinesProps) {
  const narrow = useNarrow();
  const folded = narrow || order.lines.length > 1;
  return (
    <section aria-labelledby="builds" className="min-w-0">
      <h2 id="builds" className="mb-4 text-2xl">
        {order.lines.length === 1 ? "The build" : `The ${order.lines.length} builds`}
      </h2>
      <ul className="space-y-10">
        {order.lines.map((line) => (
          <OrderLine key={line.id} line={line} answer={answerTo?.(line)} folded={folded} />
        ))}
      </ul>
    </section>
  );
}
