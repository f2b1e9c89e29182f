import { currentContext } from "#server/services/catalogue/current-context.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { Build } from "#shared/catalogue/build.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import type { MendRequest, MendResult } from "#shared/contracts/build.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { minimalConflict } from "#shared/rules/conflict.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";
import { explain, reasonOf, type Wanted } from "#shared/rules/explain.ts";
import { mend, repair } from "#shared/rules/mend.ts";
import { openOptions } from "#shared/rules/open-options.ts";
import { numberProblem } from "#shared/rules/reading.ts";
import { answersOf } from "./check-build.ts";

/**
 * Why an option is closed and the cheapest mend that lets it in; without a wanted option, the same for a whole build that no
 * longer stands. By today's catalogue, prices and load, whatever catalogue the spec code is of.
 * @throws Refusal validation for a spec code, number or option that cannot be read
 */
export async function mendBuild(request: MendRequest): Promise<MendResult> {
  const [context, read] = await Promise.all([currentContext(), answersOf(request.specCode)]);
  if (!read.ok) throw unreadable("specCode", read.sentence);
  requireReadable(context.catalogue, request);
  const build: Build = { answers: read.answers, numbers: request.numbers, mine: request.mine };
  return request.wanted === undefined ? repaired(context, build) : letIn(context, build, request.wanted);
}

function unreadable(path: string, message: string): Refusal {
  return new Refusal("validation", message, { errors: [{ path, message }] });
}

function requireReadable(catalogue: Catalogue, { numbers, wanted }: MendRequest): void {
  const { numberFields } = compileCatalogue(catalogue);
  for (const [id, text] of Object.entries(numbers)) {
    const field = numberFields.get(id);
    const message =
      field === undefined ? `The catalogue asks for no number "${id}".` : numberProblem(field, text);
    if (message !== null) throw unreadable(`numbers.${id}`, message);
  }
  if (wanted === undefined) return;
  const choice = catalogue.choices.find(({ id }) => id === wanted.choice);
  if (choice === undefined)
    throw unreadable("wanted.choice", `The catalogue has no choice "${wanted.choice}".`);
  if (!choice.options.some(({ id }) => id === wanted.option))
    throw unreadable("wanted.option", `${choice.name} has no option "${wanted.option}".`);
}

function letIn(context: EvaluationContext, build: Build, wanted: Wanted): MendResult {
  if (openOptions(context, build).get(wanted.choice)?.includes(wanted.option) === true)
    return { reason: null, mend: null };
  return { reason: explain(context, build, wanted), mend: mend(context, build, wanted) };
}

function repaired(context: EvaluationContext, build: Build): MendResult {
  const compiled = compileCatalogue(context.catalogue);
  const assignment = compiled.known(build.answers);
  const { numbers } = build;
  const conflict = minimalConflict({ compiled, given: assignment, numbers, held: new Set() });
  return {
    reason: conflict === null ? null : reasonOf(compiled, { assignment, numbers, wanted: null }, conflict),
    mend: repair(context, build),
  };
}
