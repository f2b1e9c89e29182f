import { Notice } from "#web/components/notice.tsx";
import { date, money } from "#web/lib/format.ts";
import type { OrderReview } from "#shared/contracts/orders.ts";

/** Where an order stands, in a sentence for the shop's own people. */
export function Decided({ review }: { review: OrderReview }) {
  switch (review.state) {
    case "placed":
      return null;
    case "declined":
      return (
        <Notice kind="stop" title="This order was declined">
          {review.declineReason !== null && (
            <p className="max-w-text whitespace-pre-line">{review.declineReason}</p>
          )}
          <p>
            {review.returnedCents > 0
              ? `${money(review.returnedCents)} went back to the card.`
              : `${money(review.paidCents)} is on its way back to the card.`}
          </p>
        </Notice>
      );
    case "cancelled":
      return <Notice kind="stop" title="This order has ended" />;
    case "awaiting-payment":
      return <Notice kind="waiting" title="This order waits for its payment" />;
    case "accepted":
    case "in-work":
    case "ready":
    case "part-shipped":
    case "shipped":
    case "delivered":
    case "on-hold":
      return (
        <Notice
          kind="pass"
          title={
            review.promisedShipOn === null
              ? "This order is accepted"
              : `Accepted; promised to ship on ${date(review.promisedShipOn)}`
          }
        >
          The customer was told by e-mail.
        </Notice>
      );
  }
}
