/** The parts of logic-solver that the tests use; terms and formulas are opaque. */
declare module "logic-solver" {
  namespace Logic {
    type Formula = object | string | number;
    interface Solution {
      getWeightedSum(formulas: readonly Formula[], weights: number | readonly number[]): number;
    }
    class Solver {
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
    function or(...formulas: (Formula | readonly Formula[])[]): Formula;
    function and(...formulas: (Formula | readonly Formula[])[]): Formula;
    function not(formula: Formula): Formula;
    function implies(first: Formula, second: Formula): Formula;
    function exactlyOne(...formulas: (Formula | readonly Formula[])[]): Formula;
  }
  export default Logic;
}
