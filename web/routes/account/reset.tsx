import { useState } from "react";
import { ButtonLink } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { useAddressToken } from "#web/features/account/address-token.ts";
import { ResetForm } from "#web/features/account/reset-form.tsx";

export function Component() {
  const token = useAddressToken();
  const [done, setDone] = useState(false);
  if (done) {
    return (
      <div className="max-w-text space-y-6">
        <PageHeading title="The new password is set" />
        <Notice kind="pass" live>
          Every session that was open is ended. Sign in with the new password.
        </Notice>
        <ButtonLink to="/account/sign-in" look="main">
          Sign in
        </ButtonLink>
      </div>
    );
  }
  if (token === null) {
    return (
      <div className="space-y-6">
        <PageHeading
          title="This page opens from the link in the e-mail"
          lead="Open the link once more, or have a new one sent. A link works once, for 30 minutes."
        />
        <ButtonLink to="/account/forgot">Send a new link</ButtonLink>
      </div>
    );
  }
  return (
    <div className="space-y-8">
      <PageHeading title="Set a new password" lead="It ends every session that is open." />
      <ResetForm
        token={token}
        onReset={() => {
          setDone(true);
        }}
      />
    </div>
  );
}
