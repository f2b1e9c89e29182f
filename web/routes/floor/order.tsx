import { useQuery } from "@tanstack/react-query";
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
  const role = session?.person?.role;
  const mayDecide = role === "planner" || role === "office";
  useHoldOpen(number, mayDecide && review.data?.state === "placed");
  return (
    <div className="space-y-6">
      <PageHeading over={<TextLink to="/floor">Orders</TextLink>} title={`Order ${number}`} />
      {review.data !== undefined && session !== undefined ? (
        <>
          {review.isError && (
            <Notice kind="caution" title="What stands here may be out of date">
              The shop's server could not be reached just now. What you typed is kept.
            </Notice>
          )}
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
