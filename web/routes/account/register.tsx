import { useState } from "react";
import { useSearchParams } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { ownPath } from "#web/features/account/own-path.ts";
import { RegisterForm } from "#web/features/account/register-form.tsx";

export function Component() {
  const [search] = useSearchParams();
  const [message, setMessage] = useState<string | null>(null);
  const next = ownPath(search.get("next"));
  const signIn = next === null ? "/account/sign-in" : `/account/sign-in?next=${encodeURIComponent(next)}`;
  if (message !== null) {
    return (
      <div className="max-w-text space-y-6">
        <PageHeading title="Look in your mail" />
        <Notice kind="pass" live>
          {message}
        </Notice>
        <p>
          The link in it confirms the address. Nothing there after a few minutes? Look among the unwanted
          mail.
        </p>
        <ButtonLink to={signIn}>Sign in</ButtonLink>
      </div>
    );
  }
  return (
    <div className="space-y-8">
      <PageHeading
        title="Make an account"
        lead={
          <>
            It keeps your orders in one place. Have one already? <TextLink to={signIn}>Sign in</TextLink>.
          </>
        }
      />
      <RegisterForm onRegistered={setMessage} />
    </div>
  );
}
