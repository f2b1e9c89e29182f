import type { Build } from "./build.ts";
import type { Catalogue, NumberField } from "./catalogue.ts";

/** An option that reads a typed number. */
interface Reader {
  choice: string;
  option: string;
}

/** The options that read a typed number, by `onlyWith` of the field or `reads` of the option; none = it is always read. */
export function readersOf(catalogue: Catalogue, field: NumberField): Reader[] {
  const reading = catalogue.choices.flatMap((choice) =>
    choice.options
      .filter((option) => option.reads.includes(field.id))
      .map((option) => ({ choice: choice.id, option: option.id })),
  );
  return field.onlyWith === undefined ? reading : [field.onlyWith, ...reading];
}

/** Whether a typed number is read with these answers. One that is not keeps its place in the build, unread. */
export function isRead(catalogue: Catalogue, field: NumberField, answers: Build["answers"]): boolean {
  const readers = readersOf(catalogue, field);
  return readers.length === 0 || readers.some(({ choice, option }) => answers[choice] === option);
}
