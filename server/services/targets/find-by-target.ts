import { presentTargetBuild } from "#server/presenters/target.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { TargetResult } from "#shared/contracts/target.ts";
import { findBuilds } from "#shared/target/find-builds.ts";
import { targetProblems } from "#shared/target/question.ts";
import type { Target } from "#shared/target/target.ts";
import { wishesInTheWay } from "#shared/target/wishes-in-the-way.ts";

/**
 * The best complete builds for a target by today's catalogue, prices and load, or which single wishes stand in the way.
 * @throws Refusal validation for a target that the catalogue cannot read
 */
export async function findByTarget(target: Target): Promise<TargetResult> {
  const context = await currentContext();
  const problems = targetProblems(context, target);
  if (problems.length > 0) {
    throw new Refusal("validation", "The catalogue cannot read this target.", { errors: problems });
  }
  const builds = findBuilds(context, target);
  return {
    builds: builds.map((build) => presentTargetBuild(context, build)),
    inTheWay: builds.length > 0 ? [] : wishesInTheWay(context, target),
  };
}
