import { Engine, type ConditionProperties, type NestedCondition } from "json-rules-engine";
import type { Build } from "#shared/catalogue/build.ts";
import type { Catalogue, Condition, Expression, Rule } from "#shared/catalogue/catalogue.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";

/** What the outside engine reads of a build: answers, and quantities computed before, which spares it the geometry. */
export type Facts = Record<string, string | number | null>;

/** As many of the catalogue's rules as asked, in the outside engine's words; a rule fires where it is broken. */
export function outsideEngine(
  catalogue: Catalogue,
  most: number,
): { engine: Engine; rules: readonly Rule[] } {
  const rules = catalogue.rules.slice(0, most);
  const engine = new Engine([], { allowUndefinedFacts: true });
  for (const rule of rules) {
    engine.addRule({ conditions: { all: brokenWhen(rule) }, event: { type: rule.id } });
  }
  return { engine, rules };
}

function brokenWhen(rule: Rule): NestedCondition[] {
  if (rule.kind === "table") {
    const rows = rule.rows.map((row) => ({
      all: row.map((options, at) => membership(`choice ${rule.choices[at] ?? ""}`, options)),
    }));
    return [{ not: { any: rows } }];
  }
  const require: NestedCondition = { not: conditionOf(rule.require) };
  return rule.when === undefined ? [require] : [conditionOf(rule.when), require];
}

function membership(fact: string, options: readonly string[]): ConditionProperties {
  return { fact, operator: "in", value: [...options] };
}

const operators = {
  ">=": "greaterThanInclusive",
  "<=": "lessThanInclusive",
  ">": "greaterThan",
  "<": "lessThan",
  "=": "equal",
};

function conditionOf(condition: Condition): NestedCondition {
  if ("choice" in condition) return membership(`choice ${condition.choice}`, condition.in);
  if ("word" in condition) return membership(`word ${condition.word}`, condition.in);
  if ("all" in condition) return { all: condition.all.map(conditionOf) };
  if ("any" in condition) return { any: condition.any.map(conditionOf) };
  if ("not" in condition) return { not: conditionOf(condition.not) };
  const right = "constant" in condition.right ? condition.right.constant : { fact: nameOf(condition.right) };
  return { fact: nameOf(condition.left), operator: operators[condition.is], value: right };
}

const nameOf = (expression: Expression): string => `quantity ${JSON.stringify(expression)}`;

/** The facts of a build for these rules. */
export function factsOf(catalogue: Catalogue, rules: readonly Rule[], build: Build): Facts {
  const compiled = compileCatalogue(catalogue);
  const assignment = compiled.assignment(build.answers);
  const family = assignment[compiled.familyChoice] ?? -1;
  const reading = compiled.reading(family, (choice) => assignment[choice] ?? -1, build.numbers);
  const facts: Facts = {};
  for (const choice of catalogue.choices) facts[`choice ${choice.id}`] = reading.chosen(choice.id);
  const quantity = (expression: Expression): number | null => {
    if ("constant" in expression) return expression.constant;
    if ("figure" in expression) return reading.figure(expression.figure);
    if ("value" in expression) return reading.value(expression.value);
    if ("number" in expression) return reading.number(expression.number);
    const parts =
      "sum" in expression
        ? expression.sum
        : "difference" in expression
          ? expression.difference
          : expression.product;
    const [first = 0, ...rest] = parts.map((part) => quantity(part) ?? Number.NaN);
    if ("sum" in expression) return rest.reduce((sum, part) => sum + part, first);
    return "difference" in expression ? first - (rest[0] ?? 0) : first * (rest[0] ?? 0);
  };
  const note = (condition: Condition): void => {
    if ("word" in condition) facts[`word ${condition.word}`] = reading.word(condition.word);
    else if ("all" in condition) condition.all.forEach(note);
    else if ("any" in condition) condition.any.forEach(note);
    else if ("not" in condition) note(condition.not);
    else if ("left" in condition) {
      for (const side of [condition.left, condition.right]) facts[nameOf(side)] = quantity(side);
    }
  };
  for (const rule of rules) {
    if (rule.kind === "table") continue;
    if (rule.when !== undefined) note(rule.when);
    note(rule.require);
  }
  return facts;
}
