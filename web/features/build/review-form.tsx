import { zodResolver } from "@hookform/resolvers/zod";
import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { useForm, useWatch } from "react-hook-form";
import { useNavigate } from "react-router-dom";
import { engravingLength } from "#shared/catalogue/build-address.ts";
import { Button, ButtonLink } from "#web/components/button.tsx";
import { CautionLine } from "#web/components/caution-line.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { TextArea } from "#web/components/text-area.tsx";
import { TextField } from "#web/components/text-field.tsx";
import { catalogueQuery } from "#web/lib/catalogue.ts";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { ApiProblem } from "#web/lib/problems.ts";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { BrokenBuild } from "./broken-build.tsx";
import { BuildSheet } from "./build-sheet.tsx";
import { stopCount } from "./build-words.ts";
import { CartFault } from "./cart-fault.tsx";
import { ChosenAnswers } from "./chosen-answers.tsx";
import { EngravingPreview } from "./engraving-preview.tsx";
import { cartFieldsSchema, usePutInCart } from "./put-in-cart.ts";
import { keepSpecialRequest, specialRequestDraft } from "./special-request-draft.ts";
import { useSpecCode } from "./spec-code-copy.tsx";
import { StepHeading } from "./step-heading.tsx";
import { reviewStep } from "./step-list.tsx";
import { stepOf, WhatIsMissing } from "./what-is-missing.tsx";

const mostCharacters = 500;
const fields = ["engraving", "specialRequest", "quantity"] as const;

/** The last step: everything chosen, what is missing, the engraving, a special request, and into the cart. */
export function ReviewForm() {
  const { current, build, engraving, evaluation, setEngraving } = useBuildDesk();
  const navigate = useNavigate();
  const client = useQueryClient();
  const specCode = useSpecCode() ?? "";
  const putInCart = usePutInCart();
  const [sentCents, setSentCents] = useState<number | null>(null);
  const { register, handleSubmit, control, setError, setValue, formState } = useForm({
    resolver: zodResolver(cartFieldsSchema),
    // The summary takes focus and leads to each field.
    shouldFocusError: false,
    defaultValues: { engraving, specialRequest: specialRequestDraft(specCode), quantity: 1 },
  });

  const send = handleSubmit(async (values) => {
    const priceCents = evaluation.price?.totalCents;
    if (priceCents === undefined || !evaluation.orderable || putInCart.isPending) return;
    setSentCents(priceCents);
    try {
      await putInCart.mutateAsync({
        ...values,
        specCode,
        numbers: build.numbers,
        expectedPriceCents: priceCents,
      });
    } catch (error) {
      if (error instanceof ApiProblem && error.is("price-changed")) {
        await client.refetchQueries({ queryKey: catalogueQuery.queryKey });
      } else if (error instanceof ApiProblem && error.is("validation")) {
        showRefusal(error, fields, setError);
      }
      return;
    }
    keepSpecialRequest(specCode, "");
    await navigate("/cart");
  });

  const named = putInCart.error instanceof ApiProblem && putInCart.error.is("validation");
  const typedEngraving = useWatch({ control, name: "engraving" });
  const engravingField = register("engraving");
  const requestField = register("specialRequest");
  return (
    <form
      onSubmit={(event) => void send(event)}
      noValidate
      className="[&_:is(input,button,summary,a,textarea)]:scroll-my-32"
    >
      <StepHeading
        title="Review"
        position={current.catalogue.steps.length}
        intro="Look everything over. The shop checks the build once more before the block is made."
      />
      <BuildSheet here={reviewStep} action={<ReviewAction busy={putInCart.isPending} />}>
        <div className="space-y-8">
          <ErrorSummary errors={formErrors(formState.errors)} attempt={formState.submitCount} />
          {putInCart.error !== null && !named && <CartFault error={putInCart.error} sentCents={sentCents} />}
          <BrokenBuild />
          <WhatIsMissing />
          <ChosenAnswers />
          <section aria-labelledby="for-this-block" className="max-w-form space-y-6">
            <h2 id="for-this-block" className="text-xl">
              For this block
            </h2>
            <div>
              <TextField
                {...engravingField}
                label="Engraving"
                hint={`Up to ${engravingLength} characters on the front face: capitals, digits, blank, dot and hyphen. Travels in the address, so leave names out if you share the link.`}
                error={formState.errors.engraving?.message}
                optional
                maxLength={engravingLength}
                autoComplete="off"
                autoCapitalize="characters"
                spellCheck={false}
                className="uppercase"
                onChange={(event) => {
                  const text = event.target.value.toUpperCase();
                  setValue("engraving", text, { shouldValidate: formState.isSubmitted });
                  setEngraving(text);
                }}
              />
              <EngravingPreview text={typedEngraving ?? ""} />
            </div>
            <TextArea
              {...requestField}
              label="Special request"
              hint="Anything the form does not ask. The planner answers it before accepting the order."
              error={formState.errors.specialRequest?.message}
              optional
              most={mostCharacters}
              onChange={(event) => {
                keepSpecialRequest(specCode, event.target.value);
                void requestField.onChange(event);
              }}
            />
            <TextField
              {...register("quantity", { valueAsNumber: true })}
              label="Blocks"
              hint="All alike, up to 20 on a line."
              error={formState.errors.quantity?.message}
              inputMode="numeric"
              autoComplete="off"
              className="max-w-24 numerals"
            />
          </section>
          <CautionLine>
            A bare block weighs as much as a person: use a hoist and a stand rated for it. Freight arrives on
            a pallet. Tax and freight come at checkout and are estimates until invoiced.
          </CautionLine>
        </div>
      </BuildSheet>
    </form>
  );
}

/** Into the cart; or, while something is missing, on to what is missing. */
function ReviewAction({ busy }: { busy: boolean }) {
  const { current, evaluation, search } = useBuildDesk();
  if (evaluation.orderable) {
    return (
      <Button
        type="submit"
        look="main"
        busy={busy}
        busyLabel="Putting it in the cart"
        className="shrink-0 xl:w-44 xl:text-lg"
      >
        Put in the cart
      </Button>
    );
  }
  const stop = evaluation.findings.find(({ severity }) => severity === "stop");
  const [first] = evaluation.unanswered;
  const { steps } = current.catalogue;
  const target = stop?.step ?? (first === undefined ? "" : stepOf(first, steps));
  const stops = stopCount(evaluation);
  const left = evaluation.unanswered.length;
  return (
    <ButtonLink
      look="main"
      to={{ pathname: stepPath(target), search, ...(stop === undefined ? { hash: `#${first ?? ""}` } : {}) }}
      className="shrink-0 xl:w-44 xl:text-lg"
    >
      {stops > 0 ? "Mend the stop" : left === 1 ? "Answer the last one" : `Answer ${left} more`}
    </ButtonLink>
  );
}
