import type { SubmitEvent } from "react";
import { useNavigate } from "react-router-dom";
import type { Step } from "#shared/catalogue/catalogue.ts";
import { Button } from "#web/components/button.tsx";
import { CautionLine } from "#web/components/caution-line.tsx";
import { Notice } from "#web/components/notice.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { BrokenBuild } from "./broken-build.tsx";
import { BuildSheet } from "./build-sheet.tsx";
import { ChoiceQuestion } from "./choice-question.tsx";
import { EarlierBuild } from "./earlier-build.tsx";
import { NumberGroups } from "./number-groups.tsx";
import { StepHeading } from "./step-heading.tsx";
import { reviewStep } from "./step-list.tsx";
import { stepOf } from "./what-is-missing.tsx";

/** One step of the form. Enter goes on to the next; nothing has to be answered before. */
export function StepForm({ step }: { step: Step }) {
  const { current, evaluationFor, build, problems, search } = useBuildDesk();
  const navigate = useNavigate();
  const { catalogue } = current;
  const position = catalogue.steps.indexOf(step);
  const next = catalogue.steps[position + 1];
  const goOn = (event: SubmitEvent) => {
    event.preventDefault();
    void navigate({ pathname: stepPath(next?.id ?? reviewStep), search });
  };
  return (
    <form onSubmit={goOn} noValidate className="[&_:is(input,button,summary,a,textarea)]:scroll-my-32">
      <StepHeading title={step.name} position={position} intro={step.intro} />
      <BuildSheet
        here={step.id}
        action={
          <Button type="submit" look="main" className="shrink-0 xl:w-44 xl:text-lg">
            <span className="xl:hidden">Next</span>
            <span className="hidden xl:inline">Next: {next?.name ?? "Review"}</span>
          </Button>
        }
      >
        <div className="space-y-10">
          <div className="space-y-2 empty:hidden">
            {problems.length > 0 && (
              <Notice kind="caution" title="Part of the address could not be read and was left out">
                {problems.join(" ")}
              </Notice>
            )}
            <EarlierBuild />
            <BrokenBuild />
            {step.caution !== undefined && <CautionLine>{step.caution}</CautionLine>}
            {build.answers["family"] === undefined && !step.choices.includes("family") && (
              <p className="pl-6 text-sm text-iron">
                Prices, days and weights show once a{" "}
                <TextLink to={{ pathname: stepPath(stepOf("family", catalogue.steps)), search }}>
                  family
                </TextLink>{" "}
                is chosen.
              </p>
            )}
          </div>
          {step.choices.map((id) => {
            const choice = catalogue.choices.find((candidate) => candidate.id === id);
            const state = evaluationFor(id).choices.find((candidate) => candidate.choice === id);
            if (choice === undefined || state === undefined) return null;
            return (
              <div key={id} id={id} className="scroll-mt-4">
                <ChoiceQuestion choice={choice} state={state} />
                <NumberGroups step={step} choice={id} />
              </div>
            );
          })}
          <NumberGroups step={step} choice={null} />
        </div>
      </BuildSheet>
    </form>
  );
}
