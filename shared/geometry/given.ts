import { lengthFromInches } from "../units/length.ts";

/** Units of 0.00005 in of a length given in inches; throws RangeError, naming it, unless it is above zero and on the grid. */
export function givenLength(name: string, inches: number): number {
  if (!Number.isFinite(inches) || inches <= 0) throw new RangeError(`${name} must be a length above zero`);
  return lengthFromInches(inches);
}

/** As a length, but zero is lawful. */
export function givenAllowance(name: string, inches: number): number {
  if (!Number.isFinite(inches) || inches < 0) throw new RangeError(`${name} must not be negative`);
  return lengthFromInches(inches);
}

/** Half of a length in units; exact, for a grid of 0.0001 in leaves no odd unit. */
export function half(units: number): number {
  return units / 2;
}

/** Half the stroke and the rod in units; throws RangeError where the rod could not pass the crank. */
export function rodAndThrow(stroke: number, rodLength: number): { crankThrow: number; rod: number } {
  const crankThrow = half(givenLength("the stroke", stroke));
  const rod = givenLength("the rod length", rodLength);
  if (rod <= crankThrow) throw new RangeError("the rod is shorter than half the stroke");
  return { crankThrow, rod };
}

/** Any quantity that must be a finite number above zero; throws RangeError, naming it. */
export function givenAbove(name: string, quantity: number): void {
  if (!(quantity > 0) || !Number.isFinite(quantity)) throw new RangeError(`${name} must be above zero`);
}
