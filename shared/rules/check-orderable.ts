import type { Build } from "../catalogue/build.ts";
import { compileCatalogue } from "./compile.ts";
import { evaluate } from "./evaluate.ts";
import type { Evaluation, EvaluationContext } from "./evaluation.ts";
import { numberProblem } from "./reading.ts";

export interface BuildProblem {
  /** Where in the build, e.g. "answers.bore" or "numbers.powerAim". */
  path: string;
  message: string;
}

export type Orderable = { ok: true; evaluation: Evaluation } | { ok: false; problems: BuildProblem[] };

/**
 * Whether a build may be ordered: every answer is known and exists in its family, every choice is answered, every number lies
 * on its grid, and no stop rule is broken. Undecided rules do not stand against it. The problems come with their paths.
 */
export function checkOrderable(context: EvaluationContext, build: Build): Orderable {
  const evaluation = evaluate(context, build);
  const problems = [
    ...answerProblems(context, build),
    ...evaluation.unanswered
      .filter((choice) => build.answers[choice] === undefined)
      .map((choice) => ({
        path: `answers.${choice}`,
        message: `${nameOf(context, choice)} is not answered.`,
      })),
    ...numberProblems(context, build),
    ...evaluation.findings
      .filter(({ severity }) => severity === "stop")
      .map((finding) => ({ path: `rules.${finding.rule}`, message: finding.sentence })),
  ];
  return problems.length === 0 && evaluation.orderable ? { ok: true, evaluation } : { ok: false, problems };
}

function nameOf(context: EvaluationContext, choice: string): string {
  return context.catalogue.choices.find(({ id }) => id === choice)?.name ?? choice;
}

function answerProblems(context: EvaluationContext, build: Build): BuildProblem[] {
  const { choices, families } = context.catalogue;
  const family = families.find(({ id }) => id === build.answers["family"]);
  return Object.entries(build.answers).flatMap(([id, answer]) => {
    const path = `answers.${id}`;
    const choice = choices.find((candidate) => candidate.id === id);
    if (choice === undefined) return [{ path, message: `The catalogue has no choice "${id}".` }];
    const option = choice.options.find((candidate) => candidate.id === answer);
    if (option === undefined) return [{ path, message: `${choice.name} has no option "${answer}".` }];
    if (family !== undefined && option.families?.includes(family.id) === false) {
      return [{ path, message: `${family.name} is not made with ${choice.name}: ${option.name}.` }];
    }
    return [];
  });
}

function numberProblems(context: EvaluationContext, build: Build): BuildProblem[] {
  const { numberFields } = compileCatalogue(context.catalogue);
  return Object.entries(build.numbers).flatMap(([id, text]) => {
    const path = `numbers.${id}`;
    const field = numberFields.get(id);
    const message =
      field === undefined ? `The catalogue asks for no number "${id}".` : numberProblem(field, text);
    return message === null ? [] : [{ path, message }];
  });
}
