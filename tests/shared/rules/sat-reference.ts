import Logic from "logic-solver";
import type { Build } from "#shared/catalogue/build.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import { compileCatalogue } from "#shared/rules/compile.ts";
import { breaks } from "../demo/solutions.ts";
import type { ImplicationCatalogue } from "./random-implications.ts";

/** The variable that says an option is chosen. */
export const chosen = (choice: string, option: string): string => `${choice} ${option}`;

/** All of a build's answers, the given choices' left out. */
export function answersOf(build: Build, ...leftOut: string[]): Logic.Formula[] {
  return Object.entries(build.answers)
    .filter(([choice]) => !leftOut.includes(choice))
    .map(([choice, option]) => chosen(choice, option));
}

function withChoices(catalogue: Catalogue): Logic.Solver {
  const solver = new Logic.Solver();
  for (const { id, options } of catalogue.choices) {
    solver.require(Logic.exactlyOne(options.map((option) => chosen(id, option.id))));
    for (const option of options) {
      if (option.families === undefined) continue;
      const families = option.families.map((family) => chosen("family", family));
      solver.require(Logic.implies(chosen(id, option.id), Logic.or(families)));
    }
  }
  return solver;
}

/** The variable that holds a drawn implication. */
export const held = (rule: string): string => `rule ${rule}`;

/** The implications as drawn, each holding only with its variable; it knows nothing of the catalogue's rules. */
export function implicationSolver({ catalogue, implications }: ImplicationCatalogue): Logic.Solver {
  const solver = withChoices(catalogue);
  implications.forEach(({ a, whenIn, b, thenIn }, at) => {
    const then = Logic.or(
      Logic.not(held(`r${at}`)),
      thenIn.map((option) => chosen(`c${b}`, `o${option}`)),
    );
    for (const option of whenIn) solver.require(Logic.implies(chosen(`c${a}`, `o${option}`), then));
  });
  return solver;
}

/** The same with every implication holding. */
export function wholeSolver(random: ImplicationCatalogue): Logic.Solver {
  const solver = implicationSolver(random);
  solver.require(random.implications.map((_, at) => held(`r${at}`)));
  return solver;
}

/**
 * Any catalogue at typed numbers: every combination that breaks one stop rule alone is forbidden, found by asking the rule itself of
 * every combination of the choices it depends on.
 */
export function catalogueSolver(catalogue: Catalogue, numbers: Build["numbers"]): Logic.Solver {
  const solver = withChoices(catalogue);
  const { choices, families, familyChoice, stops } = compileCatalogue(catalogue);
  for (const family of families.keys()) {
    const id = families[family]?.id ?? "";
    for (const { rule, scope } of stops) {
      const full = new Int16Array(choices.length).fill(-1);
      full[familyChoice] = family;
      const forbid = (at: number, terms: Logic.Formula[]): void => {
        // A rule that is broken already needs no further answers.
        if (breaks(catalogue, rule, full, numbers)) {
          solver.forbid(Logic.and(terms));
          return;
        }
        const choice = scope[at];
        if (choice === undefined) return;
        choices[choice]?.options.forEach((option, index) => {
          if (option.families?.includes(id) === false) return;
          full[choice] = index;
          forbid(at + 1, [...terms, chosen(choices[choice]?.id ?? "", option.id)]);
        });
        full[choice] = -1;
      };
      forbid(0, [chosen("family", id)]);
    }
  }
  return solver;
}

/** Whether an option is open, asked of the solver. */
export function isOpenFor(solver: Logic.Solver, build: Build, choice: string, option: string): boolean {
  return solver.solveAssuming(Logic.and([chosen(choice, option), ...answersOf(build, choice)])) !== null;
}

/**
 * Changed answers and price of the cheapest mend in a catalogue of one family: fewest changes, then least sum of the amounts of the
 * answered choices. Null where there is none.
 */
export function cheapestMendFor(
  solver: Logic.Solver,
  { catalogue, priceList }: ImplicationCatalogue,
  build: Build,
  wanted: { choice: string; option: string },
): { changes: number; amount: number } | null {
  const fixed = build.mine.filter((choice) => choice !== wanted.choice);
  const others = Object.keys(build.answers).filter(
    (choice) => choice !== wanted.choice && choice !== "family",
  );
  solver.require(chosen(wanted.choice, wanted.option));
  for (const choice of ["family", ...fixed]) {
    const answer = build.answers[choice];
    if (answer !== undefined && choice !== wanted.choice) solver.require(chosen(choice, answer));
  }
  const first = solver.solve();
  if (first === null) return null;
  const changed = others.map((choice) => Logic.not(chosen(choice, build.answers[choice] ?? "")));
  const fewest = solver.minimizeWeightedSum(first, changed, 1);
  if (fewest === null) return null;
  const terms = others.flatMap((choice) =>
    (catalogue.choices.find(({ id }) => id === choice)?.options ?? []).map(({ id }) => ({
      term: chosen(choice, id),
      amount: Number(priceList.options[choice]?.[id] ?? 0),
    })),
  );
  const formulas = terms.map(({ term }) => term);
  const weights = terms.map(({ amount }) => amount / 100);
  const cheapest = solver.minimizeWeightedSum(fewest, formulas, weights);
  if (cheapest === null) return null;
  return {
    changes: cheapest.getWeightedSum(changed, 1),
    amount: 100 * cheapest.getWeightedSum(formulas, weights),
  };
}
