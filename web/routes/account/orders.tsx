import { useQuery } from "@tanstack/react-query";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { MyOrdersTable } from "#web/features/orders/my-orders-table.tsx";
import { myOrdersQuery } from "#web/features/orders/queries.ts";
import { useSession } from "#web/lib/session.ts";

export function Component() {
  const orders = useQuery(myOrdersQuery);
  const timeZone = useSession()?.shop.timeZone;
  return (
    <div className="space-y-8">
      <PageHeading title="My orders" />
      {orders.data !== undefined && timeZone !== undefined ? (
        <MyOrdersTable orders={orders.data.orders} timeZone={timeZone} />
      ) : orders.isError ? (
        <RequestFault
          error={orders.error}
          onRetry={() => void orders.refetch()}
          retrying={orders.isFetching}
        />
      ) : (
        <Skeleton lines={6} label="Reading your orders" />
      )}
    </div>
  );
}
