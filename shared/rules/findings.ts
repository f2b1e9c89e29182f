import type { Condition, Rule, Severity, Step } from "../catalogue/catalogue.ts";
import type { CompiledCatalogue } from "./compile.ts";
import type { CompiledRule } from "./compile-rule.ts";
import type { Assignment } from "./problem.ts";
import type { Figure, Finding } from "./evaluation.ts";
import { holds, quantityOf, type Reading } from "./reading.ts";
import type { Numbers } from "./rule-table.ts";

const rank: Record<Severity, number> = { stop: 0, caution: 1, note: 2 };

/** What a rule's finding says, whatever the build. */
interface Prepared {
  broken: Omit<Finding, "figures">;
  undecided: Omit<Finding, "figures"> | null;
  figures: readonly string[];
}

const prepared = new WeakMap<CompiledCatalogue, readonly Prepared[]>();

function preparedOf(compiled: CompiledCatalogue): readonly Prepared[] {
  const known = prepared.get(compiled);
  if (known !== undefined) return known;
  const made = compiled.rules.map((entry): Prepared => {
    const { rule, figures } = entry;
    const { severity, sentence, why } = rule;
    const said = { rule: rule.id, why, step: stepOf(compiled, entry) };
    return {
      broken: { ...said, severity, sentence, undecided: false },
      undecided:
        severity === "note"
          ? null
          : { ...said, severity: "note", sentence: `To be confirmed: ${sentence}`, undecided: true },
      figures,
    };
  });
  prepared.set(compiled, made);
  return made;
}

/**
 * Findings of a partial build, stops first: every rule that is broken by what is answered, and, as notes "to be confirmed",
 * the stops and cautions whose choices are all answered but which read something unknown.
 */
export function findingsOf(compiled: CompiledCatalogue, assignment: Assignment, numbers: Numbers): Finding[] {
  const family = assignment[compiled.familyChoice] ?? -1;
  const tables = compiled.tables(family, numbers);
  const ready = preparedOf(compiled);
  const found: Finding[] = [];
  for (let at = 0; at < tables.length; at += 1) {
    const table = tables[at];
    const said = ready[at];
    if (table === undefined || said === undefined) continue;
    let cell = 0;
    let answered = family >= 0;
    for (let place = 0; place < table.scope.length; place += 1) {
      const answer = assignment[table.scope[place] ?? 0] ?? -1;
      if (answer < 0) answered = false;
      cell += (answer + 1) * (table.strides[place] ?? 0);
    }
    const verdict = table.verdict(cell);
    const finding = verdict === 2 ? said.broken : verdict === 3 && answered ? said.undecided : null;
    if (finding !== null) found.push({ ...finding, figures: [...said.figures] });
  }
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

/** The figures with their values and the limit that a rule holds them to now. */
export function figuresOf(compiled: CompiledCatalogue, reading: Reading, weight: number | null): Figure[] {
  const figures = compiled.figures.flatMap((figure): Figure[] => {
    const value = reading.figure(figure.id);
    if (value === null && figure.shownOnceKnown === true) return [];
    const { id, name, unit, places, formula } = figure;
    const at = figure.at?.(reading, compiled.catalogue) ?? null;
    const limit = limitOf(compiled, id, reading);
    return [{ id, name, unit, value, places, formula, limit, ...(at === null ? {} : { at }) }];
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

const limiting = new WeakMap<CompiledCatalogue, ReadonlyMap<string, readonly Rule[]>>();

/** By figure: the rules that read it, stops before cautions. */
function limitingRules(compiled: CompiledCatalogue): ReadonlyMap<string, readonly Rule[]> {
  const known = limiting.get(compiled);
  if (known !== undefined) return known;
  const ordered = [...compiled.rules].sort((a, b) => rank[a.rule.severity] - rank[b.rule.severity]);
  const made = new Map(
    compiled.figures.map(({ id }) => [
      id,
      ordered.filter(({ figures }) => figures.includes(id)).map(({ rule }) => rule),
    ]),
  );
  limiting.set(compiled, made);
  return made;
}

/** The limit of the first rule, stops before cautions, that applies now and compares the figure with a known quantity. */
function limitOf(compiled: CompiledCatalogue, figure: string, reading: Reading): Figure["limit"] {
  for (const rule of limitingRules(compiled).get(figure) ?? []) {
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
