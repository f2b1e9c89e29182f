import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useSearchParams } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { PaymentResult, resultHeading } from "#web/features/checkout/payment-result.tsx";
import { checkoutCartQuery, checkoutResultQuery } from "#web/features/checkout/queries.ts";
import { ApiProblem } from "#web/lib/problems.ts";
import { useRefreshSession } from "#web/lib/session.ts";

export function Component() {
  const [search] = useSearchParams();
  const session = search.get("session");
  return session === null ? <Unknown /> : <Returned session={session} />;
}

function Returned({ session }: { session: string }) {
  const result = useQuery(checkoutResultQuery(session));
  const client = useQueryClient();
  const refreshSession = useRefreshSession();
  const paid = () => {
    void client.invalidateQueries({ queryKey: checkoutCartQuery.queryKey });
    void refreshSession();
  };
  if (result.data !== undefined) {
    return (
      <div className="space-y-8">
        <PageHeading over={`Order ${result.data.orderNumber}`} title={resultHeading(result.data.state)} />
        {result.isError && (
          <Notice kind="caution" title="The shop's server could not be reached just now">
            This page asks again. The payment is not touched by that.
          </Notice>
        )}
        <PaymentResult result={result.data} onPaid={paid} />
      </div>
    );
  }
  if (result.isError) {
    const unknown = result.error instanceof ApiProblem && result.error.status < 500;
    if (unknown) return <Unknown />;
    return (
      <div className="space-y-8">
        <PageHeading
          title="Payment"
          lead="If you paid, the order stands whatever this page shows, and the receipt comes by e-mail."
        />
        <RequestFault
          error={result.error}
          onRetry={() => void result.refetch()}
          retrying={result.isFetching}
        />
      </div>
    );
  }
  return (
    <div className="space-y-8">
      <PageHeading title="Payment" />
      <Skeleton lines={4} label="Asking how the payment stands" />
    </div>
  );
}

function Unknown() {
  return (
    <div className="space-y-8">
      <PageHeading
        title="This payment cannot be shown here"
        lead="If you paid, the order stands and the receipt comes by e-mail, with a link that opens the order."
      />
      <div className="flex flex-wrap gap-3">
        <ButtonLink to="/account/orders">My orders</ButtonLink>
        <ButtonLink to="/cart">Open the cart</ButtonLink>
      </div>
    </div>
  );
}
