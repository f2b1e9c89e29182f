import { useQuery } from "@tanstack/react-query";
import { useParams, type LoaderFunctionArgs } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { MessageDetail } from "#web/features/messages/message-detail.tsx";
import { messageQuery } from "#web/features/messages/queries.ts";
import { queryClient } from "#web/lib/query-client.ts";
import { useSession } from "#web/lib/session.ts";

export function loader({ params }: LoaderFunctionArgs) {
  if (params.id !== undefined) void queryClient.prefetchQuery(messageQuery(params.id));
  return null;
}

export function Component() {
  const { id = "" } = useParams();
  const message = useQuery(messageQuery(id));
  const timeZone = useSession()?.shop.timeZone;
  return (
    <div className="space-y-6">
      <PageHeading
        over={<TextLink to="/office/messages">Messages</TextLink>}
        title={message.data?.subject ?? "Message"}
      />
      {message.data !== undefined && timeZone !== undefined ? (
        <MessageDetail key={id} message={message.data} timeZone={timeZone} />
      ) : message.isError ? (
        <RequestFault
          error={message.error}
          onRetry={() => void message.refetch()}
          retrying={message.isFetching}
          action={<ButtonLink to="/office/messages">All messages</ButtonLink>}
        />
      ) : (
        <Skeleton lines={8} label="Reading the message" />
      )}
    </div>
  );
}
