import { useSyncExternalStore } from "react";

export type LengthUnit = "in" | "mm";

const key = "length-unit";
const listeners = new Set<() => void>();
let chosen: LengthUnit | null = null;

function stored(): LengthUnit {
  if (chosen !== null) return chosen;
  try {
    chosen = window.localStorage.getItem(key) === "mm" ? "mm" : "in";
  } catch (error) {
    if (!(error instanceof DOMException)) throw error;
    chosen = "in";
  }
  return chosen;
}

function choose(unit: LengthUnit): void {
  chosen = unit;
  try {
    window.localStorage.setItem(key, unit);
  } catch (error) {
    // Storage may be closed to us (private windows): the choice then lasts for the visit.
    if (!(error instanceof DOMException)) throw error;
  }
  listeners.forEach((changed) => {
    changed();
  });
}

/** The unit in which the reader wants lengths, kept over visits. */
export function useLengthUnit(): [LengthUnit, (unit: LengthUnit) => void] {
  const unit = useSyncExternalStore((changed) => {
    listeners.add(changed);
    return () => listeners.delete(changed);
  }, stored);
  return [unit, choose];
}
