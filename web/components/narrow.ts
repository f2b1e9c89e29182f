import { useSyncExternalStore } from "react";

const query = "(max-width: 639px)";

function subscribe(changed: () => void): () => void {
  const media = window.matchMedia(query);
  media.addEventListener("change", changed);
  return () => {
    media.removeEventListener("change", changed);
  };
}

/** True on a screen the width of a phone, where tables become lists. */
export function useNarrow(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia(query).matches);
}
