import { zodResolver } from "@hookform/resolvers/zod";
import { useQuery } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { FormProvider, useForm, useWatch } from "react-hook-form";
import { Button } from "#web/components/button.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { RequestFault } from "#web/components/request-fault.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { money } from "#web/lib/format.ts";
import { ApiProblem } from "#web/lib/problems.ts";
import { deliverySchema } from "#shared/contracts/address.ts";
import type { CartView } from "#shared/contracts/cart.ts";
import type { SessionView } from "#shared/contracts/session.ts";
import {
  checkoutPaths,
  checkoutSchema,
  keepFields,
  startingFields,
  type CheckoutAnswers,
  type CheckoutFields,
} from "./checkout-fields.ts";
import { DeliveryFields } from "./delivery-fields.tsx";
import { OrderAmounts } from "./order-amounts.tsx";
import { PlacingFault } from "./placing-fault.tsx";
import { totalsQuery, usePlaceOrder } from "./queries.ts";
import { useSettled } from "./settled.ts";

interface CheckoutFormProps {
  cart: CartView;
  person: SessionView["person"];
  /** Leaves for the payment page. */
  onPay: (paymentUrl: string) => void;
}

/** Who, where to, what it costs, and the button that leaves for the payment page. */
export function CheckoutForm({ cart, person, onPay }: CheckoutFormProps) {
  const [fields] = useState(() => startingFields(person));
  const form = useForm<CheckoutFields, unknown, CheckoutAnswers>({
    resolver: zodResolver(checkoutSchema),
    defaultValues: fields,
    // The summary takes focus; a jump to the first field would pass it by.
    shouldFocusError: false,
  });
  const { control, register, handleSubmit, setError, formState } = form;
  const typed = useWatch({ control });
  useEffect(() => {
    keepFields(typed);
  }, [typed]);

  const delivery = useSettled(deliverySchema.safeParse(typed.delivery).data ?? null);
  const totals = useQuery(totalsQuery(delivery));
  const shown = delivery === null ? undefined : totals.data;
  const stale = totals.isPlaceholderData || totals.isFetching;

  const place = usePlaceOrder();
  const [leaving, setLeaving] = useState(false);
  const { reset } = place;
  useEffect(() => {
    // Back from the payment page, the browser may show this very page again as it was left.
    const shownAgain = (event: PageTransitionEvent) => {
      if (!event.persisted) return;
      setLeaving(false);
      reset();
    };
    window.addEventListener("pageshow", shownAgain);
    return () => {
      window.removeEventListener("pageshow", shownAgain);
    };
  }, [reset]);

  const busy = place.isPending || leaving;
  const pay = handleSubmit((answers) => {
    if (busy) return;
    if (shown === undefined || stale) {
      setError("root.total", {
        type: "total",
        message: totals.isError
          ? "The total could not be worked out. Try again below, then pay."
          : "The total was still being worked out. Look at it, then pay.",
      });
      return;
    }
    place.mutate(
      { ...answers, expectedTotalCents: shown.totalCents },
      {
        onSuccess: ({ paymentUrl }) => {
          setLeaving(true);
          onPay(paymentUrl);
        },
        onError: (error) => {
          if (error instanceof ApiProblem && error.is("validation"))
            showRefusal(error, checkoutPaths, setError);
        },
      },
    );
  });

  const errors = formErrors(formState.errors);
  const messageOf = (path: string) => errors.find((error) => error.field === path)?.message;
  return (
    <FormProvider {...form}>
      <form
        noValidate
        onSubmit={(event) => void pay(event)}
        className="grid gap-x-16 gap-y-8 lg:grid-cols-[minmax(0,34rem)_1fr]"
      >
        <div className="max-w-form space-y-8">
          <ErrorSummary errors={errors} attempt={formState.submitCount} />
          <fieldset className="space-y-5">
            <legend className="mb-3 font-condensed text-xl font-semibold">Who orders</legend>
            <TextField
              {...register("contact.name")}
              label="Name"
              autoComplete="name"
              error={messageOf("contact.name")}
            />
            <TextField
              {...register("contact.email")}
              label="E-mail"
              hint="The receipt and the promised date go here."
              type="email"
              inputMode="email"
              autoComplete="email"
              spellCheck={false}
              error={messageOf("contact.email")}
            />
            <TextField
              {...register("contact.phone")}
              label="Telephone"
              hint="For the carrier's delivery appointment, and for the shop's questions."
              type="tel"
              inputMode="tel"
              autoComplete="tel"
              error={messageOf("contact.phone")}
            />
          </fieldset>
          <fieldset className="space-y-5">
            <legend className="mb-3 font-condensed text-xl font-semibold">Delivery</legend>
            <DeliveryFields messageOf={messageOf} />
          </fieldset>
        </div>
        <div className="max-w-form space-y-6 self-start lg:sticky lg:top-8">
          <section aria-labelledby="amounts" className="space-y-4">
            <h2 id="amounts" className="text-xl">
              What it costs
            </h2>
            <OrderAmounts cart={cart} totals={shown} stale={shown !== undefined && stale} />
            {totals.isError && (
              <RequestFault
                error={totals.error}
                onRetry={() => void totals.refetch()}
                retrying={totals.isFetching}
              />
            )}
          </section>
          <PlacingFault error={place.error} seenCents={place.variables?.expectedTotalCents ?? null} />
          <div className="space-y-2">
            <Button
              type="submit"
              look="main"
              wide
              busy={busy}
              busyLabel={leaving ? "Opening the payment page" : "Placing the order"}
            >
              {shown === undefined ? "Pay" : `Pay ${money(shown.totalCents)}`}
            </Button>
            <p className="text-sm text-iron">
              Places the order and opens the secure payment page. Card details are typed there, never here.
            </p>
          </div>
        </div>
      </form>
    </FormProvider>
  );
}
