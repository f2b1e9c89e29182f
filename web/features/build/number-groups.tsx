import type { Catalogue, NumberField, Step } from "#shared/catalogue/catalogue.ts";
import { isRead, readersOf } from "#shared/catalogue/number-fields.ts";
import { classNames } from "#web/components/class-names.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { NumberQuestion } from "./number-question.tsx";

/** Above so many a group is set like a sheet of measurements, two beside each other. */
const mostStacked = 4;

interface NumberGroupsProps {
  step: Step;
  /** The choice whose options ask for the numbers; null = those of the step that stand by themselves. */
  choice: string | null;
}

/** The numbers that are read now, by group: those that a choice of the step asks for stand under it. */
export function NumberGroups({ step, choice }: NumberGroupsProps) {
  const { current, build } = useBuildDesk();
  const { catalogue } = current;
  const groups = new Map<string, NumberField[]>();
  for (const field of catalogue.numbers) {
    if (!step.numbers.includes(field.id) || askedBy(catalogue, step, field) !== choice) continue;
    if (isRead(catalogue, field, build.answers))
      groups.set(field.group, [...(groups.get(field.group) ?? []), field]);
  }
  return [...groups].map(([name, fields]) => <NumberGroup key={name} name={name} fields={fields} />);
}

/** The choice under which a field stands: the one of this step whose options alone read it. */
function askedBy(catalogue: Catalogue, step: Step, field: NumberField): string | null {
  const choices = new Set(readersOf(catalogue, field).map((reader) => reader.choice));
  const [only] = choices;
  return choices.size === 1 && only !== undefined && step.choices.includes(only) ? only : null;
}

function NumberGroup({ name, fields }: { name: string; fields: NumberField[] }) {
  return (
    <fieldset className="mt-6">
      <legend className="font-condensed text-xl font-semibold">{name}</legend>
      <p className="max-w-text text-sm text-iron">
        Unknown is an answer: leave it empty, and what depends on it is marked to be confirmed.
      </p>
      <div
        className={classNames("mt-4 grid gap-x-6 gap-y-5", fields.length > mostStacked && "sm:grid-cols-2")}
      >
        {fields.map((field) => (
          <NumberQuestion key={field.id} field={field} />
        ))}
      </div>
    </fieldset>
  );
}
