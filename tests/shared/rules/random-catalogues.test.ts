import { describe, expect, test } from "vitest";
import type { Build } from "#shared/catalogue/build.ts";
import { admitNumber } from "#shared/rules/admit-number.ts";
import { checkOrderable } from "#shared/rules/check-orderable.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { explain } from "#shared/rules/explain.ts";
import { mend, repair } from "#shared/rules/mend.ts";
import { bruteMend, isOpen, validAssignments } from "./brute-force.ts";
import { drawFrom, randomCatalogue, randomFrom, type RandomCatalogue } from "./random-catalogue.ts";

const catalogues = 300;
const day = { load: { minutes: {} }, today: "2026-12-01" };
const contextOf = ({ catalogue, priceList }: RandomCatalogue) => ({ catalogue, priceList, ...day });

/** Partial builds of a catalogue: nothing, something, much; consistent or not; with and without the number. */
function someBuilds(random: RandomCatalogue, seed: number): Build[] {
  const draw = drawFrom(randomFrom(seed * 7919 + 1));
  return [0, 0.3, 0.6, 0.9].map((part) => {
    const family = random.catalogue.families[draw.whole(random.catalogue.families.length)]?.id ?? "";
    const withFamily = draw.chance(part);
    const answers: Record<string, string> = withFamily ? { family } : {};
    for (const choice of random.catalogue.choices) {
      if (choice.id === "family" || !draw.chance(part)) continue;
      const options = choice.options.filter(
        ({ families }) => !withFamily || (families?.includes(family) ?? true),
      );
      answers[choice.id] = draw.one(options).id;
    }
    const mine = Object.keys(answers).filter(() => draw.chance(0.2));
    return { answers, numbers: draw.chance(0.5) ? { load: draw.whole(4).toString() } : {}, mine };
  });
}

describe(
  `${catalogues} random catalogues with a planted build, against brute force`,
  { timeout: 120_000 },
  () => {
    const seeds = Array.from({ length: catalogues }, (_, at) => at + 1);

    test("open options are exactly those of some valid build", () => {
      let closed = 0;
      for (const seed of seeds) {
        const random = randomCatalogue(seed);
        for (const build of someBuilds(random, seed)) {
          const valid = validAssignments(random, build.numbers);
          for (const { choice, options } of evaluate(contextOf(random), build).choices) {
            for (const { option, open } of options) {
              const message = `seed ${seed}: ${JSON.stringify(build)} ${choice} ${option}`;
              expect(open, message).toBe(isOpen(valid, build.answers, choice, option));
              if (!open) closed += 1;
            }
          }
        }
      }
      expect(closed).toBeGreaterThan(500);
    });

    test("a reason closes the option, and without any one part of it nothing does", () => {
      let reasons = 0;
      for (const seed of seeds) {
        const random = randomCatalogue(seed);
        for (const build of someBuilds(random, seed)) {
          for (const { choice, options } of evaluate(contextOf(random), build).choices) {
            for (const { option } of options.filter(({ open }) => !open)) {
              const reason = explain(contextOf(random), build, { choice, option });
              const message = `seed ${seed}: ${JSON.stringify(build)} ${choice} ${option} ${JSON.stringify(reason)}`;
              const closes = (
                answers: typeof reason.answers,
                rules: string[],
                numbers: string[],
              ): boolean => {
                const read = Object.fromEntries(
                  Object.entries(build.numbers).filter(([id]) => numbers.includes(id)),
                );
                const given = Object.fromEntries(answers.map((answer) => [answer.choice, answer.option]));
                return !isOpen(validAssignments(random, read, rules), given, choice, option);
              };
              const { answers, rules, numbers } = reason;
              expect(
                answers.every((answer) => build.answers[answer.choice] === answer.option),
                message,
              ).toBe(true);
              expect(closes(answers, rules, numbers), message).toBe(true);
              for (const part of answers) {
                expect(
                  closes(
                    answers.filter((answer) => answer !== part),
                    rules,
                    numbers,
                  ),
                  message,
                ).toBe(false);
              }
              for (const part of rules)
                expect(
                  closes(
                    answers,
                    rules.filter((rule) => rule !== part),
                    numbers,
                  ),
                  message,
                ).toBe(false);
              for (const part of numbers)
                expect(
                  closes(
                    answers,
                    rules,
                    numbers.filter((id) => id !== part),
                  ),
                  message,
                ).toBe(false);
              expect(reason.sentence).not.toBe("");
              reasons += 1;
            }
          }
        }
      }
      expect(reasons).toBeGreaterThan(500);
    });

    test("a mend is the cheapest there is, by number of changes, price, days and catalogue order", () => {
      let mends = 0;
      let none = 0;
      for (const seed of seeds) {
        const random = randomCatalogue(seed);
        for (const build of someBuilds(random, seed)) {
          const valid = validAssignments(random, build.numbers);
          for (const { choice, options } of evaluate(contextOf(random), build).choices) {
            for (const { option } of options.filter(({ open }) => !open)) {
              const found = mend(contextOf(random), build, { choice, option });
              const message = `seed ${seed}: ${JSON.stringify(build)} ${choice} ${option}`;
              expect(found, message).toEqual(bruteMend(random, valid, build, { choice, option }));
              if (found === null) none += 1;
              else mends += 1;
            }
          }
        }
      }
      expect(mends).toBeGreaterThan(300);
      expect(none).toBeGreaterThan(50);
    });

    test("a broken build is repaired by the cheapest mend of the whole, and a sound one is left alone", () => {
      let repaired = 0;
      for (const seed of seeds) {
        const random = randomCatalogue(seed);
        for (const build of someBuilds(random, seed)) {
          const valid = validAssignments(random, build.numbers);
          const best = bruteMend(random, valid, build, null);
          const expected = best?.changes.length === 0 ? null : best;
          expect(repair(contextOf(random), build), `seed ${seed}: ${JSON.stringify(build)}`).toEqual(
            expected,
          );
          if (expected !== null) repaired += 1;
        }
      }
      expect(repaired).toBeGreaterThan(200);
    });

    test("a number is taken exactly when some valid build still extends the answers", () => {
      let refused = 0;
      for (const seed of seeds) {
        const random = randomCatalogue(seed);
        for (const build of someBuilds(random, seed)) {
          for (const value of ["0", "1", "2", "3", null]) {
            const numbers: Record<string, string> = value === null ? {} : { load: value };
            const extends_ = validAssignments(random, numbers).some((full) =>
              Object.entries(build.answers).every(([choice, option]) => full[choice] === option),
            );
            const admitted = admitNumber(contextOf(random), build, "load", value);
            expect(admitted.ok, `seed ${seed}: ${JSON.stringify(build)} load ${value ?? "unknown"}`).toBe(
              extends_,
            );
            if (admitted.ok) continue;
            refused += 1;
            const { mend: offered } = admitted;
            if (offered === null) continue;
            const changed = Object.fromEntries(
              Object.entries(build.answers).flatMap(([choice, option]) => {
                const change = offered.changes.find((candidate) => candidate.choice === choice);
                const to = change === undefined ? option : change.to;
                return to === null ? [] : [[choice, to]];
              }),
            );
            expect(admitNumber(contextOf(random), { ...build, answers: changed }, "load", value)).toEqual({
              ok: true,
            });
          }
        }
      }
      expect(refused).toBeGreaterThan(100);
    });

    test("complete builds may be ordered exactly when they are valid", () => {
      for (const seed of seeds.slice(0, 60)) {
        const random = randomCatalogue(seed);
        const valid = new Set(validAssignments(random, {}).map((full) => JSON.stringify(full)));
        for (const full of validAssignments(random, {}, [])) {
          const checked = checkOrderable(contextOf(random), { answers: full, numbers: {}, mine: [] });
          expect(checked.ok, `seed ${seed}: ${JSON.stringify(full)}`).toBe(valid.has(JSON.stringify(full)));
        }
      }
    });
  },
);
