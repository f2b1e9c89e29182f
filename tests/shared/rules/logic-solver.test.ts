import Logic from "logic-solver";
import { describe, expect, test } from "vitest";
import { emptyBuild, type Build } from "#shared/catalogue/build.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { explain } from "#shared/rules/explain.ts";
import { mend } from "#shared/rules/mend.ts";
import { openOptions } from "#shared/rules/open-options.ts";
import { demoContext } from "../demo/context.ts";
import { drawFrom, randomFrom } from "./random-catalogue.ts";
import { implicationCatalogue, type ImplicationCatalogue } from "./random-implications.ts";
import {
  answersOf,
  catalogueSolver,
  cheapestMendFor,
  chosen,
  held,
  implicationSolver,
  isOpenFor,
  wholeSolver,
} from "./sat-reference.ts";

const contextOf = ({ catalogue, priceList }: ImplicationCatalogue) => ({
  catalogue,
  priceList,
  load: { minutes: {} },
  today: "2026-12-01",
});

/** 300 small and middling catalogues, and some of full size. */
const sizes = Array.from({ length: 304 }, (_, at) => {
  const seed = at + 1;
  if (at >= 300) return { seed, choices: 60, options: 12, rules: 200 };
  return { seed, choices: 4 + (at % 9), options: 3 + (at % 4), rules: 4 + ((at * 7) % 23) };
});

/** A build with some answers, that often cannot stand together. */
function someBuild({ catalogue }: ImplicationCatalogue, seed: number): Build {
  const draw = drawFrom(randomFrom(seed * 104_729));
  const part = [0.2, 0.5, 0.8][seed % 3] ?? 0.5;
  const answers = catalogue.choices.flatMap(({ id, options }): [string, string][] =>
    id === "family" || draw.chance(part) ? [[id, draw.one(options).id]] : [],
  );
  const mine = answers.filter(() => draw.chance(0.15)).map(([id]) => id);
  return { answers: Object.fromEntries(answers), numbers: {}, mine };
}

/** A build of open options, as chosen one after the other. */
function walkedBuild(random: ImplicationCatalogue, seed: number): Build {
  const draw = drawFrom(randomFrom(seed * 15_485_863));
  const answers: Build["answers"] = { family: "only" };
  for (const { id } of random.catalogue.choices.slice(1).filter(() => draw.chance(0.5))) {
    const open = openOptions(random, { answers, numbers: {}, mine: [] }).get(id) ?? [];
    answers[id] = draw.one(open);
  }
  return { answers, numbers: {}, mine: Object.keys(answers).filter(() => draw.chance(0.15)) };
}

/** Options of a choice that are not open. */
function closedOptions(random: ImplicationCatalogue, build: Build): { choice: string; option: string }[] {
  const open = openOptions(random, build);
  return random.catalogue.choices
    .slice(1)
    .flatMap(({ id, options }) =>
      options
        .filter((option) => open.get(id)?.includes(option.id) !== true)
        .map((option) => ({ choice: id, option: option.id })),
    );
}

describe("304 random catalogues (seeds 1 to 304) against logic-solver", { timeout: 300_000 }, () => {
  test("open options", () => {
    let closed = 0;
    for (const { seed, ...size } of sizes) {
      const random = implicationCatalogue(seed, size);
      const solver = wholeSolver(random);
      for (const build of [someBuild(random, seed), walkedBuild(random, seed)]) {
        const open = openOptions(random, build);
        for (const { id, options } of random.catalogue.choices) {
          const expected = options.filter((option) => isOpenFor(solver, build, id, option.id));
          expect(open.get(id), `seed ${seed}: ${JSON.stringify(build)} ${id}`).toEqual(
            expected.map((option) => option.id),
          );
          closed += options.length - expected.length;
        }
      }
    }
    expect(closed).toBeGreaterThan(3000);
  });

  test("reasons: together they close the option, and without any one part they do not", () => {
    let reasons = 0;
    for (const { seed, ...size } of sizes) {
      const random = implicationCatalogue(seed, size);
      const build = walkedBuild(random, seed);
      const solver = implicationSolver(random);
      for (const wanted of closedOptions(random, build).slice(0, 3)) {
        const { answers, rules } = explain(contextOf(random), build, wanted);
        const closes = (without: string): boolean => {
          const given = answers.filter(({ choice }) => choice !== without);
          const terms = [
            chosen(wanted.choice, wanted.option),
            ...rules.filter((rule) => rule !== without).map(held),
            ...given.map(({ choice, option }) => chosen(choice, option)),
          ];
          return solver.solveAssuming(Logic.and(terms)) === null;
        };
        const message = `seed ${seed}: ${JSON.stringify(build)} ${JSON.stringify(wanted)}`;
        expect(
          answers.every(({ choice, option }) => build.answers[choice] === option),
          message,
        ).toBe(true);
        expect(closes(""), message).toBe(true);
        for (const part of [...rules, ...answers.map(({ choice }) => choice)]) {
          expect(closes(part), `${message} without ${part}`).toBe(false);
        }
        reasons += 1;
      }
    }
    expect(reasons).toBeGreaterThan(300);
  });

  test("mends: no fewer changes and no lower price than the solver's optimum, and valid", () => {
    let mends = 0;
    let none = 0;
    for (const { seed, ...size } of sizes.slice(0, 300)) {
      const random = implicationCatalogue(seed, size);
      for (const build of [someBuild(random, seed), walkedBuild(random, seed)]) {
        for (const wanted of closedOptions(random, build).slice(0, 2)) {
          const message = `seed ${seed}: ${JSON.stringify(build)} ${JSON.stringify(wanted)}`;
          const found = mend(contextOf(random), build, wanted);
          const best = cheapestMendFor(wholeSolver(random), random, build, wanted);
          if (found === null || best === null) {
            expect(found, message).toBe(best);
            none += 1;
            continue;
          }
          const changes = new Map(found.changes.map(({ choice, to }) => [choice, to ?? ""]));
          const after = { ...build.answers, [wanted.choice]: wanted.option, ...Object.fromEntries(changes) };
          expect(found.changes.length, message).toBe(best.changes);
          expect(
            wholeSolver(random).solveAssuming(Logic.and(answersOf({ ...build, answers: after }))),
            message,
          ).not.toBeNull();
          const amount = Object.entries(after)
            .filter(([choice]) => choice !== wanted.choice && build.answers[choice] !== undefined)
            .reduce(
              (sum, [choice, option]) => sum + Number(random.priceList.options[choice]?.[option] ?? 0),
              0,
            );
          expect(amount, message).toBe(best.amount);
          expect(
            found.changes.filter(({ choice }) => build.mine.includes(choice)),
            message,
          ).toEqual([]);
          mends += 1;
        }
      }
    }
    expect(mends).toBeGreaterThan(200);
    expect(none).toBeGreaterThan(20);
  });
});

describe("the demo catalogue against logic-solver", { timeout: 300_000 }, () => {
  test.each<[string, Build["numbers"]]>([
    ["no number", {}],
    ["power and speed", { powerAim: "640", rpmAim: "7200" }],
  ])("open options with %s typed", (_, numbers) => {
    const { catalogue } = demoContext;
    const solver = catalogueSolver(catalogue, numbers);
    for (let seed = 1; seed <= 8; seed += 1) {
      const draw = drawFrom(randomFrom(seed));
      let build: Build = { ...emptyBuild, numbers };
      for (let step = 0; step < 3; step += 1) {
        const open = openOptions(demoContext, build);
        for (const { id, options } of catalogue.choices) {
          const expected = options.filter((option) => isOpenFor(solver, build, id, option.id));
          expect(open.get(id), `seed ${seed}: ${JSON.stringify(build)} ${id}`).toEqual(
            expected.map((option) => option.id),
          );
        }
        for (let more = 0; more < 6; more += 1) {
          const { choices, unanswered } = evaluate(demoContext, build);
          const choice = draw.one(unanswered);
          const states = choices.find((state) => state.choice === choice)?.options ?? [];
          // Mostly open options, now and then one that breaks the build.
          const offered = states.filter(({ open }) => open);
          const { option } = draw.one(offered.length === 0 || draw.chance(0.05) ? states : offered);
          build = { ...build, answers: { ...build.answers, [choice]: option } };
        }
      }
    }
  });
});
