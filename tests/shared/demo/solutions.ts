import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import type { Catalogue, Rule } from "#shared/catalogue/catalogue.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { judge } from "#shared/rules/verdict.ts";

/** The demo with only these choices (the family comes with them) and the rules that read nothing else. */
export function demoWith(...ids: string[]): Catalogue {
  const kept = new Set(["family", ...ids]);
  const reads = new Map(
    compileCatalogue(demoCatalogue).rules.map(({ rule, scope }) => [
      rule.id,
      scope.every((index) => kept.has(demoCatalogue.choices[index]?.id ?? "")),
    ]),
  );
  return {
    ...demoCatalogue,
    choices: demoCatalogue.choices.filter(({ id }) => kept.has(id)),
    steps: demoCatalogue.steps.map((step) => ({
      ...step,
      choices: step.choices.filter((id) => kept.has(id)),
    })),
    rules: demoCatalogue.rules.filter(({ id }) => reads.get(id) === true),
  };
}

/** Every full assignment of one family, option indices by choice, over the choices given. */
export function* assignmentsOf(
  catalogue: Catalogue,
  family: number,
  scope: readonly number[],
): Generator<Int16Array> {
  const { familyChoice, families, choices } = compileCatalogue(catalogue);
  const full = new Int16Array(choices.length).fill(-1);
  full[familyChoice] = family;
  const made = scope.map((choice) =>
    [...(choices[choice]?.options ?? []).entries()]
      .filter(([, option]) => option.families?.includes(families[family]?.id ?? "") ?? true)
      .map(([at]) => at),
  );
  function* fill(at: number): Generator<Int16Array> {
    const choice = scope[at];
    if (choice === undefined) {
      yield full;
      return;
    }
    for (const option of made[at] ?? []) {
      full[choice] = option;
      yield* fill(at + 1);
    }
  }
  yield* fill(0);
}

/** Whether an assignment breaks a rule. */
export function breaks(
  catalogue: Catalogue,
  rule: Rule,
  assignment: Int16Array,
  numbers: Record<string, string> = {},
): boolean {
  const compiled = compileCatalogue(catalogue);
  const family = assignment[compiled.familyChoice] ?? -1;
  return (
    judge(
      rule,
      compiled.reading(family, (choice) => assignment[choice] ?? -1, numbers),
    ) === "broken"
  );
}
