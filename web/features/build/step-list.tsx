import { Stepper, type Step } from "#web/components/stepper.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk, type BuildDesk } from "./build-desk.tsx";
import { optionName } from "./build-words.ts";

export const reviewStep = "review";

/** The steps of the build with what is answered in each; the review stands at the end. */
export function StepList({ here }: { here: string }) {
  const desk = useBuildDesk();
  const { current, evaluation, search } = desk;
  const steps = current.catalogue.steps.map((step): Step => {
    const answer = answerWords(desk, step.choices);
    return {
      id: step.id,
      name: step.name,
      to: { pathname: stepPath(step.id), search },
      state: evaluation.findings.some((finding) => finding.severity === "stop" && finding.step === step.id)
        ? "attention"
        : step.choices.every((choice) => desk.build.answers[choice] !== undefined)
          ? "done"
          : "open",
      ...(answer === "" ? {} : { answer }),
    };
  });
  steps.push({
    id: reviewStep,
    name: "Review",
    to: { pathname: stepPath(reviewStep), search },
    state: evaluation.orderable ? "done" : "open",
  });
  return <Stepper label="Steps of the build" steps={steps} current={here} />;
}

function answerWords({ current, build }: BuildDesk, choices: readonly string[]): string {
  const answered = choices.flatMap((choice) => {
    const option = build.answers[choice];
    return option === undefined ? [] : [optionName(current.catalogue, choice, option)];
  });
  if (answered.length === 0) return "";
  return answered.length < choices.length
    ? `${answered.length} of ${choices.length} answered`
    : answered.join(", ");
}
