import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { Notice } from "#web/components/notice.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { changePasswordRequestSchema, type ChangePasswordRequest } from "#shared/contracts/account.ts";
import { PasswordField } from "./password-field.tsx";
import { useChangePassword } from "./queries.ts";

/** The present password and the new one. */
export function ChangePasswordForm() {
  const change = useChangePassword();
  const { register, handleSubmit, setError, reset, formState } = useForm<ChangePasswordRequest>({
    resolver: zodResolver(changePasswordRequestSchema),
    defaultValues: { currentPassword: "", newPassword: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit((request) => {
    if (change.isPending) return;
    change.mutate(request, {
      onSuccess: () => {
        reset();
      },
      onError: (error) => {
        showRefusal(error, ["currentPassword", "newPassword"], setError);
      },
    });
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="max-w-form space-y-5">
      <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
      {change.isSuccess && (
        <Notice kind="pass" live title="The password is changed">
          Everywhere else you are signed out.
        </Notice>
      )}
      <PasswordField
        {...register("currentPassword")}
        label="Present password"
        autoComplete="current-password"
        error={formState.errors.currentPassword?.message}
      />
      <PasswordField
        {...register("newPassword")}
        label="New password"
        hint="At least 8 characters; 15 or more is better."
        autoComplete="new-password"
        error={formState.errors.newPassword?.message}
      />
      <Button type="submit" busy={change.isPending} busyLabel="Changing the password">
        Change the password
      </Button>
    </form>
  );
}
