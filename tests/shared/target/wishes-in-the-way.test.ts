import { describe, expect, test } from "vitest";
import { findBuilds } from "#shared/target/find-builds.ts";
import type { Target } from "#shared/target/target.ts";
import { wishesInTheWay } from "#shared/target/wishes-in-the-way.ts";
import { demoContext } from "../demo/context.ts";

const street: Target = { duty: "street", induction: "naturallyAspirated" };

function wishes(target: Target): string[] {
  expect(findBuilds(demoContext, target)).toEqual([]);
  return wishesInTheWay(demoContext, target).map(({ wish }) => wish);
}

describe("when nothing fits", { timeout: 120_000 }, () => {
  test("a budget that is too small is named, with what such builds start at", () => {
    const target: Target = { ...street, budgetCents: 100_000 };
    const [cheapest] = findBuilds(demoContext, street);
    expect(wishes(target)).toEqual(["budgetCents"]);
    const dollars = `$${((cheapest?.priceCents ?? 0) / 100).toLocaleString("en-US", { minimumFractionDigits: 2 })}`;
    expect(wishesInTheWay(demoContext, target)[0]?.sentence).toContain(dollars);
  });

  test("a date that is too early is named, with the soonest", () => {
    const target: Target = { ...street, shipBy: "2026-12-02" };
    const soonest = findBuilds(demoContext, street)
      .map(({ shipsOn }) => shipsOn)
      .sort()[0];
    expect(wishes(target)).toEqual(["shipBy"]);
    expect(wishesInTheWay(demoContext, target)[0]?.sentence).toContain(soonest);
  });

  test("a displacement that no block has is named, with the nearest", () => {
    expect(wishes({ ...street, displacement: { least: 900 } })).toEqual(["displacement"]);
  });

  test("what is there already is named, each by itself", () => {
    const target: Target = {
      ...street,
      have: { answers: { family: "marl", mainSize: "m2650" }, numbers: {} },
    };
    expect(wishes(target)).toEqual(["have.answers.family", "have.answers.mainSize"]);
  });

  test("a size that no assembly has is named", () => {
    const target: Target = {
      ...street,
      displacement: { least: 500 },
      have: { answers: {}, numbers: { stroke: "3.7500" } },
    };
    expect(wishes(target)).toEqual(["displacement", "have.numbers.stroke"]);
  });

  test("nothing is named where two wishes must give way", () => {
    expect(wishes({ ...street, budgetCents: 100_000, shipBy: "2026-12-02" })).toEqual([]);
  });
});
