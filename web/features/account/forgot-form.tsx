import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { Notice } from "#web/components/notice.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { forgotRequestSchema, type ForgotRequest } from "#shared/contracts/account.ts";
import { useForgot } from "./queries.ts";

/** Asks for a link that sets a new password. The answer is the same for an unknown address. */
export function ForgotForm() {
  const ask = useForgot();
  const { register, handleSubmit, setError, formState } = useForm<ForgotRequest>({
    resolver: zodResolver(forgotRequestSchema),
    defaultValues: { email: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit((request) => {
    if (ask.isPending) return;
    ask.mutate(request, {
      onError: (error) => {
        showRefusal(error, ["email"], setError);
      },
    });
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="max-w-form space-y-5">
      <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
      {ask.isSuccess && (
        <Notice kind="pass" live>
          {ask.data.message}
        </Notice>
      )}
      <TextField
        {...register("email")}
        label="E-mail"
        hint="The one of your account."
        type="email"
        inputMode="email"
        autoComplete="username"
        spellCheck={false}
        error={formState.errors.email?.message}
      />
      <Button type="submit" look="main" busy={ask.isPending} busyLabel="Sending">
        Send a link
      </Button>
    </form>
  );
}
