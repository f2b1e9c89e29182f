import type { Build } from "../catalogue/build.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import type { Assignment } from "./problem.ts";
import { minimalConflict, type Conflict } from "./conflict.ts";
import type { EvaluationContext, Reason } from "./evaluation.ts";

/** A wanted option. */
export interface Wanted {
  choice: string;
  option: string;
}

/**
 * A minimal reason why an option is closed: answers, typed numbers and stop rules of which none can be left out. The wanted
 * choice's own answer never stands against it. Throws RangeError on an unknown choice or option, or on one that is open.
 */
export function explain(context: EvaluationContext, build: Build, wanted: Wanted): Reason {
  const compiled = compileCatalogue(context.catalogue);
  const { choice, assignment } = withWanted(compiled, build, wanted);
  const conflict = minimalConflict({
    compiled,
    given: assignment,
    numbers: build.numbers,
    held: new Set([choice]),
  });
  if (conflict === null) throw new RangeError(`${wanted.choice} ${wanted.option} is open`);
  return reasonOf(compiled, { assignment, numbers: build.numbers, wanted: choice }, conflict);
}

/** The answers with the wanted option in place. */
export function withWanted(
  compiled: CompiledCatalogue,
  build: Build,
  wanted: Wanted,
): { choice: number; assignment: Assignment } {
  const choice = compiled.choiceIndex.get(wanted.choice);
  const option = compiled.choices[choice ?? -1]?.options.findIndex(({ id }) => id === wanted.option) ?? -1;
  if (choice === undefined || option < 0)
    throw new RangeError(`there is no option ${wanted.choice} ${wanted.option}`);
  const assignment = compiled.assignment(build.answers);
  assignment[choice] = option;
  return { choice, assignment };
}

/** What the conflict was asked of: the answers, the typed numbers, and the wanted option's choice if there is one. */
interface AskedOf {
  assignment: Assignment;
  numbers: Readonly<Record<string, string>>;
  wanted: number | null;
}

/** A conflict in the words of the catalogue. */
export function reasonOf(compiled: CompiledCatalogue, asked: AskedOf, conflict: Conflict): Reason {
  const { assignment, wanted } = asked;
  const rules = conflict.stops.flatMap((stop) => compiled.stops[stop]?.rule ?? []);
  const against = conflict.choices.map((index) => named(compiled, assignment, index));
  const numbers = conflict.numbers.map((id) => {
    const field = compiled.numberFields.get(id);
    return `${field?.name ?? id}: ${asked.numbers[id] ?? ""} ${field?.unit ?? ""}`.trim();
  });
  const sentence =
    rules.length > 0
      ? [...rules.map((rule) => rule.sentence), heldBy([...against.map(({ text }) => text), ...numbers])]
          .join(" ")
          .trim()
      : notMade(compiled, assignment, conflict, wanted);
  return {
    sentence,
    answers: against.map(({ choice, option }) => ({ choice, option })),
    numbers: conflict.numbers,
    rules: rules.map((rule) => rule.id),
  };
}

function named(
  compiled: CompiledCatalogue,
  assignment: Assignment,
  index: number,
): { choice: string; option: string; text: string } {
  const choice = compiled.choices[index];
  const option = choice?.options[assignment[index] ?? -1];
  return {
    choice: choice?.id ?? "",
    option: option?.id ?? "",
    text: `${choice?.name ?? ""}: ${option?.name ?? ""}`,
  };
}

function heldBy(against: readonly string[]): string {
  return against.length === 0 ? "No answer changes that." : `Set by ${against.join("; ")}.`;
}

/** Without a rule only the families stand against it: an option that the family does not have. */
function notMade(
  compiled: CompiledCatalogue,
  assignment: Assignment,
  conflict: Conflict,
  wanted: number | null,
): string {
  const choice = compiled.choices[wanted ?? -1];
  const family = compiled.families[assignment[compiled.familyChoice] ?? -1];
  const others = conflict.choices.filter((index) => index !== compiled.familyChoice);
  if (wanted === compiled.familyChoice || others.length > 0) {
    const name = family === undefined ? "No family" : family.name;
    const missing = others.map((index) => named(compiled, assignment, index).text);
    const own =
      choice === undefined || wanted === compiled.familyChoice
        ? []
        : [named(compiled, assignment, wanted ?? -1).text];
    return family === undefined
      ? `No family is made with ${[...own, ...missing].join(" and ")}.`
      : `${name} is not made with ${missing.join(" and ")}.`;
  }
  return `${family?.name ?? "This family"} is not made with ${named(compiled, assignment, wanted ?? -1).text}.`;
}
