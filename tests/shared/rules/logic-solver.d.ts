/** The parts of logic-solver that the tests use; terms and formulas are opaque. */
declare module "logic-solver" {
  export type Formula = object | string | number;
  export interface Solution {
    evaluate(formula: Formula): boolean;
    getTrueVars(): string[];
    getWeightedSum(formulas: readonly Formula[], weights: number | readonly number[]): number;
  }
  export class Solver {
    require(...formulas: (Formula | readonly Formula[])[]): void;
    forbid(...formulas: (Formula | readonly Formula[])[]): void;
    solve(): Solution | null;
    solveAssuming(formula: Formula): Solution | null;
    minimizeWeightedSum(
      solution: Solution,
      formulas: readonly Formula[],
      weights: number | readonly number[],
    ): Solution | null;
  }
  export function or(...formulas: (Formula | readonly Formula[])[]): Formula;
  export function and(...formulas: (Formula | readonly Formula[])[]): Formula;
  export function not(formula: Formula): Formula;
  export function implies(first: Formula, second: Formula): Formula;
  export function exactlyOne(...formulas: (Formula | readonly Formula[])[]): Formula;
}
