import { useEffect, useEffectEvent } from "react";
import { useAnnounce } from "#web/components/announcer.tsx";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { TitleBlock } from "#web/components/title-block.tsx";
import { money } from "#web/lib/format.ts";
import type { CheckoutResult } from "#shared/contracts/checkout.ts";
import { forgetFields } from "./checkout-fields.ts";

interface PaymentResultProps {
  result: CheckoutResult;
  /** Called once when the cart was paid. */
  onPaid: () => void;
}

const headings: Record<CheckoutResult["state"], string> = {
  paid: "Paid; the shop has the order",
  waiting: "Waiting for the payment to be confirmed",
  expired: "Nothing was charged",
  returned: "This cart had been paid before; the second payment goes back",
};

/** What a page that shows this result is called. */
export function resultHeading(state: CheckoutResult["state"]): string {
  return headings[state];
}

/** How the payment stands, plainly, and what to do next. */
export function PaymentResult({ result, onPaid }: PaymentResultProps) {
  const announce = useAnnounce();
  const { state } = result;
  const arrive = useEffectEvent((arrived: CheckoutResult["state"]) => {
    if (arrived === "waiting") return;
    announce(headings[arrived]);
    if (arrived === "expired") return;
    forgetFields();
    onPaid();
  });
  useEffect(() => {
    arrive(state);
  }, [state]);
  return (
    <div className="max-w-text space-y-6">
      <Words result={result} />
      <TitleBlock
        label="Payment"
        cells={[
          { label: "Order", value: result.orderNumber },
          { label: state === "expired" ? "Would have been" : "Amount", value: money(result.totalCents) },
          { label: "Receipt to", value: result.email, wide: true },
        ]}
      />
      <WayOn result={result} />
    </div>
  );
}

function Words({ result }: { result: CheckoutResult }) {
  switch (result.state) {
    case "paid":
      return (
        <Notice kind="pass" title={`${money(result.totalCents)} is paid`}>
          The receipt is on its way to {result.email}, with a link that opens the order. Next, the shop looks
          the order over and answers with the date it can keep.
        </Notice>
      );
    case "waiting":
      return (
        <Notice kind="waiting" title="The bank has not answered yet">
          This page looks again by itself. You may close it: once the payment is confirmed, the receipt comes
          to {result.email}. Do not pay a second time.
        </Notice>
      );
    case "expired":
      return (
        <Notice kind="note" title="The payment page has ended without a payment">
          No order was placed. The cart is kept as it was.
        </Notice>
      );
    case "returned":
      return (
        <Notice kind="caution" title={`${money(result.totalCents)} goes back to the card by itself`}>
          The same cart was paid twice. The first payment stands and its order goes on; you need do nothing.
          The bank takes 5 to 10 days, and {result.email} gets a message.
        </Notice>
      );
  }
}

function WayOn({ result }: { result: CheckoutResult }) {
  switch (result.state) {
    case "paid":
      return (
        <ButtonLink to={`/orders/${result.orderNumber}`} look="main">
          Open order {result.orderNumber}
        </ButtonLink>
      );
    case "waiting":
      return null;
    case "expired":
      return (
        <div className="flex flex-wrap gap-3">
          <ButtonLink to="/checkout" look="main">
            Go back to the checkout
          </ButtonLink>
          <ButtonLink to="/cart">Open the cart</ButtonLink>
        </div>
      );
    case "returned":
      return <ButtonLink to="/account/orders">My orders</ButtonLink>;
  }
}
