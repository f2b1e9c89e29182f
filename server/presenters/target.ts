import { encodeSpec } from "#shared/catalogue/spec-code.ts";
import type { TargetResult } from "#shared/contracts/target.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";
import type { RankedBuild } from "#shared/target/find-builds.ts";
import { namedAnswers, summaryOf } from "./build.ts";

/** An answer to a target, to be opened by its spec code. */
export function presentTargetBuild(
  { catalogue }: EvaluationContext,
  ranked: RankedBuild,
): TargetResult["builds"][number] {
  const { build, priceCents, shipsOn, weight, wall, displacement, power, fit, tradeOffs } = ranked;
  return {
    specCode: encodeSpec(catalogue, build.answers),
    numbers: build.numbers,
    mine: build.mine,
    summary: summaryOf(catalogue, build.answers),
    answers: namedAnswers(catalogue, build.answers),
    priceCents,
    shipsOn,
    weight,
    wall,
    displacement,
    power,
    fit,
    tradeOffs,
  };
}
