import { encodeSpec, decodeSpec } from "#shared/catalogue/spec-code.ts";
import type { Build } from "#shared/catalogue/build.ts";
import { checkOrderable } from "#shared/rules/check-orderable.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { findingsOf } from "#shared/rules/findings.ts";
import { openOptions, treeOf } from "#shared/rules/open-options.ts";
import { findBuilds } from "#shared/target/find-builds.ts";
import { demoContext } from "#tests/shared/demo/context.ts";
import { implicationCatalogue } from "#tests/shared/rules/random-implications.ts";
import { catalogueSolver, isOpenFor } from "#tests/shared/rules/sat-reference.ts";
import { clickSequence } from "./support/demo-builds.ts";
import { factsOf, outsideEngine } from "./support/outside-rules.ts";
import { median, quantile, report, timed, type Measured } from "./support/report.ts";

const { catalogue } = demoContext;
const sequences = 500;
const rounds = 7;

/** Compiled anew each time, with the tables of every family, the first time with cold code. */
function compiling(): Measured[] {
  const before = process.memoryUsage().heapUsed;
  const samples = Array.from({ length: rounds }, () => {
    const copy = structuredClone(catalogue);
    return timed(() => {
      const compiled = compileCatalogue(copy);
      for (const family of compiled.families.keys()) treeOf(compiled, compiled.problem(family, {}));
    });
  });
  const megabytes = (process.memoryUsage().heapUsed - before) / 2 ** 20 / rounds;
  return [
    { name: "compile", value: median(samples), unit: "ms", aim: "< 300", samples },
    { name: "compile_first", value: samples[0] ?? Number.NaN, unit: "ms", samples: samples.slice(0, 1) },
    { name: "compiled_memory", value: Math.max(0, megabytes), unit: "MB", samples: [megabytes] },
  ];
}

/** Findings and whole evaluations beside the outside rule engine, turn by turn. */
async function againstRules(complete: readonly Build[]): Promise<Measured[]> {
  const { engine, rules } = outsideEngine(catalogue, 45);
  const compiled = compileCatalogue(catalogue);
  const facts = complete.map((build) => factsOf(catalogue, rules, build));
  const findings: number[] = [];
  const evaluations: number[] = [];
  const outside: number[] = [];
  for (let round = 0; round < rounds; round += 1) {
    const some = complete.filter((_, at) => at % rounds === round);
    const theirs = facts.filter((_, at) => at % rounds === round);
    const start = performance.now();
    for (const one of theirs) await engine.run(one);
    const outsideEach = (performance.now() - start) / theirs.length;
    const repeats = 20;
    const findingsEach =
      timed(() => {
        for (let again = 0; again < repeats; again += 1) {
          for (const build of some) findingsOf(compiled, compiled.assignment(build.answers), build.numbers);
        }
      }) /
      some.length /
      repeats;
    const evaluationEach = timed(() => some.forEach((build) => evaluate(demoContext, build))) / some.length;
    outside.push(outsideEach);
    findings.push(outsideEach / findingsEach);
    evaluations.push(outsideEach / evaluationEach);
  }
  return [
    {
      name: "findings_vs_json_rules_engine",
      value: median(findings),
      unit: "times",
      aim: ">= 20",
      samples: findings,
    },
    {
      name: "evaluation_vs_json_rules_engine",
      value: median(evaluations),
      unit: "times",
      aim: ">= 1",
      samples: evaluations,
    },
    { name: "json_rules_engine_run", value: median(outside), unit: "ms", samples: outside },
  ];
}

/** Every build of the click sequences, each evaluated as it would be after the click. */
function clicking(clicks: readonly Build[]): Measured {
  const samples = clicks.map((build) => timed(() => evaluate(demoContext, build)));
  return { name: "evaluation_p95", value: quantile(samples, 0.95), unit: "ms", aim: "< 4", samples };
}

/** Open options of partial builds, ours beside the solver asked for every option. */
function againstSolver(partial: readonly Build[]): Measured[] {
  const solver = catalogueSolver(catalogue, {});
  const ratios: number[] = [];
  const theirs: number[] = [];
  for (const build of partial) {
    const outside = timed(() => {
      for (const { id, options } of catalogue.choices) {
        for (const option of options) isOpenFor(solver, build, id, option.id);
      }
    });
    const repeats = 10;
    const own = timed(() => {
      for (let again = 0; again < repeats; again += 1) openOptions(demoContext, build);
    });
    ratios.push(outside / (own / repeats));
    theirs.push(outside);
  }
  return [
    {
      name: "open_options_vs_logic_solver",
      value: median(ratios),
      unit: "times",
      aim: ">= 100",
      samples: ratios,
    },
    { name: "logic_solver_all_options", value: median(theirs), unit: "ms", samples: theirs },
  ];
}

/** Steps of random catalogues from empty to complete. */
function randomSteps(choices: number, rules: number, seeds: number): number[] {
  return Array.from({ length: seeds }, (_, at) => at + 1).flatMap((seed) => {
    const random = implicationCatalogue(seed, { choices, options: 12, rules });
    const context = { ...random, load: { minutes: {} }, today: "2026-12-01" };
    const builds = clickSequence(context, seed);
    // A copy, so that nothing is known of the sequence beforehand.
    const fresh = { ...context, catalogue: structuredClone(random.catalogue) };
    return builds.map((build) => timed(() => evaluate(fresh, build)));
  });
}

function growing(): Measured[] {
  return [10, 20, 40, 60].map((choices) => {
    const samples = randomSteps(choices, Math.round((choices * 10) / 3), 4);
    return { name: `growth_${choices}_choices_p95`, value: quantile(samples, 0.95), unit: "ms", samples };
  });
}

/** A thousand spec codes read, evaluated and checked. */
function bulk(complete: readonly Build[]): Measured {
  const codes = Array.from({ length: 1000 }, (_, at) =>
    encodeSpec(catalogue, complete[at % complete.length]?.answers ?? {}),
  );
  const samples = Array.from(
    { length: 3 },
    () =>
      timed(() => {
        for (const code of codes) {
          const read = decodeSpec(code, () => catalogue);
          if (!read.ok || !checkOrderable(demoContext, { answers: read.answers, numbers: {}, mine: [] }).ok) {
            throw new Error(`a line that can be ordered was refused: ${code}`);
          }
        }
      }) / 1000,
  );
  return { name: "bulk_1000_lines", value: median(samples), unit: "s", aim: "< 1", samples };
}

/** The first answer to targets whose load was not asked about before, on a compiled catalogue. */
function aiming(): Measured {
  const samples = Array.from({ length: 40 }, (_, at) => {
    const induction = at % 2 === 0 ? "naturallyAspirated" : "boosted";
    const displacement = at % 4 < 2 ? { least: 390, most: 430 } : undefined;
    const target = { duty: "drag", induction, displacement, power: 400 + at * 5, rpm: 5500 + at * 20 };
    return timed(() => findBuilds(demoContext, target));
  });
  return {
    name: "target_first_answer",
    value: quantile(samples, 0.95),
    unit: "ms",
    aim: "< 200",
    samples,
  };
}

const compiled = compiling();
const clicked = Array.from({ length: sequences }, (_, at) => clickSequence(demoContext, at + 1));
const complete = clicked.flatMap((builds) => builds.slice(-1));
const partial = clicked
  .slice(0, 40)
  .flatMap((builds, at) => builds.slice(at % builds.length, (at % builds.length) + 1));
const random60 = randomSteps(60, 200, 12);
const figures: Measured[] = [
  ...(await againstRules(complete)),
  clicking(clicked.flat()),
  ...againstSolver(partial),
  {
    name: "random_60x12x200_p95",
    value: quantile(random60, 0.95),
    unit: "ms",
    aim: "< 50",
    samples: random60,
  },
  ...compiled,
  bulk(complete),
  aiming(),
  ...growing(),
  { name: "memory", value: process.memoryUsage().rss / 2 ** 20, unit: "MB", samples: [] },
];
const seeds = `click sequences 1 to ${sequences}; random catalogues 1 to 12 and, for growth, 1 to 4`;
process.stdout.write(`Seeds: ${seeds}.\n`);
await report("rules", figures, seeds);
