import { useQuery } from "@tanstack/react-query";
import { useSearchParams, type LoaderFunctionArgs } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Empty } from "#web/components/empty.tsx";
import { FilterLinks } from "#web/components/filter-links.tsx";
import { ListResult } from "#web/components/list-result.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { SearchBox } from "#web/components/search-box.tsx";
import { orderListQuery, readQueueAddress } from "#web/features/orders/queries.ts";
import { QueueTable } from "#web/features/orders/queue-table.tsx";
import { queryClient } from "#web/lib/query-client.ts";
import { useSession } from "#web/lib/session.ts";
import type { OrderListQuery } from "#shared/contracts/orders.ts";

const states: { value: OrderListQuery["state"]; name: string }[] = [
  { value: "placed", name: "Placed" },
  { value: "accepted", name: "Accepted" },
  { value: "declined", name: "Declined" },
];

export function loader({ request }: LoaderFunctionArgs) {
  const query = readQueueAddress(new URL(request.url).searchParams);
  void queryClient.prefetchQuery(orderListQuery(query));
  return null;
}

export function Component() {
  const [search] = useSearchParams();
  const query = readQueueAddress(search);
  const list = useQuery(orderListQuery(query));
  const timeZone = useSession()?.shop.timeZone;
  return (
    <div className="space-y-6">
      <PageHeading title="Orders" lead={countWords(query, list.data?.total)} />
      <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-4">
        <FilterLinks label="State" parameter="state" current={query.state} options={states} />
        <SearchBox label="Find an order by number, customer or build" />
      </div>
      <ListResult list={list} things="orders">
        {({ orders }) =>
          timeZone !== undefined && (
            <QueueTable orders={orders} timeZone={timeZone} empty={<NothingHere query={query} />} />
          )
        }
      </ListResult>
    </div>
  );
}

const leads: Partial<Record<OrderListQuery["state"], (total: number) => string>> = {
  placed: (total) => (total === 1 ? "One order waits for an answer." : `${total} orders wait for an answer.`),
  accepted: (total) => (total === 1 ? "One order is accepted." : `${total} orders are accepted.`),
  declined: (total) => (total === 1 ? "One order was declined." : `${total} orders were declined.`),
};

function countWords(query: OrderListQuery, total: number | undefined): string {
  if (total === undefined) return "\u00a0";
  if (query.search !== "") return total === 1 ? "One order found." : `${total} orders found.`;
  return leads[query.state]?.(total) ?? `${total} orders.`;
}

function NothingHere({ query }: { query: OrderListQuery }) {
  if (query.search !== "") {
    return (
      <Empty
        title={`No such order for \u201c${query.search}\u201d`}
        action={<ButtonLink to={`/floor?state=${query.state}`}>Show all</ButtonLink>}
      >
        Only orders of the state chosen above are searched. Check the characters, or choose another state.
      </Empty>
    );
  }
  if (query.state === "placed") {
    return <Empty title="No order waits">A new one appears here as soon as it is paid.</Empty>;
  }
  return (
    <Empty title="Nothing here yet" action={<ButtonLink to="/floor">Orders that wait</ButtonLink>}>
      Orders come here from the review of a placed one.
    </Empty>
  );
}
