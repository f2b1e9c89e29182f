import { PageHeading } from "#web/components/page-heading.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { ForgotForm } from "#web/features/account/forgot-form.tsx";

export function Component() {
  return (
    <div className="space-y-8">
      <PageHeading
        title="Forgot the password"
        lead={
          <>
            A link that sets a new one comes by e-mail and works for 30 minutes. Remembered it?{" "}
            <TextLink to="/account/sign-in">Sign in</TextLink>.
          </>
        }
      />
      <ForgotForm />
    </div>
  );
}
