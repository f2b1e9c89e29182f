import { useEffect } from "react";

/** Ctrl+Z and Ctrl+Shift+Z (or Ctrl+Y) for options; while text is typed they belong to the text. */
export function useUndoKeys(undo: (() => void) | null, redo: (() => void) | null): void {
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || isTyped(event.target)) return;
      const key = event.key.toLowerCase();
      const act = key === "z" ? (event.shiftKey ? redo : undo) : key === "y" ? redo : null;
      if (act === null) return;
      event.preventDefault();
      act();
    };
    document.addEventListener("keydown", press);
    return () => {
      document.removeEventListener("keydown", press);
    };
  }, [undo, redo]);
}

function isTyped(target: EventTarget | null): boolean {
  if (target instanceof HTMLTextAreaElement) return true;
  return target instanceof HTMLInputElement && target.type !== "radio" && target.type !== "checkbox";
}
