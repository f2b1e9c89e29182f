import { createContext, useCallback, useContext, useRef, useState, type ReactNode } from "react";

const AnnounceContext = createContext<(message: string) => void>(() => undefined);

/** Holds the one polite live region; stands once, at the root. */
export function Announcer({ children }: { children: ReactNode }) {
  const [message, setMessage] = useState("");
  const turn = useRef(false);
  const announce = useCallback((next: string) => {
    // The same words twice are only read again when the text differs: a trailing no-break space does it.
    turn.current = !turn.current;
    setMessage(turn.current ? next : `${next}\u00a0`);
  }, []);
  return (
    <AnnounceContext value={announce}>
      {children}
      <p role="status" aria-live="polite" className="sr-only">
        {message}
      </p>
    </AnnounceContext>
  );
}

/** A function that has one message read out politely, such as "Price $4,310.00, up $310.00; ships 12 May 2026". */
export function useAnnounce(): (message: string) => void {
  return useContext(AnnounceContext);
}
