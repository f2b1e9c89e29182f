import type { Catalogue, Choice, Family, NumberField, Option, Rule } from "../catalogue/catalogue.ts";
import { figureDefinitions, type FigureDefinition } from "./figures.ts";
import { createReading, type Reading } from "./reading.ts";
import { judge, readsOf } from "./verdict.ts";

/** A rule with what it depends on. */
export interface CompiledRule {
  rule: Rule;
  /** Indices of the choices it depends on, the family choice left out: every rule may depend on the family. */
  scope: readonly number[];
  numbers: readonly string[];
  figures: readonly string[];
}

/** Answers as option indices by choice index; -1 = unanswered. */
export type Assignment = Int16Array;

/** One stop rule as a table over its scope, filled as it is asked. */
export interface Constraint {
  /** Index among the stop rules. */
  stop: number;
  scope: readonly number[];
  strides: readonly number[];
  /** By the sum of option index x stride: whether these options may stand together. */
  allows(cell: number): boolean;
}

/** All stop rules for one family at the present typed numbers. */
export interface Problem {
  /** Option index of the family in the family choice. */
  family: number;
  /** By flat option index: 1 where the option exists in this family. */
  exists: Uint8Array;
  constraints: readonly Constraint[];
  constraintsOf: readonly (readonly Constraint[])[];
}

export interface CompiledCatalogue {
  catalogue: Catalogue;
  choices: readonly Choice[];
  choiceIndex: ReadonlyMap<string, number>;
  familyChoice: number;
  /** Flat index of each choice's first option, and one past the last of all. */
  offsets: readonly number[];
  rules: readonly CompiledRule[];
  stops: readonly CompiledRule[];
  figures: readonly FigureDefinition[];
  numberFields: ReadonlyMap<string, NumberField>;
  /** Family index in `catalogue.families` by option index of the family choice. */
  families: readonly Family[];
  reading(
    family: number,
    optionIndexOf: (choice: number) => number,
    numbers: Readonly<Record<string, string>>,
  ): Reading;
  problem(family: number, numbers: Readonly<Record<string, string>>): Problem;
  /** Known answers of a build: option indices, unknown or nonexistent ones left out. */
  assignment(answers: Readonly<Record<string, string>>): Assignment;
}

const compiled = new WeakMap<Catalogue, CompiledCatalogue>();

/**
 * Compiles a catalogue: indices, what every rule reads, and its stop rules as tables per family. Kept per catalogue object.
 * Throws RangeError where the catalogue is not sound: no family choice, an unknown choice, figure or option in a rule.
 */
export function compileCatalogue(catalogue: Catalogue): CompiledCatalogue {
  const known = compiled.get(catalogue);
  if (known !== undefined) return known;
  const made = compile(catalogue);
  compiled.set(catalogue, made);
  return made;
}

/** Cells of a table that are kept; above it every question is answered anew. */
const mostCells = 1 << 20;
/** Tables kept per rule for different families and typed numbers. */
const mostTables = 48;

function compile(catalogue: Catalogue): CompiledCatalogue {
  const { choices } = catalogue;
  const choiceIndex = new Map(choices.map((choice, index) => [choice.id, index]));
  const familyChoice = choiceIndex.get("family");
  if (familyChoice === undefined) throw new RangeError("the catalogue has no choice named family");
  const families = (choices[familyChoice]?.options ?? []).map(({ id }) => {
    const family = catalogue.families.find((candidate) => candidate.id === id);
    if (family === undefined) throw new RangeError(`the family ${id} is offered but not described`);
    return family;
  });
  const offsets = [0];
  for (const choice of choices) offsets.push((offsets.at(-1) ?? 0) + choice.options.length);
  const numberFields = new Map(catalogue.numbers.map((field) => [field.id, field]));
  const suppliers = suppliersOf(choices);
  const gates = gatesOf(catalogue);
  const figureFunctions = new Map(
    figureDefinitions.map((figure) => [figure.id, (reading: Reading) => figure.compute(reading, catalogue)]),
  );

  const reading: CompiledCatalogue["reading"] = (family, optionIndexOf, numbers) =>
    createReading({
      family: families[family] ?? null,
      optionOf(choice) {
        const index = choiceIndex.get(choice);
        if (index === undefined) return null;
        const at = index === familyChoice ? family : optionIndexOf(index);
        return choices[index]?.options[at] ?? null;
      },
      suppliersOfValue: suppliers.value,
      suppliersOfWord: suppliers.word,
      numberFields,
      gates,
      numbers,
      figures: figureFunctions,
    });

  const rules = catalogue.rules.map((rule) =>
    compileRule(rule, { choiceIndex, familyChoice, suppliers, gates, numberFields }),
  );
  const stops = rules.filter(({ rule }) => rule.severity === "stop");
  const existence = families.map((family) =>
    Uint8Array.from(
      choices.flatMap((choice, index) =>
        choice.options.map((option) =>
          index === familyChoice
            ? Number(option.id === family.id)
            : Number(option.families?.includes(family.id) ?? true),
        ),
      ),
    ),
  );
  const tables = stops.map(() => new Map<string, Constraint>());
  const problems = new Map<string, Problem>();

  const constraintOf = (
    stop: number,
    family: number,
    numbers: Readonly<Record<string, string>>,
  ): Constraint => {
    const entry = stops[stop];
    const kept = tables[stop];
    if (entry === undefined || kept === undefined) throw new RangeError(`there is no stop rule ${stop}`);
    const read = Object.fromEntries(
      entry.numbers.flatMap((id) => {
        const text = numbers[id];
        return text === undefined ? [] : [[id, text] as const];
      }),
    );
    const key = `${family} ${JSON.stringify(read)}`;
    const found = kept.get(key);
    if (found !== undefined) return found;
    if (kept.size >= mostTables) kept.clear();
    const made = createConstraint(stop, entry.scope, choices, (optionIndexOf) => {
      return judge(entry.rule, reading(family, optionIndexOf, read)) !== "broken";
    });
    kept.set(key, made);
    return made;
  };

  const stopNumbers = [...new Set(stops.flatMap((stop) => stop.numbers))].sort();
  const problem: CompiledCatalogue["problem"] = (family, numbers) => {
    const key = `${family} ${JSON.stringify(stopNumbers.map((id) => numbers[id] ?? null))}`;
    const found = problems.get(key);
    if (found !== undefined) return found;
    if (problems.size >= mostTables) problems.clear();
    const constraints = stops.map((_, stop) => constraintOf(stop, family, numbers));
    const made: Problem = {
      family,
      exists: existence[family] ?? new Uint8Array(offsets.at(-1) ?? 0),
      constraints,
      constraintsOf: choices.map((_, choice) => constraints.filter(({ scope }) => scope.includes(choice))),
    };
    problems.set(key, made);
    return made;
  };

  const assignment: CompiledCatalogue["assignment"] = (answers) => {
    const indices = new Int16Array(choices.length).fill(-1);
    const family = choices[familyChoice]?.options.findIndex(({ id }) => id === answers["family"]) ?? -1;
    choices.forEach((choice, index) => {
      const answer = answers[choice.id];
      if (answer === undefined) return;
      const at = choice.options.findIndex(({ id }) => id === answer);
      const exists = family < 0 || existence[family]?.[(offsets[index] ?? 0) + at] === 1;
      indices[index] = at >= 0 && exists ? at : -1;
    });
    return indices;
  };

  return {
    catalogue,
    choices,
    choiceIndex,
    familyChoice,
    offsets,
    rules,
    stops,
    figures: figureDefinitions,
    numberFields,
    families,
    reading,
    problem,
    assignment,
  };
}

interface Suppliers {
  value: ReadonlyMap<string, readonly string[]>;
  word: ReadonlyMap<string, readonly string[]>;
}

/** For every value and word the choices that may supply it; a later choice wins. */
function suppliersOf(choices: readonly Choice[]): Suppliers {
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

type Gates = ReadonlyMap<string, readonly (readonly [string, string])[]>;

function gatesOf(catalogue: Catalogue): Gates {
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

interface RuleParts {
  choiceIndex: ReadonlyMap<string, number>;
  familyChoice: number;
  suppliers: Suppliers;
  gates: Gates;
  numberFields: ReadonlyMap<string, NumberField>;
}

function compileRule(rule: Rule, parts: RuleParts): CompiledRule {
  const direct = readsOf(rule);
  const figures = [...direct.figures];
  const choices = new Set(direct.choices);
  const values = new Set(direct.values);
  const words = new Set(direct.words);
  const numbers = new Set(direct.numbers);
  for (const id of figures) {
    const figure = figureDefinitions.find((candidate) => candidate.id === id);
    if (figure === undefined)
      throw new RangeError(`rule ${rule.id} reads the figure ${id}, which there is not`);
    figure.values.forEach((name) => values.add(name));
    figure.words?.forEach((name) => words.add(name));
    figure.numbers?.forEach((id) => numbers.add(id));
    figure.choices?.forEach((name) => choices.add(name));
  }
  for (const name of values) {
    parts.suppliers.value.get(name)?.forEach((choice) => choices.add(choice));
    if (parts.numberFields.has(name)) numbers.add(name);
  }
  for (const name of words) parts.suppliers.word.get(name)?.forEach((choice) => choices.add(choice));
  for (const id of numbers) parts.gates.get(id)?.forEach(([choice]) => choices.add(choice));
  const scope = [...choices].map((id) => {
    const index = parts.choiceIndex.get(id);
    if (index === undefined)
      throw new RangeError(`rule ${rule.id} reads the choice ${id}, which there is not`);
    return index;
  });
  return {
    rule,
    scope: scope.filter((index) => index !== parts.familyChoice).sort((a, b) => a - b),
    numbers: [...numbers],
    figures,
  };
}

/** A table over the scope whose cells are judged the first time they are asked for. */
function createConstraint(
  stop: number,
  scope: readonly number[],
  choices: readonly Choice[],
  kept: (optionIndexOf: (choice: number) => number) => boolean,
): Constraint {
  const sizes = scope.map((choice) => choices[choice]?.options.length ?? 0);
  const strides = sizes.map((_, at) => sizes.slice(0, at).reduce((product, size) => product * size, 1));
  const cells = sizes.reduce((product, size) => product * size, 1);
  const judgeCell = (cell: number): boolean =>
    kept((choice) => {
      const at = scope.indexOf(choice);
      return at < 0 ? -1 : Math.floor(cell / (strides[at] ?? 1)) % (sizes[at] ?? 1);
    });
  if (cells > mostCells) return { stop, scope, strides, allows: judgeCell };
  const table = new Uint8Array(cells);
  return {
    stop,
    scope,
    strides,
    allows(cell) {
      const judged = table[cell];
      if (judged !== 0) return judged === 1;
      const allowed = judgeCell(cell);
      table[cell] = allowed ? 1 : 2;
      return allowed;
    },
  };
}
