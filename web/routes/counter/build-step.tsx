import { useParams } from "react-router-dom";
import { ButtonLink } from "#web/components/button.tsx";
import { PageHeading } from "#web/components/page-heading.tsx";
import { useBuildDesk } from "#web/features/build/build-desk.tsx";
import { StepForm } from "#web/features/build/step-form.tsx";

/** `/build/:step`: one step of the form. */
export function Component() {
  const { step: id } = useParams();
  const { current, search } = useBuildDesk();
  const step = current.catalogue.steps.find((candidate) => candidate.id === id);
  if (step !== undefined) return <StepForm key={step.id} step={step} />;
  return (
    <div className="space-y-6">
      <PageHeading
        title="There is no such step"
        over="Build"
        lead="The address names a step that the form does not have. The build in it is kept."
      />
      <ButtonLink to={{ pathname: "/build", search }}>Go to the first step</ButtonLink>
    </div>
  );
}
