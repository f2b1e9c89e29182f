import { useEffect, useRef } from "react";
import { StateMark } from "./state-mark.tsx";

interface ErrorSummaryProps {
  /** `field` is the id of the control, or undefined for what belongs to no field. */
  errors: { field?: string | undefined; message: string }[];
  /** Changes with every attempt to send (react-hook-form's submitCount); focus moves here then. */
  attempt: number;
  title?: string;
}

/** The list of what has to be mended, above the form. Takes focus at each attempt and leads to each field. */
export function ErrorSummary({ errors, attempt, title }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const any = errors.length > 0;
  useEffect(() => {
    if (any && attempt > 0) box.current?.focus();
  }, [any, attempt]);
  if (!any) return null;
  const heading = title ?? (errors.length === 1 ? "One thing to mend" : `${errors.length} things to mend`);
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="group"
      aria-labelledby="error-summary-title"
      className="border-2 border-stop bg-sheet p-4"
    >
      <h2 id="error-summary-title" className="flex items-center gap-2 text-lg text-stop">
        <StateMark kind="stop" className="size-5" />
        {heading}
      </h2>
      <ul className="mt-2 space-y-1 pl-7">
        {errors.map(({ field, message }) => (
          <li key={`${field ?? ""} ${message}`}>
            {field === undefined ? message : <FieldLink field={field} message={message} />}
          </li>
        ))}
      </ul>
    </div>
  );
}

function FieldLink({ field, message }: { field: string; message: string }) {
  return (
    <a
      href={`#${field}`}
      className="inline-block py-0.5 text-stop underline underline-offset-4"
      onClick={(event) => {
        event.preventDefault();
        const control = document.getElementById(field);
        control?.focus();
        control?.scrollIntoView({ block: "center" });
      }}
    >
      {message}
    </a>
  );
}
