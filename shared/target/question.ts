import type { Build } from "../catalogue/build.ts";
import type { Option } from "../catalogue/catalogue.ts";
import type { BuildProblem } from "../rules/check-orderable.ts";
import { compileCatalogue, type CompiledCatalogue } from "../rules/compile.ts";
import type { EvaluationContext } from "../rules/evaluation.ts";
import type { Assignment } from "../rules/problem.ts";
import { numberProblem } from "../rules/reading.ts";
import type { Numbers } from "../rules/rule-table.ts";
import { compareQuantities } from "../units/length.ts";
import type { Target } from "./target.ts";

/** A target as the engine reads it. */
export interface Question {
  /** Answers that stay, as option indices. */
  given: Assignment;
  /** What is typed: the load aimed at, and the sizes that are there. */
  numbers: Numbers;
  /** Choices whose answers stay. */
  mine: readonly string[];
}

/** Answers and numbers of a target: what is there already, under the load aimed at. */
function asBuild({ duty, induction, power, rpm, have }: Target): Build {
  return {
    answers: { ...have?.answers, duty, induction },
    numbers: {
      ...have?.numbers,
      ...(power === undefined ? {} : { powerAim: String(power) }),
      ...(rpm === undefined ? {} : { rpmAim: String(rpm) }),
    },
    mine: Object.keys(have?.answers ?? {}),
  };
}

/** Throws RangeError on a target that the catalogue cannot read; see `targetProblems`. */
export function readTarget({ catalogue }: Pick<EvaluationContext, "catalogue">, target: Target): Question {
  const [problem] = targetProblems({ catalogue }, target);
  if (problem !== undefined) throw new RangeError(`${problem.path}: ${problem.message}`);
  const { answers, numbers, mine } = asBuild(target);
  return { given: compileCatalogue(catalogue).known(answers), numbers, mine };
}

/** What in a target the catalogue does not have or cannot read, with the path of each. */
export function targetProblems(
  { catalogue }: Pick<EvaluationContext, "catalogue">,
  target: Target,
): BuildProblem[] {
  const compiled = compileCatalogue(catalogue);
  const { answers, numbers } = asBuild(target);
  const pathOf = (id: string): string => (id === "duty" || id === "induction" ? id : `have.answers.${id}`);
  const numberPaths: Readonly<Record<string, string>> = { powerAim: "power", rpmAim: "rpm" };
  return [
    ...Object.entries(answers).flatMap(([id, answer]) => {
      const choice = catalogue.choices.find((candidate) => candidate.id === id);
      if (choice === undefined)
        return [{ path: pathOf(id), message: `The catalogue has no choice "${id}".` }];
      return choice.options.some((option) => option.id === answer)
        ? []
        : [{ path: pathOf(id), message: `${choice.name} has no option "${answer}".` }];
    }),
    ...Object.entries(numbers).flatMap(([id, text]) => {
      const field = compiled.numberFields.get(id);
      const message =
        field === undefined ? `The catalogue asks for no number "${id}".` : numberProblem(field, text);
      return message === null ? [] : [{ path: numberPaths[id] ?? `have.numbers.${id}`, message }];
    }),
  ];
}

/**
 * By flat option index: 1 where the option exists in the family, keeps the answers given and has the sizes that are there. An
 * option that reads numbers is only taken where it is given or all of them are typed: what is not known would close nothing, and
 * the cheapest answer would be the one that is checked least.
 */
export function allowedOptions(
  compiled: CompiledCatalogue,
  { given, numbers }: Question,
  family: number,
): Uint8Array {
  const id = compiled.families[family]?.id ?? "";
  const sizes = Object.entries(numbers).map(([name, text]) => [name, Number(text)] as const);
  const fits = (option: Option): boolean =>
    option.reads.every((name) => numbers[name] !== undefined) &&
    sizes.every(([name, size]) => {
      const own = option.valuesByFamily[id]?.[name] ?? option.values[name];
      return own === undefined || option.reads.includes(name) || compareQuantities(own, size) === 0;
    });
  return Uint8Array.from(
    compiled.choices.flatMap((choice, index) =>
      choice.options.map((option, at) => {
        const answer = given[index] ?? -1;
        if (answer >= 0) return Number(answer === at && compiled.exists(family, index, at));
        return Number(compiled.exists(family, index, at) && fits(option));
      }),
    ),
  );
}
