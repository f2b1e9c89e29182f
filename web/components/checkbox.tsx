import type { ComponentProps } from "react";
import { describedBy, FieldError, type FieldProps } from "./field.tsx";
import { classNames } from "./class-names.ts";

interface CheckboxProps extends Omit<FieldProps, "optional">, Omit<ComponentProps<"input">, "id" | "type"> {
  name: string;
  id?: string;
}

/** One box to tick; the whole row is its target. */
export function Checkbox({ label, hint, error, id, className, ...input }: CheckboxProps) {
  const fieldId = id ?? input.name;
  return (
    <div className={classNames(error !== undefined && "border-l-3 border-stop pl-3")}>
      {error !== undefined && <FieldError id={`${fieldId}-error`}>{error}</FieldError>}
      <div className="flex min-h-target items-start gap-3 py-2.5">
        <input
          {...input}
          type="checkbox"
          id={fieldId}
          aria-invalid={error !== undefined}
          aria-describedby={describedBy(fieldId, hint, error)}
          className={classNames("size-6 shrink-0 accent-dye", className)}
        />
        <div>
          <label htmlFor={fieldId} className="block">
            {label}
          </label>
          {hint !== undefined && (
            <p id={`${fieldId}-hint`} className="text-sm text-iron">
              {hint}
            </p>
          )}
        </div>
      </div>
    </div>
  );
}
