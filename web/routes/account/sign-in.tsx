import { useState } from "react";
import { useNavigate, useSearchParams } from "react-router-dom";
import { useAnnounce } from "#web/components/announcer.tsx";
import { Button, ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { Skeleton } from "#web/components/skeleton.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { ownPath } from "#web/features/account/own-path.ts";
import { useSignOut } from "#web/features/account/queries.ts";
import { SignInForm } from "#web/features/account/sign-in-form.tsx";
import { queryClient } from "#web/lib/query-client.ts";
import { mayEnter, sessionQuery, useSession } from "#web/lib/session.ts";
import type { PersonView } from "#shared/contracts/person.ts";

/** Where each person's work is, when no page was asked for. */
function workplace(person: PersonView | null): string {
  if (person === null) return "/";
  if (mayEnter("office", person.role)) return "/office";
  return mayEnter("floor", person.role) ? "/floor" : "/account/orders";
}

export function Component() {
  const [search] = useSearchParams();
  const session = useSession();
  const navigate = useNavigate();
  const announce = useAnnounce();
  // Held while the way onward is walked, so that the page does not first turn into "signed in already".
  const [leaving, setLeaving] = useState(false);
  const next = ownPath(search.get("next"));
  const register = next === null ? "/account/register" : `/account/register?next=${encodeURIComponent(next)}`;

  const goOn = () => {
    setLeaving(true);
    const person = queryClient.getQueryData(sessionQuery.queryKey)?.person ?? null;
    announce(`Signed in as ${person?.name ?? ""}.`);
    void navigate(next ?? workplace(person), { replace: true });
  };

  if (session === undefined) {
    return (
      <div className="space-y-8">
        <PageHeading title="Sign in" />
        <Skeleton lines={4} />
      </div>
    );
  }
  if (session.person !== null && !leaving) {
    return <SignedInAlready person={session.person} next={next ?? workplace(session.person)} />;
  }
  return (
    <div className="space-y-8">
      <PageHeading
        title="Sign in"
        lead={
          <>
            No account yet? <TextLink to={register}>Make one</TextLink>. Buying works without.
          </>
        }
      />
      <SignInForm demo={session.demo} onSignedIn={goOn} />
    </div>
  );
}

function SignedInAlready({ person, next }: { person: PersonView; next: string }) {
  const signOut = useSignOut();
  return (
    <div className="space-y-6">
      <PageHeading title={`Signed in as ${person.name}`} lead={person.email} />
      <div className="flex flex-wrap gap-3">
        <ButtonLink to={next} look="main">
          Go on
        </ButtonLink>
        <Button
          busy={signOut.isPending}
          busyLabel="Signing out"
          onClick={() => {
            signOut.mutate();
          }}
        >
          Sign in as somebody else
        </Button>
      </div>
      {signOut.isError && <RequestFault error={signOut.error} />}
    </div>
  );
}
