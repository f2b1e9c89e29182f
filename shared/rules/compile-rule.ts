import type { Catalogue, Choice, NumberField, Option, Rule } from "../catalogue/catalogue.ts";
import { figureDefinitions } from "./figures.ts";
import { readsOf, type RuleReads } from "./verdict.ts";

/** A rule with what it depends on. */
export interface CompiledRule {
  rule: Rule;
  /** Indices of the choices it depends on, the family choice left out: every rule may depend on the family. */
  scope: readonly number[];
  numbers: readonly string[];
  figures: readonly string[];
}

export interface Suppliers {
  value: ReadonlyMap<string, readonly string[]>;
  word: ReadonlyMap<string, readonly string[]>;
}

/** For every value and word the choices that may supply it; a later choice wins. */
export function suppliersOf(choices: readonly Choice[]): Suppliers {
  const value = new Map<string, string[]>();
  const word = new Map<string, string[]>();
  const add = (map: Map<string, string[]>, name: string, choice: string): void => {
    const known = map.get(name) ?? [];
    if (known[0] !== choice) map.set(name, [choice, ...known]);
  };
  for (const choice of choices) {
    for (const option of choice.options) {
      for (const name of namesOfValues(option)) add(value, name, choice.id);
      for (const name of Object.keys(option.words)) add(word, name, choice.id);
    }
  }
  return { value, word };
}

function namesOfValues(option: Option): string[] {
  return [
    ...Object.keys(option.values),
    ...Object.values(option.valuesByFamily).flatMap((values) => Object.keys(values)),
    ...option.reads,
  ];
}

/** By typed number: the options, as [choice, option], that read it; none = it is always read. */
export type Gates = ReadonlyMap<string, readonly (readonly [string, string])[]>;

export function gatesOf(catalogue: Catalogue): Gates {
  return new Map(
    catalogue.numbers.map((field) => {
      const reading = catalogue.choices.flatMap((choice) =>
        choice.options
          .filter((option) => option.reads.includes(field.id))
          .map((option) => [choice.id, option.id] as const),
      );
      const only =
        field.onlyWith === undefined ? [] : [[field.onlyWith.choice, field.onlyWith.option] as const];
      return [field.id, [...only, ...reading]] as const;
    }),
  );
}

export interface RuleParts {
  choiceIndex: ReadonlyMap<string, number>;
  familyChoice: number;
  suppliers: Suppliers;
  gates: Gates;
  numberFields: ReadonlyMap<string, NumberField>;
}

/** Throws RangeError where the rule reads a figure or a choice that there is not. */
export function compileRule(rule: Rule, parts: RuleParts): CompiledRule {
  const reads = readsOf(rule);
  const missing = [...reads.figures].find((id) => !figureDefinitions.some((figure) => figure.id === id));
  if (missing !== undefined)
    throw new RangeError(`rule ${rule.id} reads the figure ${missing}, which there is not`);
  const { choices, numbers } = dependenciesOf(reads, parts);
  const scope = choices.map((id) => {
    const index = parts.choiceIndex.get(id);
    if (index === undefined)
      throw new RangeError(`rule ${rule.id} reads the choice ${id}, which there is not`);
    return index;
  });
  return {
    rule,
    scope: scope.filter((index) => index !== parts.familyChoice).sort((a, b) => a - b),
    numbers,
    figures: [...reads.figures],
  };
}

/** The choices and typed numbers on which it depends what is read: those that supply it, or say whether a number is read. */
export function dependenciesOf(
  reads: RuleReads,
  { suppliers, gates, numberFields }: Pick<RuleParts, "suppliers" | "gates" | "numberFields">,
): { choices: string[]; numbers: string[] } {
  const choices = new Set(reads.choices);
  const values = new Set(reads.values);
  const words = new Set(reads.words);
  const numbers = new Set(reads.numbers);
  for (const figure of figureDefinitions) {
    if (!reads.figures.has(figure.id)) continue;
    figure.values.forEach((name) => values.add(name));
    figure.words?.forEach((name) => words.add(name));
    figure.numbers?.forEach((id) => numbers.add(id));
    figure.choices?.forEach((name) => choices.add(name));
  }
  for (const name of values) {
    suppliers.value.get(name)?.forEach((choice) => choices.add(choice));
    if (numberFields.has(name)) numbers.add(name);
  }
  for (const name of words) suppliers.word.get(name)?.forEach((choice) => choices.add(choice));
  for (const id of numbers) gates.get(id)?.forEach(([choice]) => choices.add(choice));
  return { choices: [...choices], numbers: [...numbers] };
}
