import type { Build } from "../catalogue/build.ts";
import { compileCatalogue } from "./compile.ts";
import { minimalConflict } from "./conflict.ts";
import type { EvaluationContext, Mend, Reason } from "./evaluation.ts";
import { reasonOf } from "./explain.ts";
import { cheapestMend } from "./mend.ts";
import { numberProblem } from "./reading.ts";

export type Admission = { ok: true } | { ok: false; reason: Reason; mend: Mend | null };

/**
 * Whether a typed number (decimal text; null = unknown) may be entered: something must stay open afterwards. Otherwise it is
 * treated as a closed option: a minimal reason, and the cheapest mend if there is one; the build stays as it was. A number
 * outside its range or off its grid has its own sentence and no mend. Throws RangeError on an unknown number.
 */
export function admitNumber(
  context: EvaluationContext,
  build: Build,
  id: string,
  value: string | null,
): Admission {
  const compiled = compileCatalogue(context.catalogue);
  const field = compiled.numberFields.get(id);
  if (field === undefined) throw new RangeError(`there is no number ${id}`);
  const problem = value === null ? null : numberProblem(field, value);
  if (problem !== null) {
    return { ok: false, reason: { sentence: problem, answers: [], numbers: [], rules: [] }, mend: null };
  }
  const others = Object.entries(build.numbers).filter(([name]) => name !== id);
  const numbers = Object.fromEntries(value === null ? others : [...others, [id, value]]);
  const given = compiled.assignment(build.answers);
  const conflict = minimalConflict({ compiled, given, numbers, held: new Set(), heldNumber: id });
  if (conflict === null) return { ok: true };
  return {
    ok: false,
    reason: reasonOf(compiled, { assignment: given, numbers, wanted: null }, conflict),
    mend: cheapestMend(context, compiled, { build, target: given, held: null, numbers }),
  };
}
