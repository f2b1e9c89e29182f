import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { resetRequestSchema } from "#shared/contracts/account.ts";
import { PasswordField } from "./password-field.tsx";
import { useReset } from "./queries.ts";

const passwordSchema = resetRequestSchema.pick({ password: true });

interface ResetFormProps {
  token: string;
  onReset: () => void;
}

/** The new password, by the link of an e-mail. */
export function ResetForm({ token, onReset }: ResetFormProps) {
  const reset = useReset();
  const { register, handleSubmit, setError, formState } = useForm<z.input<typeof passwordSchema>>({
    resolver: zodResolver(passwordSchema),
    defaultValues: { password: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit(({ password }) => {
    if (reset.isPending) return;
    reset.mutate(
      { token, password },
      {
        onSuccess: onReset,
        onError: (error) => {
          showRefusal(error, ["password"], setError);
        },
      },
    );
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="max-w-form space-y-5">
      <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
      <PasswordField
        {...register("password")}
        label="New password"
        hint="At least 8 characters; 15 or more is better. A few unrelated words are easy to keep in mind."
        autoComplete="new-password"
        error={formState.errors.password?.message}
      />
      <div className="flex flex-wrap items-center gap-x-6 gap-y-3">
        <Button type="submit" look="main" busy={reset.isPending} busyLabel="Setting the password">
          Set the new password
        </Button>
        {reset.isError && (
          <TextLink to="/account/forgot" className="inline-flex min-h-target items-center">
            Send a new link
          </TextLink>
        )}
      </div>
    </form>
  );
}
