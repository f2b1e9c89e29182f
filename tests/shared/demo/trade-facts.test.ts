import { describe, expect, test } from "vitest";
import type { Build } from "#shared/catalogue/build.ts";
import { workCentreSchema } from "#shared/catalogue/catalogue.ts";
import { checkOrderable } from "#shared/rules/check-orderable.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { explain } from "#shared/rules/explain.ts";
import { mend } from "#shared/rules/mend.ts";
import { buildOf, demoContext, marl400 } from "./context.ts";

const { catalogue } = demoContext;

function isOpen(build: Build, choice: string, option: string): boolean | undefined {
  const state = evaluate(demoContext, build).choices.find((candidate) => candidate.choice === choice);
  return state?.options.find((candidate) => candidate.option === option)?.open;
}

function figure(build: Build, id: string) {
  return evaluate(demoContext, build).figures.find((candidate) => candidate.id === id);
}

const changed = (answers: Build["answers"]): Build => ({
  ...marl400,
  answers: { ...marl400.answers, ...answers },
});

describe("an affordable block takes about 3.75 in of stroke with steel rods (common practice, no published source)", () => {
  test("the Marl as cast takes 3.750 in with steel rods and 0.065 in to spare at the case", () => {
    const checked = checkOrderable(demoContext, marl400);
    expect(checked.ok).toBe(true);
    expect(figure(marl400, "rodToCase")?.value).toBeCloseTo(0.065, 3);
    expect(figure(marl400, "rodToCase")?.limit).toEqual({ is: ">=", value: 0.06, rule: "rod-to-case-steel" });
    expect(figure(marl400, "displacement")?.value).toBeCloseTo(400.9, 1);
    expect(figure(marl400, "wall")?.value).toBe(0.215);
    expect(figure(marl400, "web")?.value).toBe(0.275);
    expect(figure(marl400, "deckClearance")?.value).toBe(0.025);
  });

  test("as cast it takes neither a 3.875 in stroke nor an aluminium rod at 3.750 in", () => {
    for (const [option, rule] of [
      ["s3875r6000steel", "rod-to-case-steel"],
      ["s3750r6000aluminium", "rod-to-case-aluminium"],
    ] as const) {
      const wanted = { choice: "rotatingAssembly", option };
      expect(isOpen(marl400, wanted.choice, option)).toBe(false);
      const reason = explain(demoContext, marl400, wanted);
      expect(reason.rules).toEqual([rule]);
      const checked = checkOrderable(demoContext, changed({ rotatingAssembly: option }));
      const sentence = catalogue.rules.find(({ id }) => id === rule)?.sentence ?? "";
      expect(checked.ok ? [] : checked.problems[0]).toEqual({ path: `rules.${rule}`, message: sentence });
    }
  });

  test("relieved, the 3.875 in stroke goes in, and that is its mend", () => {
    const wanted = { choice: "rotatingAssembly", option: "s3875r6000steel" };
    expect(explain(demoContext, marl400, wanted).answers).toEqual([
      { choice: "strokeClearance", option: "asCast" },
    ]);
    expect(mend(demoContext, marl400, wanted)).toEqual({
      changes: [{ choice: "strokeClearance", from: "asCast", to: "relieved" }],
      priceCents: 14_500,
      days: 0,
    });
    expect(
      checkOrderable(
        demoContext,
        changed({ rotatingAssembly: "s3875r6000steel", strokeClearance: "relieved" }),
      ).ok,
    ).toBe(true);
  });

  test("an aluminium rod at 3.750 in needs the deep relief, which the Marl does not have", () => {
    const aluminium = buildOf({ rotatingAssembly: "s3750r6000aluminium" });
    expect(isOpen(aluminium, "family", "marl")).toBe(false);
    expect(isOpen(aluminium, "family", "basalt")).toBe(true);
    expect(isOpen(aluminium, "strokeClearance", "relieved")).toBe(false);
    expect(isOpen(aluminium, "strokeClearance", "deepRelief")).toBe(true);
  });
});

describe("facts of the trade in every family (common practice, no published source)", () => {
  test.each([
    ["oil reaches the main bearings before cam and lifters", /Main bearings first, then cam and lifters/],
    ["decks are extra thick, even and parallel", /Extra thick, machined even and parallel/],
    ["head-bolt holes are blind: no sealer on head fasteners", /Blind holes: no thread sealer/],
    ["bores are cut with hone over-travel", /hone over-travel/],
    ["mains, cam bores and decks are delivered finished", /Main bores, cam bores and decks/],
    [
      "castings are qualified first, caps follow the second operation, the third locates on the decks",
      /Casting qualified first; caps fitted after the second operation; third operation locates on the decks/,
    ],
    ["galleries and faces are inspected before shipping", /Oil galleries and machined faces inspected/],
  ])("%s", (_, fact) => {
    for (const family of catalogue.families)
      expect(family.facts.some(({ value }) => fact.test(value))).toBe(true);
  });

  test("only the affordable family's valley is machined for production-type roller retainers", () => {
    expect(catalogue.families.map(({ id, values }) => [id, values["retainerValley"]])).toEqual([
      ["marl", 1],
      ["basalt", 0],
      ["gneiss", 0],
    ]);
    expect(isOpen(buildOf({ family: "marl" }), "lifterStyle", "rollerRetainers")).toBe(true);
    expect(isOpen(buildOf({ family: "basalt" }), "lifterStyle", "rollerRetainers")).toBe(false);
  });

  test("castings are qualified first, and the second operation takes most of the time", () => {
    expect(workCentreSchema.options[0]).toBe("qualify");
    const order = workCentreSchema.options;
    expect(order.indexOf("capFitting")).toBe(order.indexOf("secondOperation") + 1);
    expect(order.indexOf("thirdOperation")).toBe(order.indexOf("capFitting") + 1);
    for (const { minutes } of catalogue.families) {
      expect(minutes.qualify).toBeGreaterThan(0);
      expect(Math.max(...Object.values(minutes))).toBe(minutes.secondOperation);
    }
  });

  test("only a bought finish hone sends a block to the hone", () => {
    for (const { id, minutes } of catalogue.families) {
      expect(minutes.finishHone).toBeUndefined();
      for (const boreFinish of ["rough", "semiFinished"]) {
        expect(evaluate(demoContext, buildOf({ family: id, boreFinish })).minutes.finishHone).toBeUndefined();
      }
      expect(
        evaluate(demoContext, buildOf({ family: id, boreFinish: "finishHoned" })).minutes.finishHone,
      ).toBeGreaterThan(0);
    }
  });
});
