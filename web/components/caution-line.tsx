import type { ReactNode } from "react";
import { StateMark } from "./state-mark.tsx";

/** A caution in one line, at the step that needs it. */
export function CautionLine({ children }: { children: ReactNode }) {
  return (
    <p className="flex items-start gap-2 text-sm">
      <StateMark kind="caution" className="mt-0.5 size-4 shrink-0" />
      <span>
        <span className="font-semibold text-caution">Caution.</span> {children}
      </span>
    </p>
  );
}
