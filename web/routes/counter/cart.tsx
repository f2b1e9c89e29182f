import { useQuery } from "@tanstack/react-query";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { CartContents } from "#web/features/cart/cart-contents.tsx";
import { cartQuery } from "#web/features/cart/queries.ts";
import { queryClient } from "#web/lib/query-client.ts";

export function loader() {
  void queryClient.prefetchQuery(cartQuery);
  return null;
}

export function Component() {
  const cart = useQuery(cartQuery);
  return (
    <div className="space-y-8">
      <PageHeading title="Cart" />
      {cart.data !== undefined ? (
        <CartContents cart={cart.data} />
      ) : cart.isError ? (
        <RequestFault error={cart.error} onRetry={() => void cart.refetch()} retrying={cart.isFetching} />
      ) : (
        <Skeleton lines={6} label="Reading the cart" />
      )}
    </div>
  );
}
