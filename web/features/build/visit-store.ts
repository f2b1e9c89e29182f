/** What is kept for this visit, in this tab. Storage may be closed to us (private windows): then nothing is kept. */
export function readVisit(key: string): string | null {
  try {
    return window.sessionStorage.getItem(key);
  } catch (error) {
    if (error instanceof DOMException) return null;
    throw error;
  }
}

/** Keeps a text for this visit; null forgets it. */
export function writeVisit(key: string, text: string | null): void {
  try {
    if (text === null) window.sessionStorage.removeItem(key);
    else window.sessionStorage.setItem(key, text);
  } catch (error) {
    if (!(error instanceof DOMException)) throw error;
  }
}
