import type { Catalogue } from "../catalogue/catalogue.ts";
import type { Figure, FigureUnit } from "./evaluation.ts";
import type { Reading } from "./reading.ts";

/** One computed figure: what it reads, and how it is computed from what is known. */
export interface FigureDefinition {
  id: string;
  name: string;
  unit: FigureUnit;
  places: number;
  formula: string;
  /** Named values, words, typed numbers and choices that it reads; missing one of them it is undecided. */
  values: readonly string[];
  words?: readonly string[];
  numbers?: readonly string[];
  choices?: readonly string[];
  compute(reading: Reading, catalogue: Catalogue): number | null;
  /** True for a figure that is of no interest until what it reads is known. */
  shownOnceKnown?: boolean;
  /** Where in the engine the figure is taken, for the drawing. */
  at?(reading: Reading, catalogue: Catalogue): Figure["at"] | null;
}

export type Described = Pick<FigureDefinition, "id" | "name" | "unit" | "places" | "formula">;

/** Named values of the family and the options, and typed numbers, that a figure reads. */
interface Reads<Value extends string, Typed extends string> {
  values?: readonly Value[];
  numbers?: readonly Typed[];
}

/** What a figure reads, all of it known; null where something is not, or where the rod could not pass the crank. */
export function knownOf<const Value extends string = never, const Typed extends string = never>(
  reading: Reading,
  { values = [], numbers = [] }: Reads<Value, Typed>,
): Record<Value | Typed, number> | null {
  const known: Partial<Record<string, number>> = {};
  for (const name of values) known[name] = reading.value(name) ?? undefined;
  for (const name of numbers) known[name] = reading.number(name) ?? undefined;
  const { stroke, rodLength } = known;
  if (stroke !== undefined && rodLength !== undefined && rodLength <= stroke / 2) return null;
  return complete<Value | Typed>(known, [...values, ...numbers]) ? known : null;
}

function complete<Name extends string>(
  known: Partial<Record<string, number>>,
  names: readonly Name[],
): known is Record<Name, number> {
  return names.every((name) => known[name] !== undefined);
}

/** A figure that is computed from named values and typed numbers alone. */
export function figureFrom<const Value extends string = never, const Typed extends string = never>(
  described: Described,
  reads: Reads<Value, Typed>,
  compute: (known: Record<Value | Typed, number>) => number | null,
): FigureDefinition {
  return {
    ...described,
    values: reads.values ?? [],
    numbers: reads.numbers ?? [],
    compute(reading) {
      const known = knownOf(reading, reads);
      return known === null ? null : compute(known);
    },
  };
}
