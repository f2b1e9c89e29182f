import type { Reader } from "./api.ts";

/*
 * What was typed and not yet sent, kept for this tab (session storage), so that a reload or a walk to another page loses nothing.
 * Where storage is closed to us (private windows, full disk) nothing is kept and nothing fails.
 */

/** What was kept under the name, or null when there is nothing that can still be read. */
export function readKept<T>(name: string, reader: Reader<T>): T | null {
  const text = attempt(() => window.sessionStorage.getItem(name));
  if (text === null || text === undefined) return null;
  try {
    return reader.parse(JSON.parse(text));
  } catch {
    // Written by an older page: it is let go.
    forget(name);
    return null;
  }
}

/** Keeps a value that JSON can hold. */
export function keep(name: string, value: unknown): void {
  attempt(() => {
    window.sessionStorage.setItem(name, JSON.stringify(value));
  });
}

export function forget(name: string): void {
  attempt(() => {
    window.sessionStorage.removeItem(name);
  });
}

function attempt<T>(work: () => T): T | undefined {
  try {
    return work();
  } catch (error) {
    if (error instanceof DOMException) return undefined;
    throw error;
  }
}
