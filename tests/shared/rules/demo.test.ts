import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { emptyBuild, type Build } from "#shared/catalogue/build.ts";
import { admitNumber } from "#shared/rules/admit-number.ts";
import { checkOrderable } from "#shared/rules/check-orderable.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { explain } from "#shared/rules/explain.ts";
import { mend, repair } from "#shared/rules/mend.ts";
import { count, openFlags, openOptions } from "#shared/rules/open-options.ts";
import { buildOf, demoContext, marl400 } from "../demo/context.ts";
import { assignmentsOf, breaks, demoWith } from "../demo/solutions.ts";

const { catalogue } = demoContext;

/** A build made by taking open options one after the other; the numbers drawn say which. */
function walk(picks: readonly number[], numbers: Build["numbers"]): { build: Build; steps: number } {
  let build = { ...emptyBuild, numbers };
  let steps = 0;
  for (;;) {
    const { choices, unanswered } = evaluate(demoContext, build);
    const pick = picks[steps % picks.length] ?? 0;
    const choice = unanswered[pick % Math.max(unanswered.length, 1)];
    if (choice === undefined) return { build, steps };
    const open =
      choices.find((state) => state.choice === choice)?.options.filter((option) => option.open) ?? [];
    const option = open[(pick * 31 + steps) % Math.max(open.length, 1)]?.option;
    if (option === undefined) throw new Error(`a dead end at ${choice}: ${JSON.stringify(build)}`);
    build = { ...build, answers: { ...build.answers, [choice]: option } };
    steps += 1;
  }
}

const picks = fc.array(fc.nat(10_000), { minLength: 12, maxLength: 30 });
const numbers = fc.record(
  {
    powerAim: fc.integer({ min: 50, max: 2500 }).map(String),
    rpmAim: fc.integer({ min: 1000, max: 12000 }).map(String),
  },
  { requiredKeys: [] },
);
const known = (drawn: { powerAim?: string; rpmAim?: string }): Build["numbers"] =>
  Object.fromEntries(Object.entries(drawn));

describe("choosing on the demo catalogue", { timeout: 120_000 }, () => {
  test("any sequence of open choices ends in a build that may be ordered", () => {
    fc.assert(
      fc.property(picks, numbers, (drawn, typed) => {
        const { build, steps } = walk(drawn, known(typed));
        expect(steps).toBe(catalogue.choices.length);
        expect(checkOrderable(demoContext, build)).toMatchObject({
          ok: true,
          evaluation: { orderable: true, unanswered: [] },
        });
      }),
      { numRuns: 30 },
    );
  });

  test("the order of the answers does not matter, nor does asking twice", () => {
    fc.assert(
      fc.property(picks, fc.integer({ min: 1, max: 24 }), (drawn, given) => {
        const answers = Object.entries(walk(drawn, {}).build.answers).slice(0, given);
        const forward = evaluate(demoContext, buildOf(Object.fromEntries(answers)));
        const backward = evaluate(demoContext, buildOf(Object.fromEntries(answers.reverse())));
        expect(backward).toEqual(forward);
      }),
      { numRuns: 15 },
    );
  });

  test("undo brings back exactly what was", () => {
    fc.assert(
      fc.property(picks, fc.integer({ min: 1, max: 20 }), numbers, (drawn, back, typed) => {
        const answers = Object.entries(walk(drawn, known(typed)).build.answers);
        const builds = answers.map((_, length) =>
          buildOf(Object.fromEntries(answers.slice(0, length)), known(typed)),
        );
        const before = builds.map((build) => evaluate(demoContext, build));
        for (const at of [...builds.keys()].reverse().slice(0, back)) {
          expect(evaluate(demoContext, builds[at] ?? emptyBuild)).toEqual(before[at]);
        }
      }),
      { numRuns: 5 },
    );
  });

  test("no question changes the build: not its typed numbers, nor what is mine", () => {
    const build = buildOf({ ...marl400.answers, capStyle: "twoBolt" }, { powerAim: "640", rpmAim: "6900" }, [
      "bore",
    ]);
    const before = structuredClone(build);
    evaluate(demoContext, build);
    mend(demoContext, build, { choice: "capStyle", option: "fourBoltStraight" });
    explain(demoContext, build, { choice: "capStyle", option: "fourBoltStraight" });
    repair(demoContext, build);
    admitNumber(demoContext, build, "powerAim", "900");
    expect(build).toEqual(before);
  });

  test("a limit met exactly passes, and the next step of the grid does not", () => {
    const open = (answers: Build["answers"], choice: string, option: string, typed: Build["numbers"] = {}) =>
      openOptions(demoContext, buildOf(answers, typed)).get(choice)?.includes(option);
    // Marl: (4.615 - 4.155)/2 - 0.030 = 0.200 in of wall; boosted (4.615 - 4.055)/2 - 0.030 = 0.250 in.
    const marl = { family: "marl" };
    expect(open({ ...marl, induction: "naturallyAspirated" }, "bore", "b4155")).toBe(true);
    expect(open({ ...marl, induction: "boosted" }, "bore", "b4055")).toBe(true);
    expect(open({ ...marl, induction: "boosted" }, "bore", "b4060")).toBe(false);
    // Basalt: a web of 4.400 - 4.200 = 0.200 in.
    expect(open({ family: "basalt" }, "bore", "b4200")).toBe(true);
    expect(open(marl, "capStyle", "twoBolt", { powerAim: "450", rpmAim: "6000" })).toBe(true);
    expect(open(marl, "capStyle", "twoBolt", { powerAim: "451" })).toBe(false);
    expect(open(marl, "capStyle", "twoBolt", { rpmAim: "6001" })).toBe(false);
  });

  test("a build saved under an older catalogue is repaired: what is gone is dropped, what breaks a rule is changed", () => {
    const saved = buildOf({ ...marl400.answers, induction: "boosted", deckHeight: "d9000", colour: "red" });
    const offered = repair(demoContext, saved);
    expect(offered?.changes).toContainEqual({ choice: "deckHeight", from: "d9000", to: null });
    const changed = Object.fromEntries(offered?.changes.map(({ choice, to }) => [choice, to]) ?? []);
    const answers = Object.entries({ ...saved.answers, ...changed }).flatMap(([choice, option]) =>
      option === null || choice === "colour" ? [] : [[choice, option] as const],
    );
    expect(repair(demoContext, buildOf(Object.fromEntries(answers)))).toBeNull();
    expect(count(demoContext, buildOf(Object.fromEntries(answers)))).toBeGreaterThan(0n);
    expect(repair(demoContext, { ...saved, mine: ["deckHeight"] })).toBeNull();
    expect(repair(demoContext, marl400)).toBeNull();
  });

  test("a closed option's mend opens it, keeps what is mine and every number, and its price is what it says", () => {
    let mended = 0;
    fc.assert(
      fc.property(picks, fc.integer({ min: 3, max: 26 }), numbers, (drawn, given, typed) => {
        const answers = Object.fromEntries(
          Object.entries(walk(drawn, known(typed)).build.answers).slice(0, given),
        );
        const mine = Object.keys(answers).slice(0, 2);
        const build = buildOf(answers, known(typed), mine);
        const now = evaluate(demoContext, build);
        const closed = now.choices.flatMap(({ choice, options }) =>
          options.filter(({ open }) => !open).map(({ option }) => ({ choice, option })),
        );
        for (const wanted of closed.slice(0, 6)) {
          const reason = explain(demoContext, build, wanted);
          expect(reason.sentence).toMatch(/\.$/);
          const offered = mend(demoContext, build, wanted);
          if (offered === null) continue;
          mended += 1;
          expect(
            offered.changes.some(({ choice }) => mine.includes(choice) || choice === wanted.choice),
          ).toBe(false);
          const to = new Map(offered.changes.map((change) => [change.choice, change.to]));
          const after = Object.entries({ ...answers, [wanted.choice]: wanted.option }).flatMap(
            ([choice, option]) => {
              const moved = to.has(choice) ? to.get(choice) : option;
              return moved === null || moved === undefined ? [] : [[choice, moved] as const];
            },
          );
          const then = evaluate(demoContext, { ...build, answers: Object.fromEntries(after) });
          const state = then.choices.find(({ choice }) => choice === wanted.choice);
          expect(state?.options.find(({ option }) => option === wanted.option)).toMatchObject({
            open: true,
            chosen: true,
          });
          if (now.price !== null && then.price !== null) {
            expect(then.price.totalCents - now.price.totalCents).toBe(offered.priceCents);
          }
        }
      }),
      { numRuns: 15 },
    );
    expect(mended).toBeGreaterThan(10);
  });

  test("an option's effect is the difference that choosing it makes", () => {
    const now = evaluate(demoContext, marl400);
    for (const { choice, options } of now.choices) {
      for (const { option, effect } of options.filter(({ open }) => open)) {
        const then = evaluate(demoContext, { ...marl400, answers: { ...marl400.answers, [choice]: option } });
        expect((then.price?.totalCents ?? 0) - (now.price?.totalCents ?? 0)).toBe(effect.priceCents);
        expect((then.weight ?? 0) - (now.weight ?? 0)).toBeCloseTo(effect.weight ?? Number.NaN, 9);
        const days = (Date.parse(then.shipsOn ?? "") - Date.parse(now.shipsOn ?? "")) / 86_400_000;
        expect(days).toBe(effect.days);
      }
    }
  });

  test("the weight follows the bore as delivered, and the finish bore while the finish is open", () => {
    // 8 x pi/4 x (d^2 - 4^2) x (9.025 - 3.375) in of grey iron at 0.258 lb/cu in.
    const bored = (bore: number): number => 8 * (Math.PI / 4) * (bore ** 2 - 16) * 5.65 * 0.258;
    const weight = (answers: Build["answers"]) =>
      evaluate(demoContext, buildOf({ family: "marl", ...answers })).weight;
    expect(weight({})).toBe(185);
    expect(weight({ bore: "b4125" })).toBeCloseTo(185 - bored(4.125), 9);
    expect(weight({ bore: "b4125", boreFinish: "rough" })).toBeCloseTo(185 - bored(4.095), 9);
    expect(weight({ bore: "b4125", boreFinish: "finishHoned", capStyle: "fourBoltStraight" })).toBeCloseTo(
      189 - bored(4.125),
      9,
    );
  });

  test("without a family there is no price, weight or date, and no effect", () => {
    const { price, weight, shipsOn, leadDays, minutes, choices, orderable } = evaluate(
      demoContext,
      emptyBuild,
    );
    expect({ price, weight, shipsOn, leadDays, minutes, orderable }).toEqual({
      price: null,
      weight: null,
      shipsOn: null,
      leadDays: 0,
      minutes: {},
      orderable: false,
    });
    const effects = choices.flatMap(({ options }) => options.map(({ effect }) => effect));
    expect(
      effects.every((effect) => effect.priceCents === null && effect.weight === null && effect.days === null),
    ).toBe(true);
  });
});

describe("parts of the demo catalogue against every assignment of theirs", { timeout: 120_000 }, () => {
  test.each([
    [["rotatingAssembly", "strokeClearance", "deckHeight", "camTunnel"]],
    [["induction", "bore", "headThread", "capStyle"]],
    [["lifterStyle", "lifterBore", "camHeight", "fuelPumpPad", "camDrive", "oiling"]],
    [["duty", "corePlugs", "deckFinish", "deckGroove", "mainSize", "rearSeal"]],
  ])("%s", (ids) => {
    const part = demoWith(...ids);
    const compiled = compileCatalogue(part);
    const { families, choices, familyChoice, offsets, stops } = compiled;
    const typed = { powerAim: "550", rpmAim: "6400" };
    const scope = [...choices.keys()].filter((choice) => choice !== familyChoice);
    const valid: Int16Array[] = [];
    for (const family of families.keys()) {
      for (const full of assignmentsOf(part, family, scope)) {
        if (stops.every(({ rule }) => !breaks(part, rule, full, typed))) valid.push(full.slice());
      }
    }
    expect(valid.length).toBeGreaterThan(20);
    // Partial builds: nothing, then every third, second and nearly all answers of some valid build and its neighbours.
    const starts = [0, 0.21, 0.43, 0.67, 0.89].map((part) => valid[Math.floor(part * valid.length)]);
    for (const start of starts) {
      for (let mask = 0; mask < 2 ** choices.length; mask += 3) {
        const given = new Int16Array(choices.length).fill(-1);
        for (const choice of choices.keys())
          if (((mask >> choice) & 1) === 1) given[choice] = start?.[choice] ?? -1;
        const open = openFlags(compiled, given, typed);
        for (const choice of choices.keys()) {
          const expected = new Set(
            valid
              .filter((full) =>
                given.every((answer, at) => at === choice || answer === -1 || full[at] === answer),
              )
              .map((full) => full[choice]),
          );
          const size = choices[choice]?.options.length ?? 0;
          const found = Array.from({ length: size }, (_, at) => at).filter(
            (at) => open[(offsets[choice] ?? 0) + at] === 1,
          );
          expect(found).toEqual([...expected].sort((a, b) => (a ?? 0) - (b ?? 0)));
        }
      }
    }
  });
});

describe("typed numbers", () => {
  test("power and speed close caps that are too weak, and unknown they close nothing", () => {
    const caps = (typed: Build["numbers"]) =>
      evaluate(demoContext, buildOf({ family: "marl" }, typed))
        .choices.find(({ choice }) => choice === "capStyle")
        ?.options.filter(({ open }) => open)
        .map(({ option }) => option);
    expect(caps({})).toEqual(["twoBolt", "fourBoltStraight", "fourBoltSplayedDuctile"]);
    expect(caps({ powerAim: "450", rpmAim: "6000" })).toEqual([
      "twoBolt",
      "fourBoltStraight",
      "fourBoltSplayedDuctile",
    ]);
    expect(caps({ powerAim: "451" })).toEqual(["fourBoltStraight", "fourBoltSplayedDuctile"]);
    expect(caps({ rpmAim: "7001" })).toEqual(["fourBoltSplayedDuctile"]);
    const build = buildOf({ family: "marl" }, { powerAim: "500", rpmAim: "5500" });
    expect(explain(demoContext, build, { choice: "capStyle", option: "twoBolt" })).toEqual({
      sentence: "Two-bolt main caps are for up to 450 hp and 6,000 rpm. Set by Power aimed at: 500 hp.",
      answers: [],
      numbers: ["powerAim"],
      rules: ["two-bolt-load"],
    });
  });

  test("a number that leaves nothing is refused with its reason and mend, and the build stays", () => {
    const build = buildOf({ family: "marl", capStyle: "twoBolt" });
    expect(admitNumber(demoContext, build, "powerAim", "450")).toEqual({ ok: true });
    const refused = admitNumber(demoContext, build, "powerAim", "700");
    expect(refused).toMatchObject({
      ok: false,
      reason: { answers: [{ choice: "capStyle", option: "twoBolt" }], numbers: [], rules: ["two-bolt-load"] },
      mend: {
        changes: [{ choice: "capStyle", from: "twoBolt", to: "fourBoltSplayedDuctile" }],
        priceCents: 52_000,
      },
    });
    expect(build).toEqual(buildOf({ family: "marl", capStyle: "twoBolt" }));
    expect(admitNumber(demoContext, { ...build, mine: ["capStyle"] }, "powerAim", "700")).toMatchObject({
      mend: null,
    });
    expect(admitNumber(demoContext, build, "powerAim", null)).toEqual({ ok: true });
  });

  test("a number off its range or grid has its own sentence", () => {
    for (const [value, sentence] of [
      ["20", "Power aimed at lies between 50 and 2500 hp."],
      ["450.5", "Power aimed at is given in steps of 1 hp."],
      ["much", "Power aimed at: enter a plain number."],
    ] as const) {
      expect(admitNumber(demoContext, emptyBuild, "powerAim", value)).toMatchObject({
        ok: false,
        reason: { sentence },
        mend: null,
      });
    }
    expect(() => admitNumber(demoContext, emptyBuild, "shade", "1")).toThrow("no number shade");
  });
});

describe("findings and orderable builds", () => {
  test("what reads something unknown is a note to be confirmed and stops no order", () => {
    const unknown = { ...marl400, answers: { ...marl400.answers, rotatingAssembly: "notKnown" } };
    const checked = checkOrderable(demoContext, unknown);
    expect(checked.ok).toBe(true);
    const undecided = evaluate(demoContext, unknown).findings.filter((finding) => finding.undecided);
    expect(undecided.length).toBeGreaterThan(0);
    expect(
      undecided.every(
        ({ severity, sentence }) => severity === "note" && sentence.startsWith("To be confirmed: "),
      ),
    ).toBe(true);
    expect(evaluate(demoContext, unknown).figures.find(({ id }) => id === "displacement")?.value).toBeNull();
  });

  test("stops come first and carry the figures behind them and the step to change", () => {
    const thin = buildOf({
      ...marl400.answers,
      induction: "boosted",
      bore: "b4155",
      capStyle: "twoBolt",
      sonicReport: "noSonic",
    });
    const { findings, orderable } = evaluate(demoContext, thin);
    expect(orderable).toBe(false);
    expect(findings.slice(0, 3).map(({ rule, severity }) => [rule, severity])).toEqual([
      ["wall-boosted", "stop"],
      ["boost-needs-four-bolts", "stop"],
      ["wall-near-limit", "caution"],
    ]);
    expect(findings[0]).toMatchObject({ figures: ["wall"], step: "bore-and-deck" });
  });

  test("what is wrong with a build is told path by path", () => {
    const broken: Build = {
      answers: { ...marl400.answers, bore: "b4001", deckHeight: "d9800", colour: "red", capStyle: "twoBolt" },
      numbers: { powerAim: "900", rpmAim: "12.5", shade: "1" },
      mine: [],
    };
    delete broken.answers["iron"];
    const checked = checkOrderable(demoContext, broken);
    expect(checked.ok ? [] : checked.problems.map(({ path }) => path)).toEqual([
      "answers.deckHeight",
      "answers.bore",
      "answers.colour",
      "answers.iron",
      "numbers.rpmAim",
      "numbers.shade",
      "rules.two-bolt-load",
    ]);
  });

  test("unknown wishes are refused", () => {
    expect(() => explain(demoContext, emptyBuild, { choice: "colour", option: "red" })).toThrow(
      "no option colour red",
    );
    expect(() => explain(demoContext, emptyBuild, { choice: "bore", option: "b4125" })).toThrow("is open");
    expect(mend(demoContext, emptyBuild, { choice: "bore", option: "b4125" })).toBeNull();
  });
});
