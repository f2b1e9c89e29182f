import { findCatalogue } from "#server/services/catalogue/catalogue-versions.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { presentBuild } from "#server/presenters/build.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { Build } from "#shared/catalogue/build.ts";
import { decodeSpec, readSpecVersion } from "#shared/catalogue/spec-code.ts";
import type { BuildRequest, BuildView } from "#shared/contracts/build.ts";
import { type BuildProblem, checkOrderable } from "#shared/rules/check-orderable.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";

export type CheckedBuild =
  { ok: true; build: Build; view: BuildView } | { ok: false; problems: BuildProblem[] };

/**
 * Evaluates and prices a build by the server's own catalogue, price list and load. A spec code of an older catalogue is
 * read by that one and judged by today's. Problems carry paths: `specCode`, `answers.…`, `numbers.…`, `rules.…`.
 * @param context saves asking anew when many builds are checked
 */
export async function checkBuild(request: BuildRequest, context?: EvaluationContext): Promise<CheckedBuild> {
  const answers = await answersOf(request.specCode);
  if (!answers.ok) return { ok: false, problems: [{ path: "specCode", message: answers.sentence }] };
  const against = context ?? (await currentContext());
  const build: Build = { answers: answers.answers, numbers: request.numbers, mine: [] };
  const checked = checkOrderable(against, build);
  if (!checked.ok) return checked;
  return { ok: true, build, view: presentBuild(against, checked.evaluation) };
}

/**
 * As `checkBuild`, for where only a build that can be ordered is of use.
 * @throws Refusal build-refused with every problem
 */
export async function requireOrderable(request: BuildRequest): Promise<Extract<CheckedBuild, { ok: true }>> {
  const checked = await checkBuild(request);
  if (!checked.ok) {
    throw new Refusal("build-refused", "This block cannot be ordered as it stands.", {
      errors: checked.problems,
    });
  }
  return checked;
}

type Answers = { ok: true; answers: Record<string, string> } | { ok: false; sentence: string };

/** Answers of a spec code, read by the catalogue that it was made with. */
export async function answersOf(specCode: string): Promise<Answers> {
  const version = readSpecVersion(specCode);
  if (!version.ok) return version;
  const catalogue = await findCatalogue(version.version);
  return decodeSpec(specCode, () => catalogue ?? undefined);
}
