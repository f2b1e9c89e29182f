import type { Catalogue, Condition, Option, Rule } from "../catalogue/catalogue.ts";
import type { PriceList } from "../pricing/price-list.ts";
import { figureDefinitions } from "./figures.ts";
import { flaw, type Flaw } from "./flaw.ts";
import { readsOf } from "./verdict.ts";

/** Every name that the catalogue defines. */
interface Names {
  families: ReadonlySet<string>;
  /** Option ids by choice id. */
  options: ReadonlyMap<string, ReadonlySet<string>>;
  numbers: ReadonlySet<string>;
  values: ReadonlySet<string>;
  words: ReadonlySet<string>;
  figures: ReadonlySet<string>;
}

/** Names that are used and not defined, in rules, steps, numbers, options and prices, and names that are given twice. */
export function checkNames(catalogue: Catalogue, priceList: PriceList): Flaw[] {
  const names = namesOf(catalogue);
  return [
    ...doubles(catalogue),
    ...familyNames(names),
    ...catalogue.rules.flatMap((rule) => ruleNames(rule, names)),
    ...stepNames(catalogue, names),
    ...readerNames(catalogue, names),
    ...priceNames(priceList, names),
  ];
}

function namesOf(catalogue: Catalogue): Names {
  const options = catalogue.choices.flatMap((choice) => choice.options);
  const numbers = catalogue.numbers.map(({ id }) => id);
  return {
    families: new Set(catalogue.families.map(({ id }) => id)),
    options: new Map(
      catalogue.choices.map((choice) => [choice.id, new Set(choice.options.map(({ id }) => id))]),
    ),
    numbers: new Set(numbers),
    values: new Set([
      ...catalogue.families.flatMap(({ values }) => Object.keys(values)),
      ...options.flatMap(valuesOf),
      ...numbers,
    ]),
    words: new Set(options.flatMap(({ words }) => Object.keys(words))),
    figures: new Set(figureDefinitions.map(({ id }) => id)),
  };
}

function valuesOf({ values, valuesByFamily, reads }: Option): string[] {
  return [...Object.keys(values), ...Object.values(valuesByFamily).flatMap(Object.keys), ...reads];
}

function unknown(where: string, kind: string, id: string, more: Partial<Flaw> = {}): Flaw {
  const sentence = `${where} names the ${kind} "${id}", which there is not.`;
  return flaw({ kind: "unknownName", severity: "stop", sentence, ...more });
}

function doubles(catalogue: Catalogue): Flaw[] {
  const lists: [what: string, ids: string[]][] = [
    ["family", catalogue.families.map(({ id }) => id)],
    ["choice", catalogue.choices.map(({ id }) => id)],
    ["rule", catalogue.rules.map(({ id }) => id)],
    ["number", catalogue.numbers.map(({ id }) => id)],
    ["step", catalogue.steps.map(({ id }) => id)],
    ...catalogue.choices.map(({ id, options }): [string, string[]] => [
      `option of ${id}`,
      options.map((option) => option.id),
    ]),
  ];
  return lists.flatMap(([what, ids]) =>
    [...new Set(ids.filter((id, at) => ids.indexOf(id) !== at))].map((id) =>
      flaw({
        kind: "doubleName",
        severity: "stop",
        sentence: `The ${what} "${id}" is there more than once.`,
        rules: what === "rule" ? [id] : [],
      }),
    ),
  );
}

function familyNames({ families, options }: Names): Flaw[] {
  const offered = options.get("family");
  if (offered === undefined) return [unknown("The catalogue", "choice", "family")];
  return [
    ...[...offered]
      .filter((id) => !families.has(id))
      .map((id) => unknown("The choice of families", "family", id, { choice: "family", options: [id] })),
    ...[...families]
      .filter((id) => !offered.has(id))
      .map((id) =>
        flaw({
          kind: "unknownName",
          severity: "stop",
          sentence: `The family "${id}" is described, but its choice does not offer it.`,
          family: id,
        }),
      ),
  ];
}

function ruleNames(rule: Rule, names: Names): Flaw[] {
  const where = `Rule ${rule.id}`;
  const inRule = { rules: [rule.id] };
  const reads = readsOf(rule);
  const missing = (kind: string, used: Iterable<string>, known: { has(id: string): boolean }): Flaw[] =>
    [...used].filter((id) => !known.has(id)).map((id) => unknown(where, kind, id, inRule));
  const used = rule.kind === "table" ? tableOptions(rule) : conditionOptions(rule);
  return [
    ...missing("choice", reads.choices, names.options),
    ...missing("value", reads.values, names.values),
    ...missing("word", reads.words, names.words),
    ...missing("number", reads.numbers, names.numbers),
    ...missing("figure", reads.figures, names.figures),
    ...used.flatMap(([choice, option]) =>
      names.options.get(choice)?.has(option) === false
        ? [unknown(where, "option", `${choice} ${option}`, { ...inRule, choice, options: [option] })]
        : [],
    ),
  ];
}

function tableOptions({ choices, rows }: Extract<Rule, { kind: "table" }>): [string, string][] {
  return rows.flatMap((row) =>
    row.flatMap((cell, at) => cell.map((option): [string, string] => [choices[at] ?? "", option])),
  );
}

function conditionOptions(rule: Extract<Rule, { kind: "expression" }>): [string, string][] {
  const collect = (condition: Condition): [string, string][] => {
    if ("choice" in condition) return condition.in.map((option) => [condition.choice, option]);
    if ("all" in condition) return condition.all.flatMap(collect);
    if ("any" in condition) return condition.any.flatMap(collect);
    return "not" in condition ? collect(condition.not) : [];
  };
  return [...(rule.when === undefined ? [] : collect(rule.when)), ...collect(rule.require)];
}

function stepNames({ steps, choices, numbers }: Catalogue, names: Names): Flaw[] {
  const stepped = new Set(steps.flatMap((step) => [...step.choices, ...step.numbers]));
  const unasked = [...choices, ...numbers].filter(({ id }) => !stepped.has(id));
  return [
    ...steps.flatMap((step) => [
      ...step.choices
        .filter((id) => !names.options.has(id))
        .map((id) => unknown(`Step ${step.id}`, "choice", id)),
      ...step.numbers
        .filter((id) => !names.numbers.has(id))
        .map((id) => unknown(`Step ${step.id}`, "number", id)),
    ]),
    ...unasked.map(({ id, name }) =>
      flaw({
        kind: "unknownName",
        severity: "stop",
        sentence: `No step asks for ${name}.`,
        choice: names.options.has(id) ? id : null,
      }),
    ),
  ];
}

/** Families, numbers and outlines that options name, and options that numbers name. */
function readerNames({ choices, numbers, outlines }: Catalogue, names: Names): Flaw[] {
  const drawn = new Set(outlines.map(({ id }) => id));
  return [
    ...choices.flatMap((choice) =>
      choice.options.flatMap((option) => {
        const where = `${choice.name}: ${option.name}`;
        const at = { choice: choice.id, options: [option.id] };
        const families = [...(option.families ?? []), ...Object.keys(option.valuesByFamily)];
        const outline = option.words["rodOutline"];
        return [
          ...families.filter((id) => !names.families.has(id)).map((id) => unknown(where, "family", id, at)),
          ...option.reads
            .filter((id) => !names.numbers.has(id))
            .map((id) => unknown(where, "number", id, at)),
          ...(outline === undefined || drawn.has(outline) ? [] : [unknown(where, "outline", outline, at)]),
        ];
      }),
    ),
    ...numbers.flatMap(({ name, onlyWith }) =>
      onlyWith === undefined || names.options.get(onlyWith.choice)?.has(onlyWith.option) === true
        ? []
        : [unknown(name, "option", `${onlyWith.choice} ${onlyWith.option}`)],
    ),
  ];
}

function priceNames({ version, families, options }: PriceList, names: Names): Flaw[] {
  const where = `Price list ${version}`;
  const amounts = Object.entries(options).flatMap(([choice, prices]) =>
    Object.entries(prices).map(([option, amount]) => ({ choice, option, amount })),
  );
  return [
    ...Object.keys(families)
      .filter((id) => !names.families.has(id))
      .map((id) => unknown(where, "family", id)),
    ...amounts.flatMap(({ choice, option, amount }) => {
      if (names.options.get(choice)?.has(option) !== true)
        return [unknown(where, "option", `${choice} ${option}`)];
      if (typeof amount === "number") return [];
      return Object.keys(amount)
        .filter((id) => !names.families.has(id))
        .map((id) => unknown(where, "family", id, { choice, options: [option] }));
    }),
  ];
}
