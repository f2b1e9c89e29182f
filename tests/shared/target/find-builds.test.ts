import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { checkOrderable } from "#shared/rules/check-orderable.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";
import { totalsOf } from "#shared/rules/totals.ts";
import { findCandidates } from "#shared/target/candidates.ts";
import { findBuilds, type RankedBuild } from "#shared/target/find-builds.ts";
import type { Target } from "#shared/target/target.ts";
import { demoContext } from "../demo/context.ts";
import { assignmentsOf, breaks, demoWith } from "../demo/solutions.ts";

const street: Target = { duty: "street", induction: "naturallyAspirated" };

const valueOf = (one: RankedBuild, choice: string, name: string): number | undefined =>
  demoContext.catalogue.choices
    .find(({ id }) => id === choice)
    ?.options.find(({ id }) => id === one.build.answers[choice])?.values[name];

const kindOf = (one: RankedBuild): string =>
  [
    one.build.answers["family"],
    one.build.answers["bore"],
    valueOf(one, "rotatingAssembly", "stroke"),
    one.build.answers["capStyle"],
  ].join(" ");

const duties = ["street", "circleTrack", "drag", "marine", "offRoad"];
const wishes = fc.record(
  {
    duty: fc.constantFrom(...duties),
    induction: fc.constantFrom("naturallyAspirated", "boosted", "nitrous"),
    displacement: fc
      .tuple(fc.integer({ min: 330, max: 600 }), fc.integer({ min: 5, max: 150 }))
      .map(([least, width]) => ({ least, most: least + width })),
    power: fc.integer({ min: 200, max: 1500 }),
    rpm: fc.integer({ min: 4500, max: 9000 }),
    budgetCents: fc.integer({ min: 350_000, max: 1_200_000 }),
    shipBy: fc
      .integer({ min: 10, max: 59 })
      .map((day) => new Date(Date.UTC(2026, 11, day)).toISOString().slice(0, 10)),
  },
  { requiredKeys: ["duty", "induction"] },
);

describe("builds for a target on the demo catalogue", { timeout: 120_000 }, () => {
  test("may be ordered, keep to every wish, are ranked and not alike, whatever is asked", () => {
    let answered = 0;
    fc.assert(
      fc.property(wishes, (target) => {
        const builds = findBuilds(demoContext, target);
        answered += builds.length;
        expect(builds.length).toBeLessThanOrEqual(8);
        expect(new Set(builds.map(kindOf)).size).toBe(builds.length);
        expect(builds.map(({ priceCents }) => priceCents)).toEqual(
          builds.map(({ priceCents }) => priceCents).sort((a, b) => a - b),
        );
        for (const one of builds) {
          const checked = checkOrderable(demoContext, one.build);
          if (!checked.ok) throw new Error(JSON.stringify(checked.problems));
          const { price, shipsOn, weight, figures, findings } = checked.evaluation;
          const figure = (id: string): number | null | undefined =>
            figures.find((known) => known.id === id)?.value;
          expect(one).toMatchObject({ priceCents: price?.totalCents, shipsOn, weight });
          expect(one.displacement).toBe(figure("displacement"));
          expect(one.wall).toBe(figure("wall"));
          expect(one.fit.cautions).toBe(findings.filter(({ severity }) => severity === "caution").length);
          expect(one.build.answers).toMatchObject({ duty: target.duty, induction: target.induction });
          expect(one.displacement).toBeGreaterThanOrEqual(target.displacement?.least ?? 0);
          expect(one.displacement).toBeLessThanOrEqual(target.displacement?.most ?? 1000);
          expect(one.priceCents).toBeLessThanOrEqual(target.budgetCents ?? Infinity);
          expect(one.shipsOn <= (target.shipBy ?? "9999-12-31")).toBe(true);
        }
        // None is beaten by another: whole per cent off the middle and cautions make the misfit.
        const { least = 0, most = 0 } = target.displacement ?? {};
        const misfit = ({ fit }: RankedBuild): number =>
          fit.cautions + (most === 0 ? 0 : Math.floor((200 * (fit.offMiddle ?? 0)) / (least + most)));
        const reached = builds.filter(({ power }) => power?.reached !== false);
        for (const one of reached) {
          const better = reached.filter(
            (other) =>
              other.priceCents < one.priceCents &&
              other.shipDay <= one.shipDay &&
              misfit(other) <= misfit(one),
          );
          expect(better).toEqual([]);
        }
        // The cheapest and the soonest of all that can be are there, if the power aimed at leaves none out.
        const { found } = findCandidates(demoContext, target);
        if (target.power !== undefined) return;
        expect(builds[0]?.priceCents).toBe(
          found.length === 0 ? undefined : Math.min(...found.map(({ priceCents }) => priceCents)),
        );
        expect(builds.map(({ shipsOn }) => shipsOn).sort()[0]).toBe(
          found.map(({ ships }) => ships.date).sort()[0],
        );
      }),
      { numRuns: 40 },
    );
    expect(answered).toBeGreaterThan(30);
  });

  test("are the same each time", () => {
    const target: Target = { ...street, displacement: { least: 395, most: 420 }, power: 450 };
    expect(findBuilds(demoContext, target)).toEqual(findBuilds(demoContext, structuredClone(target)));
  });

  test("carry the load aimed at, so that its rules judge them", () => {
    const builds = findBuilds(demoContext, { duty: "drag", induction: "boosted", power: 1100, rpm: 7500 });
    expect(builds.length).toBeGreaterThan(0);
    for (const { build, power } of builds) {
      expect(build.numbers).toEqual({ powerAim: "1100", rpmAim: "7500" });
      expect(build.answers["capStyle"]).toBe("fourBoltSplayedBillet");
      expect(power).toMatchObject({ reached: true });
    }
  });

  test("come nearest to a power that none reaches, and say so", () => {
    const builds = findBuilds(demoContext, { ...street, power: 1400 });
    expect(builds.length).toBeGreaterThan(0);
    expect(builds.every(({ power }) => power?.reached === false)).toBe(true);
  });

  test("keep what is there: answers, and a crank's stroke", () => {
    const builds = findBuilds(demoContext, {
      ...street,
      have: {
        answers: { mainSize: "m2650", headThread: "t12" },
        numbers: { stroke: "3.8750", chamber: "64.0" },
      },
    });
    expect(builds.length).toBeGreaterThan(0);
    for (const one of builds) {
      expect(one.build.answers).toMatchObject({ family: "basalt", mainSize: "m2650", headThread: "t12" });
      expect(one.build.mine).toEqual(["mainSize", "headThread"]);
      expect(one.build.numbers).toEqual({ stroke: "3.8750", chamber: "64.0" });
      expect(valueOf(one, "rotatingAssembly", "stroke") ?? 3.875).toBe(3.875);
    }
  });

  test("of an assembly that is not known yet have no displacement", () => {
    const builds = findBuilds(demoContext, {
      ...street,
      have: { answers: { rotatingAssembly: "notKnown" }, numbers: {} },
    });
    expect(builds.length).toBeGreaterThan(0);
    expect(builds.every(({ displacement, power }) => displacement === null && power === null)).toBe(true);
  });

  test("say what each gives up against the best", () => {
    const builds = findBuilds(demoContext, { ...street, displacement: { least: 400, most: 410 } });
    const said = builds.flatMap(({ tradeOffs }) => tradeOffs);
    const thickest = Math.max(...builds.map(({ wall }) => wall ?? 0));
    for (const { wall, tradeOffs } of builds) {
      expect(tradeOffs.includes("thickest wall")).toBe(wall === thickest);
      if (wall !== thickest)
        expect(tradeOffs).toContain(`wall ${(thickest - (wall ?? 0)).toFixed(4)} in thinner`);
    }
    expect(said).toContain("lightest");
  });

  test("come within a second, a new load included", () => {
    findBuilds(demoContext, street);
    // The best of three, each a load not asked about before: other work on the machine is not what is measured.
    const times = [437, 441, 447].map((power) => {
      const from = performance.now();
      findBuilds(demoContext, { ...street, power, rpm: 6100, displacement: { least: 380, most: 430 } });
      return performance.now() - from;
    });
    expect(Math.min(...times)).toBeLessThan(1000);
  });

  test("are refused for what the catalogue does not have", () => {
    expect(() => findBuilds(demoContext, { duty: "hovering", induction: "boosted" })).toThrow(RangeError);
    expect(() =>
      findBuilds(demoContext, { ...street, have: { answers: {}, numbers: { stroke: "99" } } }),
    ).toThrow(RangeError);
  });
});

/** Choices whose every assignment can be tried; the first two make the target. */
const small = demoWith(
  "duty",
  "induction",
  "bore",
  "deckHeight",
  "rotatingAssembly",
  "strokeClearance",
  "capStyle",
  "corePlugs",
  "boreFinish",
);
const smallContext: EvaluationContext = { ...demoContext, catalogue: small };

describe("against every assignment of a part of the demo", { timeout: 300_000 }, () => {
  test.each<Target>([
    { duty: "marine", induction: "naturallyAspirated", displacement: { least: 425, most: 428 } },
    { duty: "drag", induction: "boosted", displacement: { least: 400, most: 402 }, power: 700 },
    { duty: "street", induction: "boosted", displacement: { least: 411, most: 413 }, shipBy: "2026-12-28" },
    {
      duty: "drag",
      induction: "naturallyAspirated",
      displacement: { least: 565, most: 568 },
      budgetCents: 600_000,
    },
  ])("the least price and the soonest date are found: %j", (target) => {
    const compiled = compileCatalogue(small);
    const numbers: Record<string, string> =
      target.power === undefined ? {} : { powerAim: String(target.power) };
    const fixed = compiled.known({ duty: target.duty, induction: target.induction });
    const scope = [...compiled.choices.keys()].filter(
      (choice) => choice !== compiled.familyChoice && fixed[choice] === -1,
    );
    const stops = compiled.stops.map(({ rule }) => rule);
    let price = Infinity;
    let date = "9999-12-31";
    for (const family of compiled.families.keys()) {
      for (const tried of assignmentsOf(small, family, scope)) {
        const assignment = tried.map((option, choice) => (option < 0 ? (fixed[choice] ?? -1) : option));
        const reading = compiled.reading(family, (choice) => assignment[choice] ?? -1, numbers);
        const displacement = reading.figure("displacement");
        const { least = 0, most = Infinity } = target.displacement ?? {};
        if (displacement === null || displacement < least || displacement > most) continue;
        const totals = totalsOf(smallContext, compiled, assignment, numbers);
        if (totals === null || totals.priceCents > (target.budgetCents ?? Infinity)) continue;
        if (totals.ships.date > (target.shipBy ?? "9999-12-31")) continue;
        if (totals.priceCents >= price && totals.ships.date >= date) continue;
        if (stops.some((rule) => breaks(small, rule, assignment, numbers))) continue;
        price = Math.min(price, totals.priceCents);
        if (totals.ships.date < date) date = totals.ships.date;
      }
    }
    const builds = findBuilds(smallContext, target);
    expect(Number.isFinite(price)).toBe(true);
    expect(Math.min(...builds.map(({ priceCents }) => priceCents))).toBe(price);
    expect(builds.map(({ shipsOn }) => shipsOn).sort()[0]).toBe(date);
  });
});
