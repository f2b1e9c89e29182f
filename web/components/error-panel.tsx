import type { ReactNode } from "react";
import { Button } from "./button.tsx";
import { StateMark } from "./state-mark.tsx";

interface ErrorPanelProps {
  /** What happened. */
  title: ReactNode;
  /** More of what happened, when there is more to say. */
  children?: ReactNode;
  /** What is safe: what was kept, what did not happen. */
  safe?: ReactNode;
  onRetry?: (() => void) | undefined;
  retrying?: boolean;
  /** Another way on. */
  action?: ReactNode;
}

/** Says what happened, what is safe, and offers to try again. */
export function ErrorPanel({ title, children, safe, onRetry, retrying = false, action }: ErrorPanelProps) {
  return (
    <section role="alert" className="border-2 border-stop bg-sheet p-5">
      <h2 className="flex items-start gap-2 text-lg">
        <StateMark kind="stop" className="mt-1 size-5 shrink-0" />
        {title}
      </h2>
      <div className="mt-2 max-w-text space-y-1 pl-7">
        {children}
        {safe !== undefined && <p className="text-iron">{safe}</p>}
      </div>
      {(onRetry !== undefined || action !== undefined) && (
        <div className="mt-4 flex flex-wrap gap-3 pl-7">
          {onRetry !== undefined && (
            <Button onClick={onRetry} busy={retrying} busyLabel="Trying again">
              Try again
            </Button>
          )}
          {action}
        </div>
      )}
    </section>
  );
}
