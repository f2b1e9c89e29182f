import type { ReactNode } from "react";
import { Notice } from "#web/components/notice.tsx";
import { dateTime } from "#web/lib/format.ts";
import type { OrderReview } from "#shared/contracts/orders.ts";
import { Decided } from "./decided.tsx";
import { DecisionForm } from "./decision-form.tsx";
import { OrderHistory } from "./order-history.tsx";
import { OrderLines } from "./order-lines.tsx";
import { OrderPeople } from "./order-people.tsx";
import { OrderTitleBlock } from "./order-title-block.tsx";
import { OrderTotals } from "./order-totals.tsx";

interface ReviewViewProps {
  review: OrderReview;
  timeZone: string;
  /** Planners and the office answer; the others read. */
  mayDecide: boolean;
}

/** An order as the shop reviews it: title block, builds with findings, money, history, and the answer. */
export function ReviewView({ review, timeZone, mayDecide }: ReviewViewProps) {
  const isOpen = review.state === "placed";
  const facts = <OrderFacts review={review} timeZone={timeZone} />;
  return (
    <div className="space-y-8">
      {review.openedBy !== null && !review.openedBy.me && (
        <Notice kind="caution" live title={`${review.openedBy.name} has this order open`}>
          Since {dateTime(review.openedBy.at, timeZone)}. Speak with each other before you answer it.
        </Notice>
      )}
      <OrderTitleBlock order={review} timeZone={timeZone} />
      <Decided review={review} />
      {isOpen && !mayDecide && (
        <Notice kind="waiting" title="This order waits for the planner">
          A planner or the office accepts or declines it.
        </Notice>
      )}
      {isOpen && mayDecide ? (
        <DecisionForm review={review}>{facts}</DecisionForm>
      ) : (
        <div className="grid gap-x-12 gap-y-10 lg:grid-cols-[1fr_22rem]">
          <OrderLines order={review} />
          {facts}
        </div>
      )}
    </div>
  );
}

function OrderFacts({ review, timeZone }: Omit<ReviewViewProps, "mayDecide">) {
  return (
    <div className="space-y-8">
      <Part title="Customer">
        <OrderPeople order={review} />
      </Part>
      <Part title="What it costs">
        <OrderTotals order={review} />
      </Part>
      <Part title="History">
        <OrderHistory events={review.history} timeZone={timeZone} />
      </Part>
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="mb-3 text-xl">{title}</h2>
      {children}
    </section>
  );
}
