import { useNavigate } from "react-router-dom";
import { Button, ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { ChangePasswordForm } from "#web/features/account/change-password-form.tsx";
import { OwnDetails } from "#web/features/account/own-details.tsx";
import { useSignOut } from "#web/features/account/queries.ts";
import { useSession } from "#web/lib/session.ts";

export function Component() {
  const person = useSession()?.person;
  const signOut = useSignOut();
  const navigate = useNavigate();
  const leave = () => {
    signOut.mutate(undefined, { onSuccess: () => void navigate("/") });
  };
  if (person === undefined || person === null) {
    return (
      <div className="space-y-8">
        <PageHeading title="My account" />
        {person === undefined ? (
          <Skeleton lines={4} />
        ) : (
          <ButtonLink to="/account/sign-in?next=%2Faccount">Sign in</ButtonLink>
        )}
      </div>
    );
  }
  return (
    <div className="space-y-10">
      <PageHeading
        title="My account"
        actions={
          <Button busy={signOut.isPending} busyLabel="Signing out" onClick={leave}>
            Sign out
          </Button>
        }
      />
      {signOut.isError && <RequestFault error={signOut.error} />}
      <OwnDetails person={person} />
      <section aria-labelledby="password" className="space-y-4">
        <h2 id="password" className="text-2xl">
          Password
        </h2>
        <ChangePasswordForm />
      </section>
    </div>
  );
}
