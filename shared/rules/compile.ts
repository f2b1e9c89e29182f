import type { Catalogue, Choice, Family, NumberField } from "../catalogue/catalogue.ts";
import { compileRule, dependenciesOf, gatesOf, suppliersOf, type CompiledRule } from "./compile-rule.ts";
import { figureDefinitions, type FigureDefinition } from "./figures.ts";
import { createProblem, type Assignment, type Problem } from "./problem.ts";
import { createReading, type LiveReading, type Reading } from "./reading.ts";
import { createRuleTables, type CellVerdict, type Numbers, type RuleTable } from "./rule-table.ts";
import { isIdle, judge } from "./verdict.ts";

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
  /** By choice: 1 where the iron that is bored out depends on it. */
  borings: Uint8Array;
  /** Weights of a family's iron that are known at the typed numbers, by the answers of these choices. */
  ironWeights(family: number, numbers: Numbers): Map<number, number>;
  /** By flat option index: which options take the same minutes at every work centre; 0 = none. */
  works: Int32Array;
  /** Ids of the choices in the order of the steps; a choice of no step comes last. */
  order: readonly string[];
  /** Families by option index of the family choice. */
  families: readonly Family[];
  reading(family: number, optionIndexOf: (choice: number) => number, numbers: Numbers): LiveReading;
  /** The verdict tables of all rules, as `rules`, for a family (-1 = none) at the typed numbers. */
  tables(family: number, numbers: Numbers): readonly RuleTable[];
  /** The stop rules of a family at the typed numbers; the same object for the same numbers that stop rules read. */
  problem(family: number, numbers: Numbers): Problem;
  /** Whether a choice's option exists in the family (any without one); all families exist. */
  exists(family: number, choice: number, option: number): boolean;
  /** Answers of a build that the catalogue knows, as option indices, whether they exist in its family or not. */
  known(answers: Readonly<Record<string, string>>): Assignment;
  /** The same without those that do not exist in its family. */
  assignment(answers: Readonly<Record<string, string>>): Assignment;
}

const compiled = new WeakMap<Catalogue, CompiledCatalogue>();

/**
 * Compiles a catalogue: indices, what every rule reads, and its rules as tables per family. Kept per catalogue object.
 * Throws RangeError where the catalogue is not sound: no family choice, an unknown choice, figure or option in a rule.
 */
export function compileCatalogue(catalogue: Catalogue): CompiledCatalogue {
  const known = compiled.get(catalogue);
  if (known !== undefined) return known;
  const made = compile(catalogue);
  compiled.set(catalogue, made);
  return made;
}

function compile(catalogue: Catalogue): CompiledCatalogue {
  const { choices } = catalogue;
  const choiceIndex = new Map(choices.map((choice, index) => [choice.id, index]));
  const familyChoice = choiceIndex.get("family");
  if (familyChoice === undefined) throw new RangeError("the catalogue has no choice named family");
  const families = familiesOf(catalogue, choices[familyChoice]);
  const offsets = [0];
  for (const choice of choices) offsets.push((offsets.at(-1) ?? 0) + choice.options.length);
  const numberFields = new Map(catalogue.numbers.map((field) => [field.id, field]));
  const suppliers = suppliersOf(choices);
  const gates = gatesOf(catalogue);
  const figures = new Map(
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
      figures,
    });

  const rules = catalogue.rules.map((rule) =>
    compileRule(rule, { choiceIndex, familyChoice, suppliers, gates, numberFields }),
  );
  const stops = rules.filter(({ rule }) => rule.severity === "stop");
  const optionGates = gateIndices(gates, choices, choiceIndex);
  const ruleTables = rules.map((entry) =>
    createRuleTables(entry, choices, optionGates, (family, optionIndexOf, numbers) => {
      const read = reading(family, optionIndexOf, numbers);
      return (): CellVerdict => {
        read.forget();
        const verdict = judge(entry.rule, read);
        if (verdict !== "undecided") return verdict === "kept" ? 1 : 2;
        return isIdle(entry.rule, read) ? 4 : 3;
      };
    }),
  );
  const existence = existenceOf(families, choices, familyChoice);
  const tables = keptByNumbers(rules, (family, numbers) =>
    ruleTables.map((created) => created.table(family, numbers)),
  );
  const problem = keptByNumbers(stops, (family, numbers) =>
    createProblem(
      family,
      existence[family] ?? new Uint8Array(offsets.at(-1) ?? 0),
      choices,
      tables(family, numbers).filter((_, at) => rules[at]?.rule.severity === "stop"),
    ),
  );

  const boring = dependenciesOf(boringReads, { suppliers, gates, numberFields });
  const known = answerReader(choices);
  const exists: CompiledCatalogue["exists"] = (family, choice, option) =>
    family < 0 || choice === familyChoice || existence[family]?.[(offsets[choice] ?? 0) + option] === 1;

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
    borings: boringsOf(choices, boring.choices),
    ironWeights: keptByNumbers([boring], () => new Map<number, number>()),
    works: worksOf(choices),
    order: [...new Set([...catalogue.steps.flatMap((step) => step.choices), ...choices.map(({ id }) => id)])],
    families,
    reading,
    tables,
    problem,
    exists,
    known,
    assignment(answers) {
      const given = known(answers);
      const family = given[familyChoice] ?? -1;
      return given.map((option, choice) => (option < 0 || exists(family, choice, option) ? option : -1));
    },
  };
}

/** What the weight of a block reads besides the weights of its options. */
const boringReads = {
  choices: new Set<string>(),
  values: new Set(["bore", "deckHeight", "baseDeckHeight", "baseBore", "barrelBottom", "cylinders"]),
  words: new Set<string>(),
  numbers: new Set<string>(),
  figures: new Set(["deliveredBore"]),
};

function boringsOf(choices: readonly Choice[], ids: readonly string[]): Uint8Array {
  return Uint8Array.from(choices, ({ id }) => Number(ids.includes(id)));
}

function worksOf(choices: readonly Choice[]): Int32Array {
  const marks = new Map<string, number>([[JSON.stringify([]), 0]]);
  return Int32Array.from(
    choices.flatMap(({ options }) => options),
    ({ minutes }) => {
      const taken = Object.entries(minutes).filter(([, own]) => own !== 0);
      const key = JSON.stringify(taken.sort(([a], [b]) => (a < b ? -1 : 1)));
      const mark = marks.get(key) ?? marks.size;
      marks.set(key, mark);
      return mark;
    },
  );
}

function familiesOf(catalogue: Catalogue, choice: Choice | undefined): Family[] {
  return (choice?.options ?? []).map(({ id }) => {
    const family = catalogue.families.find((candidate) => candidate.id === id);
    if (family === undefined) throw new RangeError(`the family ${id} is offered but not described`);
    return family;
  });
}

/** By family and flat option index: 1 where the option exists in the family. */
function existenceOf(
  families: readonly Family[],
  choices: readonly Choice[],
  familyChoice: number,
): Uint8Array[] {
  return families.map((family) =>
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
}

/** Gates as indices. */
function gateIndices(
  gates: ReadonlyMap<string, readonly (readonly [string, string])[]>,
  choices: readonly Choice[],
  choiceIndex: ReadonlyMap<string, number>,
): Map<string, (readonly [number, number])[]> {
  return new Map(
    [...gates].map(([id, options]) => [
      id,
      options.map(([choice, option]) => {
        const index = choiceIndex.get(choice) ?? -1;
        return [index, choices[index]?.options.findIndex((known) => known.id === option) ?? -1] as const;
      }),
    ]),
  );
}

/** Things kept per family for different typed numbers. */
const mostKept = 48;

/** Keeps what is made for a family and the typed numbers that these rules read. */
function keptByNumbers<Made>(
  rules: readonly Pick<CompiledRule, "numbers">[],
  make: (family: number, numbers: Numbers) => Made,
): (family: number, numbers: Numbers) => Made {
  const read = [...new Set(rules.flatMap(({ numbers }) => numbers))].sort();
  const kept = new Map<string, Made>();
  return (family, numbers) => {
    const typed = read.filter((id) => numbers[id] !== undefined);
    const key = `${family} ${typed.length === 0 ? "" : JSON.stringify(typed.map((id) => [id, numbers[id]]))}`;
    const made = kept.get(key) ?? make(family, numbers);
    // What was asked for last goes last.
    kept.delete(key);
    kept.set(key, made);
    const [oldest] = kept.keys();
    if (kept.size > mostKept && oldest !== undefined) kept.delete(oldest);
    return made;
  };
}

function answerReader(choices: readonly Choice[]): CompiledCatalogue["known"] {
  const indices = choices.map(({ options }) => new Map(options.map(({ id }, at) => [id, at])));
  return (answers) =>
    Int16Array.from(choices, ({ id }, choice) => indices[choice]?.get(answers[id] ?? "") ?? -1);
}
