import { describe, expect, test } from "vitest";
import type { z } from "zod";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { catalogueSchema, type Catalogue, type Rule } from "#shared/catalogue/catalogue.ts";
import { priceListSchema } from "#shared/pricing/price-list.ts";
import { checkCatalogue } from "#shared/rules/check-catalogue.ts";
import type { Flaw } from "#shared/rules/flaw.ts";

type Draft = z.input<typeof catalogueSchema>;

const help = { what: "What it is.", when: "When it is wanted.", cost: "What it costs." };
const choiceOf = (id: string, ...options: string[]): Draft["choices"][number] => ({
  id,
  name: id,
  question: `${id}?`,
  help,
  options: options.map((option) => ({ id: option, name: option })),
});
const familyOf = (id: string): Draft["families"][number] => ({
  id,
  name: id,
  summary: "",
  values: { boreSpacing: 4.4 },
  weight: 100,
  minutes: {},
  facts: [],
  crate: { length: 1, width: 1, height: 1, weight: 1 },
});

type Requirement = Omit<Extract<Rule, { kind: "expression" }>, "kind" | "sentence" | "why" | "severity"> & {
  severity?: Rule["severity"];
};
const rule = (parts: Requirement): Rule => ({
  kind: "expression",
  severity: "stop",
  sentence: `${parts.id} holds.`,
  why: "Invented for the test.",
  ...parts,
});

/** Two families, two colours, two sizes, one number, and whatever the test changes. */
function small(changes: Partial<Draft> = {}): Catalogue {
  return catalogueSchema.parse({
    version: 1,
    name: "Small",
    publishedOn: "2026-01-05",
    families: [familyOf("ash"), familyOf("oak")],
    steps: [{ id: "all", name: "All", intro: "", choices: ["family", "colour", "size"], numbers: ["load"] }],
    choices: [
      choiceOf("family", "ash", "oak"),
      choiceOf("colour", "red", "blue"),
      choiceOf("size", "small", "large"),
    ],
    numbers: [{ id: "load", name: "Load", unit: "hp", step: 1, least: 10, most: 90 }],
    rules: [],
    ...changes,
  });
}

const prices = priceListSchema.parse({
  version: 3,
  name: "Prices",
  effectiveOn: "2026-01-05",
  currency: "USD",
  families: { ash: 100, oak: 200 },
  options: { colour: { red: 0, blue: 5 }, size: { small: 0, large: { ash: 1, oak: 2 } } },
  freightByZone: {},
});

const check = (changes: Partial<Draft>): Flaw[] => checkCatalogue(small(changes), prices);
const brief = (flaws: Flaw[]) =>
  flaws.map(({ kind, severity, family, choice, options, rules }) =>
    [kind, severity, family, choice, options.join(" "), rules.join(" ")]
      .map((part) => part ?? "-")
      .join(" | "),
  );

describe("a small catalogue", () => {
  test("that is sound has no flaw", () => {
    expect(checkCatalogue(small(), prices)).toEqual([]);
    const useful = rule({
      id: "red-small",
      when: { choice: "colour", in: ["red"] },
      require: { choice: "size", in: ["small"] },
    });
    expect(check({ rules: [useful] })).toEqual([]);
  });

  test("with an option that no family allows names the rules against it", () => {
    const rules = [
      rule({
        id: "ash-not-blue",
        when: { choice: "family", in: ["ash"] },
        require: { choice: "colour", in: ["red"] },
      }),
      rule({
        id: "blue-large",
        when: { choice: "colour", in: ["blue"] },
        require: { choice: "size", in: ["large"] },
      }),
      rule({
        id: "oak-blue-small",
        when: {
          all: [
            { choice: "colour", in: ["blue"] },
            { choice: "family", in: ["oak"] },
          ],
        },
        require: { choice: "size", in: ["small"] },
      }),
    ];
    expect(brief(check({ rules }))).toEqual([
      "deadOption | caution | - | colour | blue | ash-not-blue blue-large oak-blue-small",
      "deadOption | note | ash | colour | blue | ash-not-blue",
      "oneAnswer | note | ash | colour | red | ash-not-blue",
      "deadOption | note | oak | colour | blue | blue-large oak-blue-small",
      "oneAnswer | note | oak | colour | red | blue-large oak-blue-small",
    ]);
  });

  test("with a family that has no build names the smallest set of rules to blame", () => {
    const rules = [
      rule({
        id: "bystander",
        when: { choice: "colour", in: ["red"] },
        require: { choice: "size", in: ["small"] },
      }),
      rule({
        id: "oak-red",
        when: { choice: "family", in: ["oak"] },
        require: { choice: "colour", in: ["red"] },
      }),
      rule({
        id: "oak-blue",
        when: { choice: "family", in: ["oak"] },
        require: { choice: "colour", in: ["blue"] },
      }),
    ];
    const found = brief(check({ rules }));
    expect(found[0]).toBe("impossibleFamily | stop | oak | - |  | oak-red oak-blue");
    expect(found.filter((line) => line.includes("| oak |")).length).toBe(1);
  });

  test("with rules that never bite tells idle ones from covered ones, with what covers them", () => {
    const rules = [
      rule({ id: "always", require: { choice: "colour", in: ["red", "blue"] } }),
      rule({ id: "load-within", require: { left: { number: "load" }, is: "<=", right: { constant: 90 } } }),
      rule({ id: "load-less", require: { left: { number: "load" }, is: "<=", right: { constant: 89 } } }),
      rule({
        id: "red-small",
        when: { choice: "colour", in: ["red"] },
        require: { choice: "size", in: ["small"] },
      }),
      rule({
        id: "oak-red-small",
        when: {
          all: [
            { choice: "colour", in: ["red"] },
            { choice: "family", in: ["oak"] },
          ],
        },
        require: { choice: "size", in: ["small"] },
      }),
      rule({
        id: "never-seen",
        severity: "note",
        when: { choice: "colour", in: ["red"] },
        require: { not: { choice: "size", in: ["large"] } },
      }),
    ];
    expect(brief(check({ rules }))).toEqual([
      "idleRule | caution | - | - |  | always",
      "idleRule | caution | - | - |  | load-within",
      "coveredRule | note | - | - |  | oak-red-small red-small",
      "idleRule | caution | - | - |  | never-seen",
    ]);
  });

  test("with missing prices says which, in which family", () => {
    const partial = {
      ...prices,
      families: { ash: 100 },
      options: { colour: { red: 0, blue: { ash: 1 } }, size: { small: 0 } },
    };
    expect(brief(checkCatalogue(small(), partial))).toEqual([
      "missingPrice | stop | ash | size | large | ",
      "missingPrice | stop | oak | - |  | ",
      "missingPrice | stop | oak | colour | blue | ",
      "missingPrice | stop | oak | size | large | ",
    ]);
  });

  test("with names that are not defined says where each stands, and nothing of what depends on them", () => {
    const rules = [
      rule({
        id: "wrong",
        when: { all: [{ choice: "shape", in: ["round"] }, { not: { choice: "colour", in: ["green"] } }] },
        require: {
          any: [
            { word: "grain", in: ["fine"] },
            { left: { figure: "shine" }, is: ">=", right: { sum: [{ value: "gloss" }, { number: "pull" }] } },
          ],
        },
      }),
      {
        ...rule({ id: "table", require: { choice: "colour", in: ["red"] } }),
        kind: "table" as const,
        choices: ["family", "size"],
        rows: [[["elm"], ["small"]]],
      },
    ];
    const option = {
      id: "large",
      name: "large",
      families: ["elm"],
      reads: ["pull"],
      words: { rodOutline: "bent" },
    };
    const flaws = check({
      rules,
      steps: [{ id: "all", name: "All", intro: "", choices: ["family", "colour", "weight"] }],
      choices: [
        choiceOf("family", "ash", "oak"),
        choiceOf("colour", "red", "blue", "red"),
        { ...choiceOf("size", "small"), options: [{ id: "small", name: "small" }, option] },
      ],
      numbers: [
        {
          id: "load",
          name: "Load",
          unit: "hp",
          step: 1,
          least: 10,
          most: 90,
          onlyWith: { choice: "size", option: "huge" },
        },
      ],
    });
    expect(flaws.every(({ severity }) => severity === "stop")).toBe(true);
    expect(flaws.map(({ sentence }) => sentence)).toEqual([
      'The option of colour "red" is there more than once.',
      'Rule wrong names the choice "shape", which there is not.',
      'Rule wrong names the value "gloss", which there is not.',
      'Rule wrong names the word "grain", which there is not.',
      'Rule wrong names the number "pull", which there is not.',
      'Rule wrong names the figure "shine", which there is not.',
      'Rule wrong names the option "colour green", which there is not.',
      'Rule table names the option "family elm", which there is not.',
      'Step all names the choice "weight", which there is not.',
      "No step asks for size.",
      "No step asks for Load.",
      'size: large names the family "elm", which there is not.',
      'size: large names the number "pull", which there is not.',
      'size: large names the outline "bent", which there is not.',
      'Load names the option "size huge", which there is not.',
    ]);
    expect(flaws.filter(({ rules: named }) => named.includes("wrong"))).toHaveLength(6);
  });

  test("without a choice of families, or with a family that is not described, says so", () => {
    const steps = [{ id: "all", name: "All", intro: "", choices: ["colour"], numbers: ["load"] }];
    expect(
      checkCatalogue(small({ steps, choices: [choiceOf("colour", "red", "blue")] }), prices).map(
        ({ sentence }) => sentence,
      ),
    ).toContain('The catalogue names the choice "family", which there is not.');
    const more = small({
      families: [familyOf("ash"), familyOf("elm")],
    });
    expect(checkCatalogue(more, prices).map(({ sentence }) => sentence)).toEqual(
      expect.arrayContaining([
        'The choice of families names the family "oak", which there is not.',
        'The family "elm" is described, but its choice does not offer it.',
        'Price list 3 names the family "oak", which there is not.',
      ]),
    );
  });
});

describe("the demo catalogue", { timeout: 60_000 }, () => {
  test("has nothing that stops or cautions, and every note is meant", () => {
    const flaws = checkCatalogue(demoCatalogue, demoPriceList);
    expect(flaws.filter(({ severity }) => severity !== "note")).toEqual([]);
    expect(brief(flaws.filter(({ choice }) => choice !== "bore"))).toEqual([
      "oneAnswer | note | marl | iron | grey40 | ",
      "oneAnswer | note | marl | deckHeight | d9025 | ",
      "oneAnswer | note | marl | mainSize | m2450 | ",
      "oneAnswer | note | gneiss | mainSize | m2750 | ",
      "deadOption | note | marl | capStyle | fourBoltSplayedBillet | caps-by-family",
      "deadOption | note | basalt | capStyle | twoBolt | caps-by-family",
      "deadOption | note | gneiss | capStyle | twoBolt | caps-by-family",
      "deadOption | note | gneiss | rearSeal | onePiece | one-piece-seal-main",
      "oneAnswer | note | gneiss | rearSeal | twoPiece | one-piece-seal-main",
      "deadOption | note | marl | rotatingAssembly | s3750r6000aluminium | rod-to-case-aluminium",
      "deadOption | note | basalt | lifterStyle | rollerRetainers | retainer-valley",
      "deadOption | note | gneiss | lifterStyle | rollerRetainers | retainer-valley",
      "oneAnswer | note | marl | camHeight | standard | ",
      // The range of bores already keeps the web; only Marl has the valley, and its cam is not raised.
      "coveredRule | note | - | - |  | web-least bores-by-family",
      "coveredRule | note | - | - |  | retainer-cam-height retainer-valley",
    ]);
    const bores = flaws.filter(({ choice }) => choice === "bore");
    expect(bores.map(({ family, options, rules }) => [family, options.length, rules])).toEqual([
      ["marl", 50, ["bores-by-family"]],
      ["basalt", 41, ["bores-by-family"]],
      ["gneiss", 41, ["bores-by-family"]],
    ]);
  });

  test("with one limit moved shows what it kills", () => {
    const tight = demoCatalogue.rules.map((entry) =>
      entry.id === "counterweight-to-boss" && entry.kind === "expression"
        ? {
            ...entry,
            require: {
              left: { figure: "counterweightToBoss" },
              is: ">=" as const,
              right: { constant: 0.1 },
            },
          }
        : entry,
    );
    const flaws = checkCatalogue({ ...demoCatalogue, rules: tight }, demoPriceList);
    const dead = flaws.filter(({ severity }) => severity === "caution");
    expect(dead.map(({ kind, options, rules }) => [kind, options, rules])).toEqual([
      ["deadOption", ["s4125r6000steel"], ["counterweight-to-boss"]],
      ["deadOption", ["s4125r5850steel"], ["counterweight-to-boss"]],
    ]);
  });
});
