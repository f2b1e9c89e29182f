import { useQuery } from "@tanstack/react-query";
import { PageHeading } from "#web/components/page-heading.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { messageListQuery } from "#web/features/messages/queries.ts";
import { orderListQuery } from "#web/features/orders/queries.ts";

const placed = orderListQuery({ state: "placed", search: "", page: 1 });
const waiting = messageListQuery({ state: "waiting", search: "", page: 1 });

export function Component() {
  const orders = useQuery(placed).data?.total;
  const messages = useQuery(waiting).data?.total;
  return (
    <div className="space-y-8">
      <PageHeading title="Overview" />
      <dl className="max-w-text border-t-2 border-ink">
        <Entry
          to="/floor"
          name="Orders that wait for an answer"
          count={orders}
          text="Accept or decline them on the Floor."
        />
        <Entry
          to="/office/messages?state=waiting"
          name="Messages that wait to go out"
          count={messages}
          text="A few are no worry: they leave within moments. Many mean that the mail server is down."
        />
        <Entry to="/office/messages" name="All messages" text="Read what was sent, and send it again." />
      </dl>
    </div>
  );
}

interface EntryProps {
  to: string;
  name: string;
  /** Left out where nothing is counted. */
  count?: number | undefined;
  text: string;
}

function Entry({ to, name, count, text }: EntryProps) {
  return (
    <div className="relative flex items-start justify-between gap-6 border-b border-rule py-4 hover:bg-wash">
      <dt>
        <TextLink to={to} className="text-lg font-medium after:absolute after:inset-0">
          {name}
        </TextLink>
        <span className="block text-iron">{text}</span>
      </dt>
      <dd className="text-2xl numerals">{count}</dd>
    </div>
  );
}
