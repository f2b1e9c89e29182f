import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { decodeSpec, encodeSpec, readSpecVersion } from "#shared/catalogue/spec-code.ts";
import { marl400 } from "../demo/context.ts";

const alphabet = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";

/** Answers of one family, each choice answered or not, with options that the family has. */
const answersOfAFamily = fc
  .constantFrom("marl", "basalt", "gneiss")
  .chain((family) =>
    fc.record(
      Object.fromEntries(
        demoCatalogue.choices.map((choice) => {
          const options = choice.options.filter(({ id, families }) => {
            return choice.id === "family" ? id === family : (families?.includes(family) ?? true);
          });
          return [choice.id, fc.constantFrom(...options.map(({ id }) => id))];
        }),
      ),
      { requiredKeys: [] },
    ),
  )
  .map((answers) => {
    const given = Object.entries(answers).flatMap(([choice, option]) =>
      option === undefined ? [] : [[choice, option] as const],
    );
    return Object.fromEntries(given);
  });

describe("spec codes", () => {
  test("answers come back as they were, unanswered ones too", () => {
    fc.assert(
      fc.property(answersOfAFamily, (answers) => {
        const decoded = decodeSpec(encodeSpec(demoCatalogue, answers), demoCatalogue);
        expect(decoded).toEqual({ ok: true, catalogue: demoCatalogue, answers });
      }),
    );
  });

  test("a code is groups of four of Crockford's alphabet and starts with its version", () => {
    const code = encodeSpec(demoCatalogue, marl400.answers);
    expect(code).toMatch(/^([0-9A-HJKMNP-TV-Z]{4}-)+[0-9A-HJKMNP-TV-Z]{4}$/);
    expect(readSpecVersion(code)).toEqual({ ok: true, version: demoCatalogue.version });
    const later = { ...demoCatalogue, version: 1023 };
    expect(readSpecVersion(encodeSpec(later, marl400.answers))).toEqual({ ok: true, version: 1023 });
  });

  test("lower case, look-alikes, blanks and hyphens are taken", () => {
    const code = encodeSpec(demoCatalogue, marl400.answers);
    const sloppy = ` ${code.toLowerCase().replaceAll("-", " ").replaceAll("0", "o").replaceAll("1", "l")} `;
    expect(decodeSpec(sloppy, demoCatalogue)).toEqual(decodeSpec(code, demoCatalogue));
    expect(decodeSpec(code.replaceAll("1", "I").replaceAll("-", ""), demoCatalogue)).toEqual(
      decodeSpec(code, demoCatalogue),
    );
  });

  test("every single wrong character names its group", () => {
    const code = encodeSpec(demoCatalogue, marl400.answers);
    for (const [at, right] of [...code].entries()) {
      if (right === "-") continue;
      for (const wrong of alphabet) {
        if (wrong === right) continue;
        const slip = code.slice(0, at) + wrong + code.slice(at + 1);
        expect(decodeSpec(slip, demoCatalogue)).toMatchObject({
          ok: false,
          problem: "group",
          group: Math.floor(at / 5) + 1,
        });
      }
    }
  });

  test("every swap of neighbours in a group and every swap of two groups is found in its group", () => {
    fc.assert(
      fc.property(answersOfAFamily, (answers) => {
        const groups = encodeSpec(demoCatalogue, answers).split("-");
        for (const [at, group] of groups.entries()) {
          for (let first = 0; first < 3; first += 1) {
            const [a = "", b = ""] = [group[first], group[first + 1]];
            if (a === b) continue;
            const swapped = groups.with(at, group.slice(0, first) + b + a + group.slice(first + 2)).join("-");
            expect(decodeSpec(swapped, demoCatalogue)).toMatchObject({ problem: "group", group: at + 1 });
          }
          for (let other = at + 1; other < groups.length; other += 1) {
            const swapped = groups
              .with(at, groups[other] ?? "")
              .with(other, group)
              .join("-");
            expect(decodeSpec(swapped, demoCatalogue)).toMatchObject({ problem: "group", group: at + 1 });
          }
        }
      }),
      { numRuns: 40 },
    );
  });

  test("each problem has its kind, its place and a sentence", () => {
    const code = encodeSpec(demoCatalogue, marl400.answers);
    expect(decodeSpec("04U7", demoCatalogue)).toMatchObject({ problem: "character", at: 3, character: "U" });
    expect(decodeSpec(code.slice(0, -1), demoCatalogue)).toMatchObject({ problem: "length" });
    expect(decodeSpec("", demoCatalogue)).toMatchObject({ problem: "length" });
    expect(decodeSpec(code.slice(0, -5), demoCatalogue)).toMatchObject({ problem: "length" });
    const other = { ...demoCatalogue, version: 7 };
    expect(decodeSpec(code, other)).toMatchObject({ problem: "version", version: 1 });
    expect(decodeSpec(code, () => undefined)).toMatchObject({ problem: "version", version: 1 });
    expect(decodeSpec(code, (version) => (version === 1 ? demoCatalogue : undefined))).toMatchObject({
      ok: true,
    });
    for (const slip of ["04U7", "", code.slice(0, -5)])
      expect(decodeSpec(slip, demoCatalogue)).toHaveProperty("sentence");
  });

  test("an option that the family does not have is an error, in and out", () => {
    const foreign = encodeSpec(demoCatalogue, { family: "marl", deckHeight: "d9800" });
    expect(decodeSpec(foreign, demoCatalogue)).toMatchObject({ ok: false, problem: "option" });
    expect(() => encodeSpec(demoCatalogue, { bore: "b3000" })).toThrow("no option b3000");
    expect(() => encodeSpec(demoCatalogue, { colour: "red" })).toThrow("no choice colour");
  });

  test("a state beyond the catalogue's last is an error", () => {
    const duty = demoCatalogue.choices.filter(({ id }) => id === "duty");
    const bores = demoCatalogue.choices.find(({ id }) => id === "bore")?.options ?? [];
    const small = { ...demoCatalogue, choices: duty };
    const wide = {
      ...demoCatalogue,
      choices: duty.map((choice) => ({ ...choice, options: bores.slice(0, 20) })),
    };
    expect(decodeSpec(encodeSpec(wide, { duty: "b4010" }), small)).toMatchObject({
      ok: true,
      answers: { duty: "drag" },
    });
    expect(decodeSpec(encodeSpec(wide, { duty: "b4095" }), small)).toMatchObject({
      ok: false,
      problem: "option",
    });
  });
});
