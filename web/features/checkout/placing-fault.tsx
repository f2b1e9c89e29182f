import { useEffect, useRef } from "react";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { money } from "#web/lib/format.ts";
import { ApiProblem } from "#web/lib/problems.ts";

interface PlacingFaultProps {
  error: Error | null;
  /** The total that the button said when it was pressed. */
  seenCents: number | null;
}

/** Why the order was not placed, and the way on. Takes focus when it appears. */
export function PlacingFault({ error, seenCents }: PlacingFaultProps) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (error !== null) box.current?.focus();
  }, [error]);
  // Wrong fields are told by the summary.
  if (error === null || (error instanceof ApiProblem && error.is("validation"))) return null;
  return (
    <div ref={box} tabIndex={-1}>
      <Fault error={error} seenCents={seenCents} />
    </div>
  );
}

function Fault({ error, seenCents }: { error: Error; seenCents: number | null }) {
  if (!(error instanceof ApiProblem)) return <RequestFault error={error} />;
  if (error.is("price-changed")) {
    return (
      <Notice kind="caution" title="The total changed; nothing was charged">
        {seenCents === null ? "It" : `It was ${money(seenCents)}. The new total`} stands above. Look at it,
        then pay.
      </Notice>
    );
  }
  if (error.is("payment-closed")) {
    const { orderNumber, detail } = error.problem;
    return (
      <Notice
        kind="pass"
        title="This cart was paid already"
        action={
          typeof orderNumber === "string" ? (
            <ButtonLink to={`/orders/${orderNumber}`}>Open order {orderNumber}</ButtonLink>
          ) : (
            <ButtonLink to="/account/orders">My orders</ButtonLink>
          )
        }
      >
        {detail}
      </Notice>
    );
  }
  if (error.is("build-refused") || error.is("conflict")) {
    return (
      <Notice
        kind="stop"
        title="The order was not placed; nothing was charged"
        action={<ButtonLink to="/cart">Open the cart</ButtonLink>}
      >
        {error.message}
      </Notice>
    );
  }
  if (error.is("gateway-unavailable")) {
    return (
      <Notice kind="stop" title="The payment page could not be opened; nothing was charged">
        The payment service does not answer. What you typed is kept: try again in a moment.
      </Notice>
    );
  }
  return <RequestFault error={error} />;
}
