import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { signInRequestSchema, type SignInRequest } from "#shared/contracts/account.ts";
import type { DemoView } from "#shared/contracts/session.ts";
import { DemoAccounts } from "./demo-accounts.tsx";
import { PasswordField } from "./password-field.tsx";
import { useSignIn } from "./queries.ts";

interface SignInFormProps {
  /** Shows the demo's accounts and fills them in. */
  demo: DemoView | null;
  onSignedIn: () => void;
}

/** E-mail and password. The answer to a wrong one does not say which of the two it was. */
export function SignInForm({ demo, onSignedIn }: SignInFormProps) {
  const signIn = useSignIn();
  const { register, handleSubmit, setError, setValue, formState } = useForm<SignInRequest>({
    resolver: zodResolver(signInRequestSchema),
    defaultValues: { email: "", password: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit((request) => {
    if (signIn.isPending) return;
    signIn.mutate(request, {
      onSuccess: onSignedIn,
      onError: (error) => {
        showRefusal(error, ["email", "password"], setError);
      },
    });
  });
  return (
    <div className="grid gap-x-16 gap-y-10 lg:grid-cols-[minmax(0,34rem)_1fr]">
      <form noValidate onSubmit={(event) => void submit(event)} className="max-w-form space-y-5">
        <ErrorSummary
          title="Not signed in"
          errors={formErrors(formState.errors)}
          attempt={formState.submitCount}
        />
        <TextField
          {...register("email")}
          label="E-mail"
          type="email"
          inputMode="email"
          autoComplete="username"
          spellCheck={false}
          error={formState.errors.email?.message}
        />
        <PasswordField
          {...register("password")}
          label="Password"
          autoComplete="current-password"
          error={formState.errors.password?.message}
        />
        <div className="flex flex-wrap items-center gap-x-6 gap-y-3">
          <Button type="submit" look="main" busy={signIn.isPending} busyLabel="Signing in">
            Sign in
          </Button>
          <TextLink to="/account/forgot" className="inline-flex min-h-target items-center">
            Forgot the password
          </TextLink>
        </div>
      </form>
      {demo && (
        <DemoAccounts
          demo={demo}
          onChoose={({ email, password }) => {
            setValue("email", email);
            setValue("password", password);
          }}
        />
      )}
    </div>
  );
}
