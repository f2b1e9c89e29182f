import type { ReactNode } from "react";
import { StateMark } from "./state-mark.tsx";
import { classNames } from "./class-names.ts";

/** What every field takes: `id` defaults to `name`, so that the error summary can link to it by the field's path. */
export interface FieldProps {
  label: ReactNode;
  /** Under the label: what is wanted. */
  hint?: ReactNode;
  /** The message of the schema or of the server; undefined when the field is right. */
  error?: string | undefined;
  /** Says "optional" beside the label; fields are required unless this is set. */
  optional?: boolean;
}

/** The ids that tie a control to its hint and error. */
export function describedBy(id: string, hint: ReactNode, error: string | undefined, more?: string) {
  const ids = [
    error === undefined ? null : `${id}-error`,
    hint === undefined ? null : `${id}-hint`,
    more ?? null,
  ].filter((part) => part !== null);
  return ids.length === 0 ? undefined : ids.join(" ");
}

interface FieldFrameProps extends FieldProps {
  id: string;
  children: ReactNode;
}

/** Label above, hint under the label, error above the control. */
export function FieldFrame({ id, label, hint, error, optional = false, children }: FieldFrameProps) {
  return (
    <div className={classNames("flex flex-col", error !== undefined && "border-l-3 border-stop pl-3")}>
      <label htmlFor={id} className="font-medium">
        {label}
        {optional && <span className="font-normal text-iron"> (optional)</span>}
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-sm text-iron">
          {hint}
        </p>
      )}
      {error !== undefined && <FieldError id={`${id}-error`}>{error}</FieldError>}
      <div className="mt-1.5">{children}</div>
    </div>
  );
}

export function FieldError({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={id} className="mt-1 flex items-start gap-1.5 font-medium text-stop">
      <StateMark kind="stop" className="mt-1 size-4 shrink-0" />
      {children}
    </p>
  );
}

/** The look of every box that is typed into. */
export function controlLook(error: string | undefined, className?: string) {
  return classNames(
    "block min-h-target w-full rounded border bg-sheet px-3 py-2 text-base text-ink placeholder:text-iron",
    "hover:border-ink in-data-[place=floor]:min-h-target-floor",
    "[&[readonly]]:bg-wash disabled:bg-wash",
    error === undefined ? "border-edge" : "border-2 border-stop",
    className,
  );
}
