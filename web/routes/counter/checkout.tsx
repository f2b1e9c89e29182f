import { useQuery } from "@tanstack/react-query";
import { useSearchParams } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Empty } from "#web/components/empty.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { CheckoutForm } from "#web/features/checkout/checkout-form.tsx";
import { checkoutCartQuery } from "#web/features/checkout/queries.ts";
import { queryClient } from "#web/lib/query-client.ts";
import { sessionQuery } from "#web/lib/session.ts";
import type { CartView } from "#shared/contracts/cart.ts";
import type { SessionView } from "#shared/contracts/session.ts";

export function loader() {
  void queryClient.prefetchQuery(checkoutCartQuery);
  return null;
}

export function Component() {
  const cart = useQuery(checkoutCartQuery);
  const session = useQuery(sessionQuery);
  const [search] = useSearchParams();
  const leftPayment = search.has("left-payment");
  const failed = cart.isError ? cart : session.isError ? session : null;
  return (
    <div className="space-y-8">
      <PageHeading title="Check out" />
      {leftPayment && (
        <Notice kind="note" title="Nothing was charged">
          You left the payment page before paying. The cart is as it was; pay when you are ready.
        </Notice>
      )}
      {cart.data !== undefined && session.data !== undefined ? (
        <Checkout cart={cart.data} session={session.data} />
      ) : failed !== null ? (
        <RequestFault
          error={failed.error}
          onRetry={() => void failed.refetch()}
          retrying={failed.isFetching}
        />
      ) : (
        <Skeleton lines={10} label="Reading the cart" />
      )}
    </div>
  );
}

function Checkout({ cart, session }: { cart: CartView; session: SessionView }) {
  if (cart.refused.length > 0) {
    return (
      <Notice
        kind="stop"
        title="A build in the cart cannot be ordered as it stands"
        action={<ButtonLink to="/cart">Open the cart</ButtonLink>}
      >
        Mend or remove it, then check out.
      </Notice>
    );
  }
  if (cart.lines.length === 0) {
    return (
      <Empty
        title="There is no block in the cart"
        action={
          <ButtonLink to="/build" look="main">
            Start a build
          </ButtonLink>
        }
      >
        If you have just paid, the receipt comes by e-mail, with a link to the order.
      </Empty>
    );
  }
  return (
    <>
      <WhoIsHere person={session.person} />
      <CheckoutForm
        // Another person, other fields.
        key={session.person?.id ?? "guest"}
        cart={cart}
        person={session.person}
        onPay={(paymentUrl) => {
          window.location.assign(paymentUrl);
        }}
      />
    </>
  );
}

function WhoIsHere({ person }: { person: SessionView["person"] }) {
  if (person !== null) {
    return (
      <p>
        Signed in as <span className="font-semibold">{person.name}</span>. The order will stand in{" "}
        <TextLink to="/account/orders">My orders</TextLink>.
      </p>
    );
  }
  return (
    <p className="max-w-text">
      No account is needed: a link in the e-mail opens the order. Have one already?{" "}
      <TextLink to="/account/sign-in?next=%2Fcheckout">Sign in</TextLink>, and come back here.
    </p>
  );
}
