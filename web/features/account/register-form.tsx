import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { registerRequestSchema, type RegisterRequest } from "#shared/contracts/account.ts";
import { PasswordField } from "./password-field.tsx";
import { useRegister } from "./queries.ts";

/** Name, e-mail, password. The answer is the same for an address that has an account already. */
export function RegisterForm({ onRegistered }: { onRegistered: (message: string) => void }) {
  const enter = useRegister();
  const { register, handleSubmit, setError, formState } = useForm<RegisterRequest>({
    resolver: zodResolver(registerRequestSchema),
    defaultValues: { name: "", email: "", password: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit((request) => {
    if (enter.isPending) return;
    enter.mutate(request, {
      onSuccess: ({ message }) => {
        onRegistered(message);
      },
      onError: (error) => {
        showRefusal(error, ["name", "email", "password"], setError);
      },
    });
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="max-w-form space-y-5">
      <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
      <TextField
        {...register("name")}
        label="Name"
        autoComplete="name"
        error={formState.errors.name?.message}
      />
      <TextField
        {...register("email")}
        label="E-mail"
        hint="A message goes there with a link that confirms it."
        type="email"
        inputMode="email"
        autoComplete="email"
        spellCheck={false}
        error={formState.errors.email?.message}
      />
      <PasswordField
        {...register("password")}
        label="Password"
        hint="At least 8 characters; 15 or more is better. A few unrelated words are easy to keep in mind."
        autoComplete="new-password"
        error={formState.errors.password?.message}
      />
      <Button type="submit" look="main" busy={enter.isPending} busyLabel="Making the account">
        Make an account
      </Button>
    </form>
  );
}
