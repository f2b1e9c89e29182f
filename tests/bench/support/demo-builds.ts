import { emptyBuild, type Build } from "#shared/catalogue/build.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";
import { drawFrom, randomFrom } from "#tests/shared/rules/random-catalogue.ts";

/** The builds of one random click sequence, from empty to complete: always an open option of an unanswered choice. */
export function clickSequence(context: EvaluationContext, seed: number): Build[] {
  const draw = drawFrom(randomFrom(seed));
  const builds = [emptyBuild];
  for (;;) {
    const build = builds.at(-1) ?? emptyBuild;
    const { choices, unanswered } = evaluate(context, build);
    if (unanswered.length === 0) return builds;
    const choice = draw.one(unanswered);
    const states = choices.find((state) => state.choice === choice)?.options ?? [];
    const { option } = draw.one(states.filter(({ open }) => open));
    builds.push({ ...build, answers: { ...build.answers, [choice]: option } });
  }
}
