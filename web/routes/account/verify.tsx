import { Button, ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { useAddressToken } from "#web/features/account/address-token.ts";
import { useVerify } from "#web/features/account/queries.ts";
import { ApiProblem } from "#web/lib/problems.ts";
import { useSession } from "#web/lib/session.ts";

export function Component() {
  const token = useAddressToken();
  const verify = useVerify();
  const person = useSession()?.person ?? null;
  const refused =
    verify.error instanceof ApiProblem && verify.error.status < 500 && verify.error.status !== 429;
  if (verify.isSuccess) {
    return (
      <div className="max-w-text space-y-6">
        <PageHeading title="Your e-mail address is confirmed" />
        <Notice kind="pass" live title="Confirmed">
          Orders that were placed with this address as a guest stand in your account now.
        </Notice>
        {person === null ? (
          <ButtonLink to="/account/sign-in" look="main">
            Sign in
          </ButtonLink>
        ) : (
          <ButtonLink to="/account/orders" look="main">
            My orders
          </ButtonLink>
        )}
      </div>
    );
  }
  if (token === null || refused) {
    return (
      <div className="space-y-6">
        <PageHeading
          title="This link cannot confirm an address"
          lead={
            token === null
              ? "Open the link in the message once more."
              : "It was used already, or it is too old. Your account can send a new one."
          }
        />
        <ButtonLink to={person === null ? "/account/sign-in?next=%2Faccount" : "/account"}>
          {person === null ? "Sign in" : "My account"}
        </ButtonLink>
      </div>
    );
  }
  return (
    <div className="space-y-6">
      <PageHeading title="Confirm your e-mail address" lead="One press, and it is done." />
      {verify.isError && <RequestFault error={verify.error} />}
      <Button
        look="main"
        busy={verify.isPending}
        busyLabel="Confirming"
        onClick={() => {
          verify.mutate({ token });
        }}
      >
        Confirm the address
      </Button>
    </div>
  );
}
