import { useSyncExternalStore } from "react";

/** system: as the reader's device says; on the Floor, the night shift until something else is chosen. */
export type ThemeChoice = "system" | "light" | "dark";

const key = "theme";
const listeners = new Set<() => void>();
let heldChoice: ThemeChoice | null = null;

function stored(): ThemeChoice | null {
  if (heldChoice !== null) return heldChoice;
  try {
    const value = window.localStorage.getItem(key);
    return value === "light" || value === "dark" || value === "system" ? value : null;
  } catch (error) {
    // Storage may be closed to us (private windows): the choice then lasts for the visit.
    if (error instanceof DOMException) return null;
    throw error;
  }
}

function apply(choice: ThemeChoice | null, onFloor: boolean): void {
  const root = document.documentElement;
  const theme = choice ?? (onFloor ? "dark" : "system");
  if (theme === "system") delete root.dataset.theme;
  else root.dataset.theme = theme;
}

/** Applies the choice for the place the reader is in; called by the layouts. */
export function applyTheme(onFloor: boolean): void {
  apply(stored(), onFloor);
}

/** The choice as it stands, and how to change it. */
export function useThemeChoice(onFloor: boolean): [ThemeChoice, (choice: ThemeChoice) => void] {
  const choice = useSyncExternalStore(
    (changed) => {
      listeners.add(changed);
      return () => listeners.delete(changed);
    },
    () => stored() ?? (onFloor ? "dark" : "system"),
  );
  const choose = (next: ThemeChoice) => {
    heldChoice = next;
    try {
      window.localStorage.setItem(key, next);
    } catch (error) {
      if (!(error instanceof DOMException)) throw error;
    }
    apply(next, onFloor);
    listeners.forEach((changed) => {
      changed();
    });
  };
  return [choice, choose];
}
