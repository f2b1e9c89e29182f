import { describe, expect, test } from "vitest";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { emptyBuild } from "#shared/catalogue/build.ts";
import { optionAmount } from "#shared/pricing/price-build.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { count } from "#shared/rules/open-options.ts";
import { buildOf, demoContext } from "./context.ts";

const { catalogue } = demoContext;
const compiled = compileCatalogue(catalogue);

describe("the demo catalogue is whole", () => {
  test("every choice is in one step, every number too", () => {
    const stepped = catalogue.steps.flatMap((step) => step.choices);
    expect([...stepped].sort()).toEqual(catalogue.choices.map(({ id }) => id).sort());
    expect(catalogue.steps.flatMap((step) => step.numbers)).toEqual(catalogue.numbers.map(({ id }) => id));
  });

  test("ids are there once and rules name options that there are", () => {
    const once = (ids: string[]) => expect(new Set(ids).size, ids.join(" ")).toBe(ids.length);
    once(catalogue.choices.map(({ id }) => id));
    once(catalogue.rules.map(({ id }) => id));
    for (const choice of catalogue.choices) once(choice.options.map(({ id }) => id));
    const options = new Set(
      catalogue.choices.flatMap((choice) => choice.options.map(({ id }) => `${choice.id} ${id}`)),
    );
    for (const rule of catalogue.rules) {
      if (rule.kind !== "table") continue;
      for (const row of rule.rows) {
        row.forEach((cell, at) =>
          cell.forEach((option) => expect(options).toContain(`${rule.choices[at] ?? ""} ${option}`)),
        );
      }
    }
    const named = JSON.stringify(catalogue.rules).matchAll(/\{"choice":"(\w+)","in":\[([^\]]+)\]\}/g);
    let count = 0;
    for (const [, choice = "", list = ""] of named) {
      for (const [, option = ""] of list.matchAll(/"(\w+)"/g))
        expect(options).toContain(`${choice} ${option}`);
      count += 1;
    }
    expect(count).toBeGreaterThan(20);
  });

  test("every choice and option has its own plain text, no two alike, none that shouts or promises", () => {
    const texts = catalogue.choices.flatMap((choice) => [
      choice.help.what,
      choice.help.when,
      choice.help.cost,
      choice.question,
      ...choice.options.map(({ description }) => description),
    ]);
    expect(texts.filter((text) => text.length < 15)).toEqual([]);
    expect(texts.filter((text, at) => texts.indexOf(text) !== at)).toEqual([]);
    const rules = catalogue.rules.flatMap(({ sentence, why }) => [sentence, why]);
    expect([...texts, ...rules].filter((text) => text.includes("!"))).toEqual([]);
    expect(catalogue.rules.filter(({ sentence }) => !/[.]$/.test(sentence))).toEqual([]);
  });

  test("the price list has an amount for every option in every family that makes it, and for every ZIP digit", () => {
    for (const family of catalogue.families) {
      expect(demoPriceList.families[family.id]).toBeGreaterThan(0);
      for (const choice of catalogue.choices) {
        if (choice.id === "family") continue;
        for (const option of choice.options) {
          if (option.families?.includes(family.id) === false) continue;
          expect(Number.isSafeInteger(optionAmount(demoPriceList, family.id, choice.id, option.id))).toBe(
            true,
          );
        }
      }
    }
    expect(Object.keys(demoPriceList.freightByZone).sort()).toEqual([..."0123456789"]);
  });
});

describe("the demo catalogue is useful", () => {
  test("each family has millions of valid builds, none of them counted for the numbers typed", () => {
    for (const { id } of catalogue.families) {
      expect(count(demoContext, buildOf({ family: id })), id).toBeGreaterThan(1_000_000n);
    }
  });

  test("every option can be reached", () => {
    const closed = evaluate(demoContext, emptyBuild).choices.flatMap(({ choice, options }) =>
      options.filter(({ open }) => !open).map(({ option }) => `${choice} ${option}`),
    );
    expect(closed).toEqual([]);
  });

  test("within a family only these options are never open, the bores of other families apart", () => {
    const dead = catalogue.families.map(({ id }) => {
      const { choices } = evaluate(demoContext, { ...emptyBuild, answers: { family: id } });
      const closed = choices.flatMap(({ choice, options }) =>
        choice === "bore" || choice === "family"
          ? []
          : options.filter(({ open }) => !open).map(({ option }) => option),
      );
      return [id, ...closed];
    });
    expect(dead).toEqual([
      ["marl", "fourBoltSplayedBillet", "s3750r6000aluminium"],
      ["basalt", "twoBolt", "rollerRetainers"],
      ["gneiss", "twoBolt", "onePiece", "rollerRetainers"],
    ]);
  });

  test("at least 45 rules, each said to be common practice, from memory, invented or no legal advice", () => {
    expect(catalogue.rules.length).toBeGreaterThanOrEqual(45);
    const source =
      /Common practice, no published source\.$|From memory, no published source at hand\.$|invented for the demo\.$|^Not legal advice|^House limit|from memory|otherwise common practice\.$/;
    expect(catalogue.rules.filter(({ why }) => !source.test(why)).map(({ id }) => id)).toEqual([]);
  });

  test("every number has its grid, range and unit, and is read by at least one rule or figure", () => {
    const grid = { in: 0.0001, cc: 0.1, rpm: 1, hp: 1 };
    const read = new Set([
      ...compiled.rules.flatMap(({ numbers }) => numbers),
      ...compiled.figures.flatMap(({ numbers = [], values }) => [...numbers, ...values]),
    ]);
    for (const { id, unit, step, least, most, group } of catalogue.numbers) {
      expect([id, step]).toEqual([id, grid[unit]]);
      expect(least).toBeLessThan(most);
      expect(group).not.toBe("");
      expect(read, id).toContain(id);
    }
  });
});
