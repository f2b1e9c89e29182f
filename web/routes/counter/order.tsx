import { useQuery } from "@tanstack/react-query";
import { useParams, type LoaderFunctionArgs } from "react-router-dom";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { OrderLinkForm } from "#web/features/orders/order-link-form.tsx";
import { OrderView } from "#web/features/orders/order-view.tsx";
import { orderQuery } from "#web/features/orders/queries.ts";
import { ApiProblem } from "#web/lib/problems.ts";
import { queryClient } from "#web/lib/query-client.ts";
import { useSession } from "#web/lib/session.ts";

export function loader({ params }: LoaderFunctionArgs) {
  if (params.number !== undefined) void queryClient.prefetchQuery(orderQuery(params.number));
  return null;
}

export function Component() {
  const { number = "" } = useParams();
  const order = useQuery(orderQuery(number));
  const session = useSession();
  if (order.data !== undefined && session !== undefined) {
    return (
      <div className="space-y-6">
        <PageHeading title={`Order ${order.data.number}`} />
        <OrderView order={order.data} timeZone={session.shop.timeZone} />
      </div>
    );
  }
  const closed = order.error instanceof ApiProblem && [401, 403, 404].includes(order.error.status);
  if (closed) return <Closed number={number} signedIn={(session?.person ?? null) !== null} />;
  return (
    <div className="space-y-8">
      <PageHeading title={`Order ${number}`} />
      {order.isError ? (
        <RequestFault error={order.error} onRetry={() => void order.refetch()} retrying={order.isFetching} />
      ) : (
        <Skeleton lines={8} label="Reading the order" />
      )}
    </div>
  );
}

/** The order is not this reader's, or there is none of this number: the same words for both. */
function Closed({ number, signedIn }: { number: string; signedIn: boolean }) {
  const next = encodeURIComponent(`/orders/${number}`);
  return (
    <div className="space-y-8">
      <PageHeading
        over={`Order ${number}`}
        title="This order cannot be shown here"
        lead={
          signedIn
            ? "It does not stand in your account, or there is no order of this number. The link in the receipt opens it; you can have a new one sent."
            : "It is opened by the link in the receipt, or by the account that placed it. The link may be older than it lasts; you can have a new one sent."
        }
      />
      <p>
        {signedIn ? (
          <TextLink to="/account/orders">My orders</TextLink>
        ) : (
          <>
            Placed with an account? <TextLink to={`/account/sign-in?next=${next}`}>Sign in</TextLink> and come
            back here.
          </>
        )}
      </p>
      <OrderLinkForm orderNumber={number} />
    </div>
  );
}
