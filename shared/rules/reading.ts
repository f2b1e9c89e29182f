import type { Condition, Expression, Family, NumberField, Option } from "../catalogue/catalogue.ts";
import { compareQuantities } from "../units/length.ts";

/**
 * What a family, answers and typed numbers say: named values, words, typed numbers and figures. Null = not known. Conditions
 * are three-valued: true, false, or null where they read something that is not known.
 */
export interface Reading {
  family: Family | null;
  chosen(choice: string): string | null;
  value(name: string): number | null;
  word(name: string): string | null;
  number(id: string): number | null;
  figure(id: string): number | null;
}

/** Answer of a choice as the reading needs it. */
export interface ReadingSource {
  family: Family | null;
  /** The chosen option of a choice; null = none. */
  optionOf(choice: string): Option | null;
  /** Choices that may supply a value, the winning one first. */
  suppliersOfValue: ReadonlyMap<string, readonly string[]>;
  suppliersOfWord: ReadonlyMap<string, readonly string[]>;
  numberFields: ReadonlyMap<string, NumberField>;
  /** Options that read a number, as [choice, option]; a number with gates is read only while one of them is chosen. */
  gates: ReadonlyMap<string, readonly (readonly [string, string])[]>;
  numbers: Readonly<Record<string, string>>;
  figures: ReadonlyMap<string, (reading: Reading) => number | null>;
}

/** Value of one option in a family: by family first, then its own; undefined = it says nothing. */
function optionValue(option: Option, family: Family | null, name: string): number | undefined {
  return (family === null ? undefined : option.valuesByFamily[family.id]?.[name]) ?? option.values[name];
}

/** What is wrong with a typed number: no number, outside its range, or off its grid; null = nothing. */
export function numberProblem(field: NumberField, text: string): string | null {
  const typed = text.trim() === "" ? Number.NaN : Number(text);
  if (!Number.isFinite(typed)) return `${field.name}: enter a plain number.`;
  if (typed < field.least || typed > field.most) {
    return `${field.name} lies between ${field.least} and ${field.most} ${field.unit}.`;
  }
  const steps = typed / field.step;
  if (Math.abs(steps - Math.round(steps)) > 1e-6)
    return `${field.name} is given in steps of ${field.step} ${field.unit}.`;
  return null;
}

/** A reading whose answers may be changed under it, once it forgets the figures it knows. */
export interface LiveReading extends Reading {
  forget(): void;
}

export function createReading(source: ReadingSource): LiveReading {
  return new SourceReading(source);
}

/** A class, since thousands of them are made when tables are filled. */
class SourceReading implements LiveReading {
  readonly family: Family | null;
  readonly #source: ReadingSource;
  readonly #figures = new Map<string, number | null>();

  constructor(source: ReadingSource) {
    this.#source = source;
    this.family = source.family;
  }

  forget(): void {
    this.#figures.clear();
  }

  chosen(choice: string): string | null {
    return this.#source.optionOf(choice)?.id ?? null;
  }

  value(name: string): number | null {
    const { suppliersOfValue, family } = this.#source;
    for (const choice of suppliersOfValue.get(name) ?? []) {
      const option = this.#source.optionOf(choice);
      if (option === null) continue;
      // A number of the same name that the option reads stands for the value, known or not.
      if (option.reads.includes(name)) return this.number(name);
      const value = optionValue(option, family, name);
      if (value !== undefined) return value;
    }
    return family?.values[name] ?? null;
  }

  word(name: string): string | null {
    for (const choice of this.#source.suppliersOfWord.get(name) ?? []) {
      const word = this.#source.optionOf(choice)?.words[name];
      if (word !== undefined) return word;
    }
    return null;
  }

  number(id: string): number | null {
    const source = this.#source;
    const text = source.numbers[id];
    const field = source.numberFields.get(id);
    if (text === undefined || field === undefined || numberProblem(field, text) !== null) return null;
    const gates = source.gates.get(id) ?? [];
    const read =
      gates.length === 0 || gates.some(([choice, option]) => source.optionOf(choice)?.id === option);
    return read ? Number(text) : null;
  }

  figure(id: string): number | null {
    const cached = this.#figures.get(id);
    if (cached !== undefined) return cached;
    const figure = this.#source.figures.get(id)?.(this) ?? null;
    this.#figures.set(id, figure);
    return figure;
  }
}

/** The quantity of an expression; null where a part of it is not known. */
export function quantityOf(expression: Expression, reading: Reading): number | null {
  if ("constant" in expression) return expression.constant;
  if ("figure" in expression) return reading.figure(expression.figure);
  if ("value" in expression) return reading.value(expression.value);
  if ("number" in expression) return reading.number(expression.number);
  if ("sum" in expression) {
    return expression.sum.reduce<number | null>((sum, part) => {
      const quantity = quantityOf(part, reading);
      return sum === null || quantity === null ? null : sum + quantity;
    }, 0);
  }
  const [first, second] = "difference" in expression ? expression.difference : expression.product;
  const left = quantityOf(first, reading);
  const right = quantityOf(second, reading);
  if (left === null || right === null) return null;
  return "difference" in expression ? left - right : left * right;
}

/** Whether a condition holds; null = undecided. Three-valued: more knowledge never turns true or false about. */
export function holds(condition: Condition, reading: Reading): boolean | null {
  if ("choice" in condition) {
    const chosen = reading.chosen(condition.choice);
    return chosen === null ? null : condition.in.includes(chosen);
  }
  if ("word" in condition) {
    const word = reading.word(condition.word);
    return word === null ? null : condition.in.includes(word);
  }
  if ("all" in condition) return conjunction(condition.all, reading, true);
  if ("any" in condition) return conjunction(condition.any, reading, false);
  if ("not" in condition) {
    const inner = holds(condition.not, reading);
    return inner === null ? null : !inner;
  }
  const left = quantityOf(condition.left, reading);
  const right = quantityOf(condition.right, reading);
  if (left === null || right === null) return null;
  const order = compareQuantities(left, right);
  switch (condition.is) {
    case ">=":
      return order >= 0;
    case "<=":
      return order <= 0;
    case ">":
      return order > 0;
    case "<":
      return order < 0;
    case "=":
      return order === 0;
  }
}

/** All parts hold (neutral true), or any part holds (neutral false). */
function conjunction(parts: readonly Condition[], reading: Reading, neutral: boolean): boolean | null {
  let undecided = false;
  for (const part of parts) {
    const held = holds(part, reading);
    if (held === !neutral) return held;
    if (held === null) undecided = true;
  }
  return undecided ? null : neutral;
}
