import type { ComponentProps } from "react";
import { controlLook, describedBy, FieldFrame, type FieldProps } from "./field.tsx";

interface SelectProps extends FieldProps, Omit<ComponentProps<"select">, "id"> {
  name: string;
  id?: string;
  options: { value: string; label: string }[];
  /** The first, empty entry, such as "Choose a state"; left out, the first option is chosen. */
  placeholder?: string;
}

/** A native select: works with keyboards, phones and screen readers as they know it. */
export function Select({
  label,
  hint,
  error,
  optional = false,
  id,
  options,
  placeholder,
  className,
  ...select
}: SelectProps) {
  const fieldId = id ?? select.name;
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} optional={optional}>
      <div className="relative">
        <select
          {...select}
          id={fieldId}
          aria-required={!optional}
          aria-invalid={error !== undefined}
          aria-describedby={describedBy(fieldId, hint, error)}
          className={controlLook(error, `appearance-none pr-10 ${className ?? ""}`)}
        >
          {placeholder !== undefined && <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <svg
          viewBox="0 0 12 8"
          aria-hidden="true"
          className="pointer-events-none absolute inset-y-0 right-3.5 my-auto w-3"
        >
          <path d="m1 1.500 5 5 5-5" fill="none" stroke="currentColor" strokeWidth="1.500" />
        </svg>
      </div>
    </FieldFrame>
  );
}
