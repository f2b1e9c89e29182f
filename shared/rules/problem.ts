import type { Choice } from "../catalogue/catalogue.ts";
import type { RuleTable } from "./rule-table.ts";

/** Answers as option indices by choice index; -1 = unanswered. */
export type Assignment = Int16Array;

/** One stop rule over its scope, in which the option indices, all given, count with their strides from the origin. */
export interface Constraint {
  /** Index among the stop rules. */
  stop: number;
  scope: readonly number[];
  strides: readonly number[];
  /** By the sum of option index x stride: whether these options may stand together. */
  allows(cell: number): boolean;
}

/** All stop rules for one family at the present typed numbers. */
export interface Problem {
  /** Option index of the family in the family choice. */
  family: number;
  /** By flat option index: 1 where the option exists in this family. */
  exists: Uint8Array;
  constraints: readonly Constraint[];
  /** By choice. */
  constraintsOf: readonly (readonly Constraint[])[];
}

const constraints = new WeakMap<RuleTable, Constraint>();

/** The stop rule of a table; the same object for the same table. */
function constraintOf(stop: number, table: RuleTable): Constraint {
  const known = constraints.get(table);
  if (known !== undefined) return known;
  const { scope, strides } = table;
  const origin = strides.reduce((sum, stride) => sum + stride, 0);
  const made = { stop, scope, strides, allows: (cell: number) => table.verdict(origin + cell) !== 2 };
  constraints.set(table, made);
  return made;
}

/** A family's problem from the tables of its stop rules. */
export function createProblem(
  family: number,
  exists: Uint8Array,
  choices: readonly Choice[],
  tables: readonly RuleTable[],
): Problem {
  const made = tables.map((table, stop) => constraintOf(stop, table));
  return {
    family,
    exists,
    constraints: made,
    constraintsOf: choices.map((_, choice) => made.filter(({ scope }) => scope.includes(choice))),
  };
}
