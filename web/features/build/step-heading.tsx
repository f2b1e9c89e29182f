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
    <div className="mb-4 flex items-start justify-between gap-x-6 lg:mb-6 lg:items-end">
      <div className="min-w-0 max-lg:[&_.cell-label]:hidden">
        <PageHeading title={title} over={`Step ${position + 1} of ${steps}`} />
        <p className="mt-1 max-w-text text-iron lg:text-lg">{intro}</p>
      </div>
      <div className="flex shrink-0 gap-2">
        <UndoButtons />
      </div>
    </div>
  );
}
