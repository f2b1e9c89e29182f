import { useEffect, useState } from "react";
import { NavigationType, useLocation, useNavigate, useNavigationType } from "react-router-dom";
import { sameSearch } from "./build-address.ts";
import { readVisit, writeVisit } from "./visit-store.ts";

const trailKey = "build-trail";
const longestTrail = 100;

interface Trail {
  /** Queries before this one, the latest last. */
  past: string[];
  /** Queries that were undone, the next one first. */
  future: string[];
}

interface Held extends Trail {
  search: string;
  /** Key of the history entry that was last looked at. */
  entry: string;
}

/** Marks the entries that are only a mirror of what is held. */
const mirror = { mirror: true };

function isMirror(state: unknown): boolean {
  return typeof state === "object" && state !== null && "mirror" in state;
}

function keptTrail(search: string): Trail {
  const empty: Trail = { past: [], future: [] };
  const text = readVisit(trailKey);
  if (text === null) return empty;
  const [present, past, future] = text.split("\n\n");
  if (present !== search) return empty;
  const list = (part: string | undefined) => (part === undefined || part === "" ? [] : part.split("\n"));
  return { past: list(past), future: list(future) };
}

function keepTrail({ search, past, future }: Held): void {
  // A query never holds a line break; an empty one is written as "?".
  const lines = (queries: string[]) => queries.map((query) => (query === "" ? "?" : query)).join("\n");
  writeVisit(trailKey, [search, lines(past), lines(future)].join("\n\n"));
}

export interface HeldBuild {
  /** The query of the build as it stands. */
  search: string;
  /** Puts another build in its place; undo leads back unless `silently`. */
  put: (search: string, silently?: boolean) => void;
  undo: (() => void) | null;
  redo: (() => void) | null;
}

/**
 * The build that is on the bench, mirrored into the address bar. A change is on the screen at once and replaces the history
 * entry; Back and Forward walk through the steps and keep the build; a link that carries another build puts that one here.
 */
export function useHeldBuild(): HeldBuild {
  const location = useLocation();
  const navigation = useNavigationType();
  const navigate = useNavigate();
  const [held, setHeld] = useState<Held>(() => ({
    search: location.search,
    entry: location.key,
    ...keptTrail(location.search),
  }));

  if (held.entry !== location.key) {
    const other =
      navigation !== NavigationType.Pop &&
      !isMirror(location.state) &&
      !sameSearch(location.search, held.search);
    setHeld({
      ...(other ? advanced(held, location.search) : held),
      entry: location.key,
    });
  }

  const { pathname, search: shown } = location;
  useEffect(() => {
    if (held.entry !== location.key || sameSearch(held.search, shown)) return;
    void navigate(
      { pathname, search: held.search },
      { replace: true, preventScrollReset: true, state: mirror },
    );
  }, [held, location.key, pathname, shown, navigate]);

  useEffect(() => {
    keepTrail(held);
  }, [held]);

  const earlier = held.past.at(-1);
  const later = held.future[0];
  return {
    search: held.search,
    put(search, silently = false) {
      setHeld((before) => {
        if (sameSearch(before.search, search)) return before;
        return silently ? { ...before, search } : advanced(before, search);
      });
    },
    undo:
      earlier === undefined
        ? null
        : () => {
            setHeld((before) => ({
              ...before,
              search: earlier,
              past: before.past.slice(0, -1),
              future: [before.search, ...before.future],
            }));
          },
    redo:
      later === undefined
        ? null
        : () => {
            setHeld((before) => ({
              ...before,
              search: later,
              past: [...before.past, before.search],
              future: before.future.slice(1),
            }));
          },
  };
}

function advanced(before: Held, search: string): Held {
  return { ...before, search, past: [...before.past, before.search].slice(-longestTrail), future: [] };
}
