import type { Condition, Expression, Rule } from "../catalogue/catalogue.ts";
import { holds, type Reading } from "./reading.ts";

export type Verdict = "kept" | "broken" | "undecided";

/** Whether a rule is kept, broken or undecided by what is known. More knowledge never turns kept or broken about. */
export function judge(rule: Rule, reading: Reading): Verdict {
  if (rule.kind === "table") return judgeTable(rule.choices, rule.rows, reading);
  const applies = rule.when === undefined ? true : holds(rule.when, reading);
  if (applies === false) return "kept";
  const required = holds(rule.require, reading);
  if (required === true) return "kept";
  return applies === true && required === false ? "broken" : "undecided";
}

function judgeTable(choices: readonly string[], rows: readonly string[][][], reading: Reading): Verdict {
  const chosen = choices.map((choice) => reading.chosen(choice));
  const fits = rows.some((row) =>
    chosen.every((option, at) => option === null || row[at]?.includes(option) === true),
  );
  if (!fits) return "broken";
  return chosen.includes(null) ? "undecided" : "kept";
}

/** Whether the rule's own condition is not known to apply, so that nothing is there to be confirmed. */
export function isIdle(rule: Rule, reading: Reading): boolean {
  return rule.kind === "expression" && rule.when !== undefined && holds(rule.when, reading) !== true;
}

/** Names of what a rule reads. */
export interface RuleReads {
  choices: Set<string>;
  values: Set<string>;
  words: Set<string>;
  numbers: Set<string>;
  figures: Set<string>;
}

/** Everything that a rule names. */
export function readsOf(rule: Rule): RuleReads {
  const reads: RuleReads = {
    choices: new Set(),
    values: new Set(),
    words: new Set(),
    numbers: new Set(),
    figures: new Set(),
  };
  if (rule.kind === "table") {
    for (const choice of rule.choices) reads.choices.add(choice);
  } else {
    if (rule.when !== undefined) collectCondition(rule.when, reads);
    collectCondition(rule.require, reads);
  }
  return reads;
}

function collectCondition(condition: Condition, reads: RuleReads): void {
  if ("choice" in condition) reads.choices.add(condition.choice);
  else if ("word" in condition) reads.words.add(condition.word);
  else if ("all" in condition) condition.all.forEach((part) => collectCondition(part, reads));
  else if ("any" in condition) condition.any.forEach((part) => collectCondition(part, reads));
  else if ("not" in condition) collectCondition(condition.not, reads);
  else {
    collectExpression(condition.left, reads);
    collectExpression(condition.right, reads);
  }
}

function collectExpression(expression: Expression, reads: RuleReads): void {
  if ("constant" in expression) return;
  if ("figure" in expression) reads.figures.add(expression.figure);
  else if ("value" in expression) reads.values.add(expression.value);
  else if ("number" in expression) reads.numbers.add(expression.number);
  else if ("sum" in expression) expression.sum.forEach((part) => collectExpression(part, reads));
  else {
    const parts = "difference" in expression ? expression.difference : expression.product;
    parts.forEach((part) => collectExpression(part, reads));
  }
}
