import type { ReactNode } from "react";
import { StateMark, type StateKind } from "./state-mark.tsx";

interface StatusTagProps {
  kind: StateKind;
  children: ReactNode;
}

/** A state in one or two words with its shape. */
export function StatusTag({ kind, children }: StatusTagProps) {
  return (
    <span className="inline-flex items-center gap-1.5 font-condensed font-semibold whitespace-nowrap">
      <StateMark kind={kind} className="size-3.5 shrink-0" />
      {children}
    </span>
  );
}
