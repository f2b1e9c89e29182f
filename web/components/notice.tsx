import type { ReactNode } from "react";
import { StateMark, type StateKind } from "./state-mark.tsx";

interface NoticeProps {
  kind: StateKind;
  title?: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
  /** Read out as soon as it appears; for what follows from something the reader just did. */
  live?: boolean;
}

const ground: Record<StateKind, string> = {
  stop: "border-stop bg-stop-wash",
  caution: "border-caution bg-caution-wash",
  note: "border-dye bg-dye-wash",
  pass: "border-pass bg-pass-wash",
  waiting: "border-edge bg-wash",
};

/** A bar across the page for one thing that should be known now. */
export function Notice({ kind, title, children, action, live = false }: NoticeProps) {
  return (
    <div
      role={live ? "status" : undefined}
      className={`flex flex-wrap items-start gap-x-4 gap-y-2 border-l-4 px-4 py-3 ${ground[kind]}`}
    >
      <StateMark kind={kind} className="mt-1 size-4 shrink-0" />
      <div className="min-w-0 grow basis-60">
        {title !== undefined && <p className="font-semibold">{title}</p>}
        {children}
      </div>
      {action}
    </div>
  );
}
