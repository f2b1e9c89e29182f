import type { Condition, Severity, Step } from "../catalogue/catalogue.ts";
import type { CompiledCatalogue } from "./compile.ts";
import type { CompiledRule } from "./compile-rule.ts";
import type { Assignment } from "./problem.ts";
import type { Figure, Finding } from "./evaluation.ts";
import { holds, quantityOf, type Reading } from "./reading.ts";
import { isIdle, judge } from "./verdict.ts";

const rank: Record<Severity, number> = { stop: 0, caution: 1, note: 2 };

/**
 * Findings of a partial build, stops first: every rule that is broken by what is answered, and, as notes "to be confirmed",
 * the stops and cautions whose choices are all answered but which read something unknown.
 */
export function findingsOf(compiled: CompiledCatalogue, assignment: Assignment, reading: Reading): Finding[] {
  const found = compiled.rules.flatMap((entry): Finding[] => {
    const { rule } = entry;
    const verdict = judge(rule, reading);
    const answered = entry.scope.every((choice) => assignment[choice] !== -1) && reading.family !== null;
    const undecided =
      verdict === "undecided" && answered && rule.severity !== "note" && !isIdle(rule, reading);
    if (verdict !== "broken" && !undecided) return [];
    return [
      {
        rule: rule.id,
        severity: undecided ? "note" : rule.severity,
        sentence: undecided ? `To be confirmed: ${rule.sentence}` : rule.sentence,
        why: rule.why,
        undecided,
        figures: [...entry.figures],
        step: stepOf(compiled, entry),
      },
    ];
  });
  return found.sort(
    (a, b) => rank[a.severity] - rank[b.severity] || Number(a.undecided) - Number(b.undecided),
  );
}

/** The last step, in the order of the form, in which something that the rule reads can be changed. */
function stepOf(compiled: CompiledCatalogue, entry: CompiledRule): string {
  const choices = new Set(entry.scope.map((index) => compiled.choices[index]?.id ?? ""));
  const reads = (step: Step): boolean =>
    step.choices.some((choice) => choices.has(choice)) ||
    step.numbers.some((id) => entry.numbers.includes(id));
  const { steps } = compiled.catalogue;
  const family = steps.find((step) => step.choices.includes("family"));
  return (steps.findLast(reads) ?? family ?? steps[0])?.id ?? "";
}

/** All figures with their values and the limit that a rule holds them to now. */
export function figuresOf(compiled: CompiledCatalogue, reading: Reading, weight: number | null): Figure[] {
  const figures = compiled.figures.map((figure): Figure => {
    const at = figure.at?.(reading, compiled.catalogue) ?? null;
    return {
      id: figure.id,
      name: figure.name,
      unit: figure.unit,
      value: reading.figure(figure.id),
      places: figure.places,
      formula: figure.formula,
      limit: limitOf(compiled, figure.id, reading),
      ...(at === null ? {} : { at }),
    };
  });
  figures.push({
    id: "weight",
    name: "Weight, bare block",
    unit: "lb",
    value: weight,
    places: 0,
    formula: "family weight + weights of the options − iron bored out beyond the base bore (0.258 lb/cu in)",
    limit: null,
  });
  return figures;
}

/** The limit of the first rule, stops before cautions, that applies now and compares the figure with a known quantity. */
function limitOf(compiled: CompiledCatalogue, figure: string, reading: Reading): Figure["limit"] {
  const candidates = compiled.rules
    .filter((entry) => entry.figures.includes(figure))
    .sort((a, b) => rank[a.rule.severity] - rank[b.rule.severity]);
  for (const { rule } of candidates) {
    if (rule.kind !== "expression") continue;
    if (rule.when !== undefined && holds(rule.when, reading) !== true) continue;
    const limit = comparisonOf(rule.require, figure, reading);
    if (limit !== null) return { ...limit, rule: rule.id };
  }
  return null;
}

function comparisonOf(
  condition: Condition,
  figure: string,
  reading: Reading,
): { is: ">=" | "<="; value: number } | null {
  if ("all" in condition) {
    for (const part of condition.all) {
      const limit = comparisonOf(part, figure, reading);
      if (limit !== null) return limit;
    }
    return null;
  }
  if (!("left" in condition) || !("figure" in condition.left) || condition.left.figure !== figure)
    return null;
  if (condition.is !== ">=" && condition.is !== "<=") return null;
  const value = quantityOf(condition.right, reading);
  return value === null ? null : { is: condition.is, value };
}
