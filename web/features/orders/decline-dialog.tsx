import { zodResolver } from "@hookform/resolvers/zod";
import { useId } from "react";
import { useForm } from "react-hook-form";
import { useAnnounce } from "#web/components/announcer.tsx";
import { Button } from "#web/components/button.tsx";
import { Dialog } from "#web/components/dialog.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { TextArea } from "#web/components/text-area.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { money } from "#web/lib/format.ts";
import { forget } from "#web/lib/kept.ts";
import {
  declineOrderRequestSchema,
  type DeclineOrderRequest,
  type OrderReview,
} from "#shared/contracts/orders.ts";
import { acceptKeptUnder } from "./accept-fields.ts";
import { useDeclineOrder } from "./queries.ts";

interface DeclineDialogProps {
  review: OrderReview;
  open: boolean;
  onClose: () => void;
}

/** Asks why the order is declined and says what follows from it. */
export function DeclineDialog({ review, open, onClose }: DeclineDialogProps) {
  const formId = useId();
  const announce = useAnnounce();
  const decline = useDeclineOrder(review.number);
  const { register, handleSubmit, setError, formState } = useForm<DeclineOrderRequest>({
    resolver: zodResolver(declineOrderRequestSchema),
    defaultValues: { reason: "" },
    shouldFocusError: false,
  });
  const submit = handleSubmit((request) => {
    if (decline.isPending) return;
    decline.mutate(request, {
      onSuccess: () => {
        onClose();
        forget(acceptKeptUnder(review.number));
        document.getElementById("page")?.focus();
        announce(`Order ${review.number} is declined; ${money(review.paidCents)} goes back.`);
      },
      onError: (error) => {
        showRefusal(error, ["reason"], setError);
      },
    });
  });
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={`Decline order ${review.number}`}
      actions={
        <>
          <Button onClick={onClose}>Keep the order</Button>
          <Button
            type="submit"
            form={formId}
            look="danger"
            busy={decline.isPending}
            busyLabel="Declining the order"
          >
            Decline and return {money(review.paidCents)}
          </Button>
        </>
      }
    >
      <form id={formId} noValidate onSubmit={(event) => void submit(event)} className="space-y-4">
        <p>
          {review.contact.name} is told by e-mail, and {money(review.paidCents)} goes back to the card by
          itself. This cannot be undone.
        </p>
        <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
        <TextArea
          {...register("reason")}
          label="Reason"
          hint="The customer reads it as it stands."
          most={500}
          error={formState.errors.reason?.message}
        />
      </form>
    </Dialog>
  );
}
