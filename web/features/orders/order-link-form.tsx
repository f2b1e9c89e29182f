import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { Notice } from "#web/components/notice.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { emailAddressSchema } from "#shared/contracts/person.ts";
import { readOrderNumber } from "#shared/orders/order-number.ts";
import { useSendOrderLink } from "./queries.ts";

const linkSchema = z.object({
  orderNumber: z.string().transform((text, context) => {
    const number = readOrderNumber(text);
    if (number !== null) return number;
    context.addIssue({
      code: "custom",
      message: "Write the order number as it stands in the receipt, like K7Q4-M2XD; one character is off.",
    });
    return z.NEVER;
  }),
  email: emailAddressSchema,
});
type LinkFields = z.input<typeof linkSchema>;

/** Asks for a new link to an order by its number and the buyer's e-mail. */
export function OrderLinkForm({ orderNumber }: { orderNumber: string }) {
  const send = useSendOrderLink();
  const { register, handleSubmit, setError, formState } = useForm<
    LinkFields,
    unknown,
    z.output<typeof linkSchema>
  >({
    resolver: zodResolver(linkSchema),
    defaultValues: { orderNumber, email: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit((request) => {
    if (send.isPending) return;
    send.mutate(request, {
      onError: (error) => {
        showRefusal(error, ["orderNumber", "email"], setError);
      },
    });
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="max-w-form space-y-5">
      <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
      {send.isSuccess && (
        <Notice kind="pass" live>
          {send.data.message}
        </Notice>
      )}
      <TextField
        {...register("orderNumber")}
        label="Order number"
        hint="Eight characters; it stands in the receipt."
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        className="max-w-48 text-lg numerals"
        error={formState.errors.orderNumber?.message}
      />
      <TextField
        {...register("email")}
        label="E-mail"
        hint="The one that was given with the order."
        type="email"
        inputMode="email"
        autoComplete="email"
        spellCheck={false}
        error={formState.errors.email?.message}
      />
      <Button type="submit" look="main" busy={send.isPending} busyLabel="Sending">
        Send a new link
      </Button>
    </form>
  );
}
