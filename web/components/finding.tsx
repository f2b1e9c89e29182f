import type { ReactNode } from "react";
import { StateMark } from "./state-mark.tsx";

interface FindingProps {
  severity: "stop" | "caution" | "note";
  children: ReactNode;
  /** Why the rule holds; opens under the sentence. */
  why?: ReactNode;
  /** A link to the step, or the button that mends it. */
  action?: ReactNode;
  /** The rule reads something that is not known yet. */
  undecided?: boolean;
}

const words = { stop: "Stop", caution: "Caution", note: "Note" } as const;
const ink = { stop: "text-stop", caution: "text-caution", note: "text-dye" } as const;
const ground = { stop: "bg-stop-wash", caution: "bg-caution-wash", note: "" } as const;

/** One finding of the rules: word, shape and colour together. Put several in a `<ul>`. */
export function Finding({ severity, children, why, action, undecided = false }: FindingProps) {
  return (
    <li className={`flex items-start gap-x-3 border-b border-rule px-3 py-2.5 ${ground[severity]}`}>
      <StateMark kind={severity} className="mt-1 size-4 shrink-0" />
      <div className="min-w-0 grow">
        <p>
          <span className={`font-semibold ${ink[severity]}`}>{words[severity]}.</span> {children}
          {undecided && <span className="text-iron"> To be confirmed.</span>}
        </p>
        {(action !== undefined || why !== undefined) && (
          <div className="flex flex-wrap items-start gap-x-4 text-sm">
            {action}
            {why !== undefined && (
              <details className="text-iron open:basis-full">
                <summary className="inline-flex min-h-6 cursor-pointer items-center underline underline-offset-4">
                  Why
                </summary>
                <p className="max-w-text">{why}</p>
              </details>
            )}
          </div>
        )}
      </div>
    </li>
  );
}
