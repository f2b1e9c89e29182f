import { PageHeading } from "#web/components/page-heading.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { UndoButtons } from "./undo-buttons.tsx";

interface StepHeadingProps {
  title: string;
  /** Counted from 0. */
  position: number;
  intro: string;
}

/** Heading of a step: shorter on phones, where the stepper under it counts the steps. */
export function StepHeading({ title, position, intro }: StepHeadingProps) {
  const steps = useBuildDesk().current.catalogue.steps.length + 1;
  return (
    <div className="mb-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-2 lg:mb-6">
      <div className="min-w-0 max-lg:[&_.cell-label]:hidden">
        <PageHeading title={title} over={`Step ${position + 1} of ${steps}`} />
      </div>
      <div className="flex gap-2">
        <UndoButtons />
      </div>
      <p className="max-w-text basis-full text-iron lg:text-lg">{intro}</p>
    </div>
  );
}
