import { useContext, useDeferredValue, useEffect, useMemo, useState } from "react";
import {
  NavigationType,
  UNSAFE_DataRouterContext as DataRouterContext,
  useLocation,
  useNavigate,
  useNavigation,
  useNavigationType,
} from "react-router-dom";
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
  const arrival = useNavigationType();
  const navigate = useNavigate();
  const router = useContext(DataRouterContext)?.router;
  const [held, setHeld] = useState<Held>(() => ({
    search: location.search,
    entry: location.key,
    ...keptTrail(location.search),
  }));

  if (held.entry !== location.key) {
    const other =
      arrival !== NavigationType.Pop &&
      !isMirror(location.state) &&
      !sameSearch(location.search, held.search);
    setHeld({
      ...(other ? advanced(held, location.search) : held),
      entry: location.key,
    });
  }

  // The address bar, and what is kept for this visit, can wait until the change is on the screen; by then a step that was
  // left for another one in the same breath is behind us.
  const settled = useDeferredValue(held);
  const idle = useNavigation().state === "idle";
  const { pathname, search: shown, key } = location;
  useEffect(() => {
    if (!idle || settled.entry !== key || sameSearch(settled.search, shown)) return;
    // What was rendered may be behind: a step that is being left right now must not be called back.
    const now = router?.state;
    if (now !== undefined && (now.navigation.state !== "idle" || now.location.key !== key)) return;
    void navigate(
      { pathname, search: settled.search },
      { replace: true, preventScrollReset: true, state: mirror },
    );
  }, [settled, idle, key, pathname, shown, navigate, router]);

  useEffect(() => {
    keepTrail(settled);
  }, [settled]);

  const { search, past, future } = held;
  return useMemo(() => {
    const step = (to: string | undefined, next: Trail) =>
      to === undefined
        ? null
        : () => {
            setHeld((before) => ({ ...before, ...next, search: to }));
          };
    return {
      search,
      put(put: string, silently = false) {
        setHeld((before) => {
          if (sameSearch(before.search, put)) return before;
          return silently ? { ...before, search: put } : advanced(before, put);
        });
      },
      undo: step(past.at(-1), { past: past.slice(0, -1), future: [search, ...future] }),
      redo: step(future[0], { past: [...past, search], future: future.slice(1) }),
    };
  }, [search, past, future]);
}

function advanced(before: Held, search: string): Held {
  return { ...before, search, past: [...before.past, before.search].slice(-longestTrail), future: [] };
}
