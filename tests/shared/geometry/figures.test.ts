import { describe, expect, test } from "vitest";
import type { Build } from "#shared/catalogue/build.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import type { Figure } from "#shared/rules/evaluation.ts";
import { buildOf, demoContext, marl400 } from "#tests/shared/demo/context.ts";

function figuresOf(build: Build): Map<string, Figure> {
  return new Map(evaluate(demoContext, build).figures.map((figure) => [figure.id, figure]));
}

function marlWith(answers: Build["answers"], numbers: Build["numbers"] = {}): Build {
  return buildOf({ ...marl400.answers, ...answers }, numbers);
}

const heads = { chamber: "64", gasketBore: "4.2000", gasketThickness: "0.0410", dish: "5" };

describe("figures of a build", () => {
  test("the swept clearances stand in the figures, with the place for the drawing", () => {
    const figures = figuresOf(marl400);
    expect(figures.get("rodToCam")?.value).toBe(0.3658);
    expect(figures.get("rodToBarrel")?.value).toBe(0.1124);
    expect(figures.get("rodToCam")?.at).toMatchObject({ bank: "right", rod: "own" });
    const at = figures.get("rodToBarrel")?.at;
    expect(at).toMatchObject({ bank: "right", rod: "other" });
    const [place, facing] = [at?.place ?? [0, 0], at?.facing ?? [0, 0]];
    expect(Math.hypot(place[0] - facing[0], place[1] - facing[1])).toBeCloseTo(0.1124, 4);
    expect(figures.get("rodToCase")).not.toHaveProperty("at");
  });

  test("the notch of the stroke clearance gives the barrel's room, and nothing to the cam", () => {
    const figures = figuresOf(marlWith({ strokeClearance: "relieved" }));
    expect(figures.get("rodToBarrel")?.value).toBe(0.2224);
    expect(figures.get("rodToCam")?.value).toBe(0.3658);
  });

  test("a set that is not known leaves every fit to it undecided", () => {
    const figures = figuresOf(marlWith({ rotatingAssembly: "notKnown" }, { ...heads, rpmAim: "6000" }));
    for (const id of ["rodToCam", "rodToBarrel", "rodToCase", "pistonToHead", "compressionRatio"]) {
      expect(figures.get(id), id).toMatchObject({ value: null });
      expect(figures.get(id), id).not.toHaveProperty("at");
    }
    expect(figures.get("peakPistonSpeed")?.value).toBeNull();
    expect(figures.get("gasketOverBore")?.value).toBe(0.075);
  });

  test("heads and gasket give the compression ratio; without them it is undecided", () => {
    const figures = figuresOf(marlWith({}, heads));
    expect(figures.get("pistonToHead")?.value).toBe(0.066);
    expect(figures.get("clearanceVolume")?.value).toBeCloseTo(83.7833, 4);
    expect(figures.get("compressionRatio")?.value).toBeCloseTo(10.802, 3);
    const without = figuresOf(marl400);
    expect(without.get("compressionRatio")?.value).toBeNull();
    expect(without.has("clearanceVolume")).toBe(false);
    expect(without.has("cylinderFromBore")).toBe(false);
  });

  test("piston speed and acceleration need the engine speed", () => {
    const figures = figuresOf(marlWith({}, { rpmAim: "6000" }));
    expect(figures.get("peakPistonSpeed")?.value).toBeCloseTo(31.362, 3);
    expect(figures.get("peakPistonAcceleration")).toMatchObject({ unit: "g" });
    expect(figures.get("peakPistonAcceleration")?.value).toBeCloseTo(2516.4, 1);
    expect(figuresOf(marl400).get("peakPistonSpeed")?.value).toBeNull();
  });

  test("nitrous adds its shot to what the engine makes without it", () => {
    const numbers = { rpmAim: "6000", nitrousShot: "150" };
    const plain = figuresOf(marlWith({}, numbers));
    const shot = figuresOf(marlWith({ induction: "nitrous" }, numbers));
    for (const id of ["powerLow", "powerHigh"]) {
      expect(shot.get(id)?.value).toBeCloseTo((plain.get(id)?.value ?? Number.NaN) + 150, 9);
    }
    expect(
      figuresOf(marlWith({ induction: "nitrous" }, { rpmAim: "6000" })).get("powerHigh")?.value,
    ).toBeNull();
  });

  describe("honed to measured pistons", () => {
    const skirts = Object.fromEntries(
      Array.from({ length: 8 }, (_, at) => [`skirt${at + 1}`, at === 4 ? "4.1225" : "4.1210"]),
    );
    const numbers = { ...skirts, pistonClearance: "0.0040", gasketBore: "4.1360" };

    test("the largest cylinder counts for wall, gasket and delivered bore", () => {
      const figures = figuresOf(marlWith({ boreFinish: "honedToMyPistons" }, numbers));
      expect(figures.get("deliveredBore")?.value).toBe(4.1265);
      expect(figures.get("cylinderFromBore")?.value).toBe(0.0015);
      expect(figures.get("wall")?.value).toBeCloseTo(0.21425, 9);
      expect(figures.get("gasketOverBore")?.value).toBe(0.0095);
    });

    test("while one skirt is unknown the chosen bore stands for the wall, and the delivered bore is undecided", () => {
      const { skirt3, ...rest } = { skirt3: "", ...numbers };
      expect(skirt3).toBeDefined();
      const figures = figuresOf(marlWith({ boreFinish: "honedToMyPistons" }, rest));
      expect(figures.get("wall")?.value).toBe(0.215);
      expect(figures.get("deliveredBore")?.value).toBeNull();
      expect(figures.has("cylinderFromBore")).toBe(false);
    });

    test("with another finish the skirts are kept and not read", () => {
      const figures = figuresOf(marlWith({ boreFinish: "finishHoned" }, numbers));
      expect(figures.get("deliveredBore")?.value).toBe(4.125);
      expect(figures.get("wall")?.value).toBe(0.215);
    });
  });

  test("bores that run into each other have a negative web, and every figure is a number or undecided", () => {
    const figures = figuresOf(marlWith({ bore: "b4640" }, { ...heads, rpmAim: "6000" }));
    expect(figures.get("web")?.value).toBe(-0.24);
    for (const { id, value } of figures.values())
      expect(value === null || Number.isFinite(value), id).toBe(true);
  });
});
