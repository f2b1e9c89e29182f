import type { ReactNode } from "react";
import { CautionLine } from "#web/components/caution-line.tsx";
import { Notice } from "#web/components/notice.tsx";
import { date, money } from "#web/lib/format.ts";
import type { OrderView as Order } from "#shared/contracts/orders.ts";
import { OrderHistory } from "./order-history.tsx";
import { OrderLines } from "./order-lines.tsx";
import { OrderPeople } from "./order-people.tsx";
import { OrderTitleBlock } from "./order-title-block.tsx";
import { OrderTotals } from "./order-totals.tsx";

interface OrderViewProps {
  order: Order;
  timeZone: string;
}

/** An order as its buyer follows it: where it stands, what comes next, what it is, what it cost. */
export function OrderView({ order, timeZone }: OrderViewProps) {
  return (
    <div className="space-y-10">
      <div className="space-y-5">
        <OrderTitleBlock order={order} timeZone={timeZone} />
        <Standing order={order} />
      </div>
      <div className="grid gap-x-12 gap-y-10 lg:grid-cols-[1fr_20rem]">
        <OrderLines order={order} />
        <div className="space-y-10">
          <Aside title="What happened">
            <OrderHistory events={order.history} timeZone={timeZone} />
          </Aside>
          <Aside title="What it costs">
            <OrderTotals order={order} />
          </Aside>
          <Aside title="Delivery">
            <OrderPeople order={order} />
          </Aside>
          <OrderCautions order={order} />
        </div>
      </div>
    </div>
  );
}

function Aside({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="mb-3 text-xl">{title}</h2>
      {children}
    </section>
  );
}

/** Where it stands, in a sentence; a decline with its reason and the money that goes back. */
function Standing({ order }: { order: Order }) {
  if (order.state === "declined") {
    return (
      <Notice kind="stop" title="The shop could not take this order on">
        {order.declineReason !== null && (
          <p className="max-w-text whitespace-pre-line">{order.declineReason}</p>
        )}
        <p className="mt-1">
          {order.returnedCents > 0
            ? `${money(order.returnedCents)} went back to the card. The bank takes 5 to 10 days.`
            : `${money(order.paidCents)} goes back to the card by itself. The bank takes 5 to 10 days.`}
        </p>
      </Notice>
    );
  }
  if (order.promisedShipOn !== null) {
    return (
      <Notice kind="pass" title={`The shop promised to ship on ${date(order.promisedShipOn)}`}>
        {order.next}
      </Notice>
    );
  }
  return (
    <Notice kind={order.state === "cancelled" ? "stop" : "waiting"} title="What comes next">
      {order.next}
    </Notice>
  );
}

function OrderCautions({ order }: { order: Order }) {
  if (order.state === "declined" || order.state === "cancelled") return null;
  return (
    <section aria-label="Cautions" className="space-y-2">
      <CautionLine>
        A bare block weighs as much as a person. Lift with a hoist and a stand rated for it.
      </CautionLine>
      {order.delivery.method === "freight" ? (
        <CautionLine>
          Freight arrives on a pallet. Have a fork truck, a hoist or a lift gate ready to unload.
        </CautionLine>
      ) : (
        <CautionLine>Bring a truck or trailer that can carry the weight, and straps.</CautionLine>
      )}
      <CautionLine>
        The clearances are a check of the block against the sizes entered. Mock up and measure every assembly.
      </CautionLine>
      <CautionLine>
        Wash and oil the block before assembly. Wear eye protection for core plugs and grinding.
      </CautionLine>
    </section>
  );
}
