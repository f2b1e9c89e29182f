import { zodResolver } from "@hookform/resolvers/zod";
import { useEffect, useState, type ReactNode } from "react";
import { useForm, useWatch } from "react-hook-form";
import { useAnnounce } from "#web/components/announcer.tsx";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { TextArea } from "#web/components/text-area.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { date } from "#web/lib/format.ts";
import { forget, keep } from "#web/lib/kept.ts";
import type { AcceptOrderRequest, OrderReview } from "#shared/contracts/orders.ts";
import {
  acceptKeptUnder,
  acceptSchema,
  linesToAnswer,
  startingAcceptFields,
  type AcceptFields,
} from "./accept-fields.ts";
import { DeclineDialog } from "./decline-dialog.tsx";
import { OrderLines } from "./order-lines.tsx";
import { useAcceptOrder } from "./queries.ts";

interface DecisionFormProps {
  review: OrderReview;
  /** Stands under the decision, beside the lines. */
  children: ReactNode;
}

/** The planner's review of a placed order: an answer to every special request, the promised date, accept or decline. */
export function DecisionForm({ review, children }: DecisionFormProps) {
  const announce = useAnnounce();
  const accept = useAcceptOrder(review.number);
  const [declining, setDeclining] = useState(false);
  const [start] = useState(() => startingAcceptFields(review));
  const { register, handleSubmit, setError, resetField, control, formState } = useForm<
    AcceptFields,
    unknown,
    AcceptOrderRequest
  >({
    resolver: zodResolver(acceptSchema(review)),
    defaultValues: { ...start, promisedShipOn: review.proposedShipOn },
    values: start,
    resetOptions: { keepDefaultValues: true },
    shouldFocusError: false,
  });
  const typed = useWatch({ control });
  const isOwnDate = typed.promisedShipOn !== review.proposedShipOn;
  const dateTouched = formState.dirtyFields.promisedShipOn === true;

  useEffect(() => {
    // The estimate moved since the page was opened, and nobody chose another date: the field follows.
    if (!dateTouched) resetField("promisedShipOn", { defaultValue: review.proposedShipOn });
  }, [dateTouched, resetField, review.proposedShipOn]);

  useEffect(() => {
    keep(acceptKeptUnder(review.number), {
      promisedShipOn: dateTouched ? (typed.promisedShipOn ?? null) : null,
      dateReason: typed.dateReason ?? "",
      answers: typed.answers ?? {},
    });
  }, [typed, dateTouched, review.number]);

  const submit = handleSubmit((request) => {
    if (accept.isPending) return;
    const dateReason = request.promisedShipOn === review.proposedShipOn ? "" : request.dateReason;
    accept.mutate(
      { ...request, dateReason },
      {
        onSuccess: () => {
          forget(acceptKeptUnder(review.number));
          // The button that had focus is gone; the answer stands at the top.
          document.getElementById("page")?.focus();
          announce(`Order ${review.number} is accepted; it ships on ${date(request.promisedShipOn)}.`);
        },
        onError: (error) => {
          const answers = linesToAnswer(review).map((line) => `answers.${line.id}` as const);
          showRefusal(error, ["promisedShipOn", "dateReason", ...answers], setError);
        },
      },
    );
  });

  const answerTo = (line: OrderReview["lines"][number]) =>
    line.specialRequest === "" ? undefined : (
      <TextArea
        {...register(`answers.${line.id}`)}
        label="Answer to the special request"
        hint="The customer reads it in the e-mail and on the order."
        most={500}
        defaultValue={start.answers[line.id] ?? ""}
        error={formState.errors.answers?.[line.id]?.message}
      />
    );

  return (
    <>
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-10">
        <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
        <div className="grid gap-x-12 gap-y-10 lg:grid-cols-[1fr_22rem]">
          <OrderLines order={review} answerTo={answerTo} />
          <div className="space-y-10">
            <section aria-labelledby="decision" className="space-y-5">
              <h2 id="decision" className="text-2xl">
                Answer the customer
              </h2>
              <TextField
                {...register("promisedShipOn")}
                label="Ships on, as promised"
                hint={`Estimated today: ${date(review.proposedShipOn)}. The customer is told this date.`}
                type="date"
                className="max-w-60 text-lg numerals"
                error={formState.errors.promisedShipOn?.message}
              />
              {isOwnDate && (
                <TextField
                  {...register("dateReason")}
                  label="Why not the estimated date"
                  hint="Kept in the order's history, where the customer reads it too."
                  maxLength={300}
                  error={formState.errors.dateReason?.message}
                />
              )}
              <div className="space-y-3">
                <Button
                  type="submit"
                  look="main"
                  wide
                  busy={accept.isPending}
                  busyLabel="Accepting the order"
                >
                  Accept and tell the customer
                </Button>
                <Button
                  wide
                  onClick={() => {
                    setDeclining(true);
                  }}
                >
                  Decline
                </Button>
              </div>
            </section>
            {children}
          </div>
        </div>
      </form>
      <DeclineDialog
        review={review}
        open={declining}
        onClose={() => {
          setDeclining(false);
        }}
      />
    </>
  );
}
