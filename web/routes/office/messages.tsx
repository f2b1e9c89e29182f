import { useQuery } from "@tanstack/react-query";
import { useSearchParams, type LoaderFunctionArgs } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Empty } from "#web/components/empty.tsx";
import { FilterLinks } from "#web/components/filter-links.tsx";
import { ListResult } from "#web/components/list-result.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { SearchBox } from "#web/components/search-box.tsx";
import { MessageTable } from "#web/features/messages/message-table.tsx";
import { messageListQuery, readMessagesAddress } from "#web/features/messages/queries.ts";
import { queryClient } from "#web/lib/query-client.ts";
import { useSession } from "#web/lib/session.ts";
import type { MessageListQuery } from "#shared/contracts/messages.ts";

const states = [
  { value: "all", name: "All" },
  { value: "waiting", name: "Waiting" },
  { value: "sent", name: "Sent" },
];

export function loader({ request }: LoaderFunctionArgs) {
  const query = readMessagesAddress(new URL(request.url).searchParams);
  void queryClient.prefetchQuery(messageListQuery(query));
  return null;
}

export function Component() {
  const [search] = useSearchParams();
  const query = readMessagesAddress(search);
  const list = useQuery(messageListQuery(query));
  const timeZone = useSession()?.shop.timeZone;
  return (
    <div className="space-y-6">
      <PageHeading title="Messages" lead="Every e-mail of the shop, sent or waiting to go out." />
      <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-4">
        <FilterLinks label="State" parameter="state" current={query.state ?? "all"} options={states} />
        <SearchBox label="Find a message by receiver, subject or order" />
      </div>
      <ListResult list={list} things="messages">
        {({ messages }) =>
          timeZone !== undefined && (
            <MessageTable messages={messages} timeZone={timeZone} empty={<NothingHere query={query} />} />
          )
        }
      </ListResult>
    </div>
  );
}

function NothingHere({ query }: { query: MessageListQuery }) {
  if (query.search !== "") {
    return (
      <Empty
        title={`No message for \u201c${query.search}\u201d`}
        action={<ButtonLink to="/office/messages">Show all</ButtonLink>}
      >
        Check the spelling, or look among all states.
      </Empty>
    );
  }
  if (query.state === "waiting") return <Empty title="No message waits">All have gone out.</Empty>;
  return <Empty title="No message yet">The first order or account writes the first one.</Empty>;
}
