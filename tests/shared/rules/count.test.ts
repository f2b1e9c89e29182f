import { describe, expect, test } from "vitest";
import { emptyBuild } from "#shared/catalogue/build.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { count, openOptions } from "#shared/rules/open-options.ts";
import { demoContext } from "../demo/context.ts";
import { breaks, demoWith } from "../demo/solutions.ts";
import { validAssignments } from "./brute-force.ts";
import { drawFrom, randomCatalogue, randomFrom } from "./random-catalogue.ts";
import { implicationCatalogue } from "./random-implications.ts";

const { catalogue } = demoContext;

describe("300 random catalogues (seeds 1001 to 1300) against brute force", { timeout: 120_000 }, () => {
  test("counts of partial builds", () => {
    for (let seed = 1001; seed <= 1300; seed += 1) {
      const random = randomCatalogue(seed);
      const draw = drawFrom(randomFrom(seed));
      for (const numbers of [{}, { load: draw.whole(4).toString() }]) {
        const valid = validAssignments(random, numbers);
        expect(count(random, { ...emptyBuild, numbers }), `seed ${seed}`).toBe(BigInt(valid.length));
        const full = valid[draw.whole(Math.max(1, valid.length))];
        if (full === undefined) continue;
        const answers = Object.fromEntries(Object.entries(full).filter(() => draw.chance(0.4)));
        const extending = valid.filter((one) =>
          Object.entries(answers).every(([id, option]) => one[id] === option),
        );
        expect(count(random, { answers, numbers, mine: [] }), `seed ${seed} ${JSON.stringify(answers)}`).toBe(
          BigInt(extending.length),
        );
      }
    }
  });
});

describe("parts of the demo catalogue of up to 1,000,000 combinations against brute force", () => {
  /** Choices drawn until one more would make more than a million combinations in the families together. */
  function drawnPart(seed: number): Catalogue {
    const draw = drawFrom(randomFrom(seed));
    const left = catalogue.choices.map(({ id }) => id).filter((id) => id !== "family");
    const ids: string[] = [];
    let combinations = catalogue.families.length;
    while (left.length > 0) {
      const [id = ""] = left.splice(draw.whole(left.length), 1);
      const size = catalogue.choices.find((choice) => choice.id === id)?.options.length ?? 1;
      if (combinations * size > 1_000_000) continue;
      combinations *= size;
      ids.push(id);
    }
    return demoWith(...ids);
  }

  /** Every valid full assignment, by trying all: a rule is asked once its choices are all set. */
  function everyValid(part: Catalogue, typed: Record<string, string>): Int16Array[] {
    const { choices, families, familyChoice, stops } = compileCatalogue(part);
    const others = [...choices.keys()].filter((choice) => choice !== familyChoice);
    const valid: Int16Array[] = [];
    families.forEach((family, at) => {
      const full = new Int16Array(choices.length).fill(-1);
      full[familyChoice] = at;
      const asked = [-1, ...others].map((_, depth) =>
        stops.filter(
          ({ scope }) => Math.max(0, ...scope.map((choice) => others.indexOf(choice) + 1)) === depth,
        ),
      );
      const known = new Map<string, boolean>();
      const kept = (depth: number): boolean =>
        (asked[depth] ?? []).every(({ rule, scope }) => {
          const key = `${rule.id} ${scope.map((choice) => full[choice]).join(" ")}`;
          const found = known.get(key) ?? !breaks(part, rule, full, typed);
          known.set(key, found);
          return found;
        });
      const fill = (depth: number): void => {
        if (!kept(depth)) return;
        const choice = others[depth];
        if (choice === undefined) {
          valid.push(full.slice());
          return;
        }
        choices[choice]?.options.forEach((option, index) => {
          if (option.families?.includes(family.id) === false) return;
          full[choice] = index;
          fill(depth + 1);
        });
        full[choice] = -1;
      };
      fill(0);
    });
    return valid;
  }

  test.each(Array.from({ length: 12 }, (_, at) => [at + 1]))(
    "part of seed %i: count and open options",
    { timeout: 120_000 },
    (seed) => {
      const part = drawnPart(seed);
      const numbers: Record<string, string> = seed % 2 === 0 ? {} : { powerAim: "620", rpmAim: "6900" };
      const valid = everyValid(part, numbers);
      const context = { ...demoContext, catalogue: part };
      expect(count(context, { ...emptyBuild, numbers })).toBe(BigInt(valid.length));
      const draw = drawFrom(randomFrom(seed));
      for (const share of [0, 0.3, 0.6]) {
        const start = draw.one(valid);
        const given = part.choices.map((_, choice) => (draw.chance(share) ? (start[choice] ?? -1) : -1));
        const answers = Object.fromEntries(
          part.choices.flatMap(({ id, options }, choice) => {
            const option = options[given[choice] ?? -1];
            return option === undefined ? [] : [[id, option.id]];
          }),
        );
        const open = openOptions(context, { answers, numbers, mine: [] });
        part.choices.forEach(({ id, options }, choice) => {
          const seen = new Set<number>();
          for (const full of valid) {
            const extends_ = given.every((answer, at) => at === choice || answer < 0 || answer === full[at]);
            if (extends_) seen.add(full[choice] ?? -1);
          }
          expect(open.get(id), `${JSON.stringify(answers)} ${id}`).toEqual(
            options.filter((_, at) => seen.has(at)).map((option) => option.id),
          );
        });
      }
    },
  );
});

describe("counts on the demo catalogue", () => {
  test("the counts over any choice's options add up to the total", () => {
    const total = count(demoContext, emptyBuild);
    expect(total).toBeGreaterThan(10n ** 9n);
    for (const { id, options } of catalogue.choices) {
      const sum = options.reduce(
        (all, option) => all + count(demoContext, { ...emptyBuild, answers: { [id]: option.id } }),
        0n,
      );
      expect(sum, id).toBe(total);
    }
  });

  test("an option is open exactly when some build counts with it", () => {
    const answers = { family: "basalt", induction: "boosted", capStyle: "fourBoltSplayedBillet" };
    const build = { ...emptyBuild, answers };
    const open = openOptions(demoContext, build);
    for (const { id, options } of catalogue.choices) {
      // An answer that the family does not have counts as not given.
      for (const option of options.filter(({ families }) => families?.includes("basalt") ?? true)) {
        const then = count(demoContext, { ...build, answers: { ...answers, [id]: option.id } });
        expect(open.get(id)?.includes(option.id), `${id} ${option.id}`).toBe(then > 0n);
      }
    }
  });

  test("rules that join too many choices are told, not counted wrongly", () => {
    const wide = implicationCatalogue(1, { choices: 60, options: 12, rules: 200 });
    expect(() => count(wide, emptyBuild)).toThrow("too many choices");
  });
});
