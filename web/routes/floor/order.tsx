import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useParams, type LoaderFunctionArgs } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { useHoldOpen } from "#web/features/orders/hold-open.ts";
import { orderReviewQuery } from "#web/features/orders/queries.ts";
import { ReviewView } from "#web/features/orders/review-view.tsx";
import { ApiProblem } from "#web/lib/problems.ts";
import { queryClient } from "#web/lib/query-client.ts";
import { useSession } from "#web/lib/session.ts";

export function loader({ params }: LoaderFunctionArgs) {
  if (params.number !== undefined) void queryClient.prefetchQuery(orderReviewQuery(params.number));
  return null;
}

export function Component() {
  const { number = "" } = useParams();
  const review = useQuery(orderReviewQuery(number));
  const session = useSession();
  const present = session?.person?.role;
  const [role, setRole] = useState(present);
  // Whoever is signed out while they write keeps the form, with what they wrote.
  if (present !== undefined && present !== role) setRole(present);
  const mayDecide = role === "planner" || role === "office";
  useHoldOpen(number, present !== undefined && mayDecide && review.data?.state === "placed");
  return (
    <div className="space-y-6">
      <PageHeading over={<TextLink to="/floor">Orders</TextLink>} title={`Order ${number}`} />
      {review.data !== undefined && session !== undefined ? (
        <>
          {review.isError && <OutOfDate error={review.error} number={number} />}
          <ReviewView
            // Another order, another form.
            key={number}
            review={review.data}
            timeZone={session.shop.timeZone}
            mayDecide={mayDecide}
          />
        </>
      ) : review.isError ? (
        <RequestFault
          error={review.error}
          onRetry={() => void review.refetch()}
          retrying={review.isFetching}
          action={review.error instanceof ApiProblem && <ButtonLink to="/floor">Orders that wait</ButtonLink>}
        />
      ) : (
        <Skeleton lines={10} label="Reading the order" />
      )}
    </div>
  );
}

/** The order was read before, and cannot be read again. */
function OutOfDate({ error, number }: { error: Error; number: string }) {
  if (error instanceof ApiProblem && error.status === 401) {
    const next = encodeURIComponent(`/floor/orders/${number}`);
    return (
      <Notice
        kind="caution"
        title="You are signed out"
        action={<ButtonLink to={`/account/sign-in?next=${next}`}>Sign in</ButtonLink>}
      >
        Nothing was sent. What you typed is kept, and stands here again after you signed in.
      </Notice>
    );
  }
  return (
    <Notice kind="caution" title="What stands here may be out of date">
      The shop's server could not be reached just now. What you typed is kept.
    </Notice>
  );
}
