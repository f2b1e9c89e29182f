import type { ComponentProps } from "react";
import { controlLook, describedBy, FieldFrame, type FieldProps } from "./field.tsx";

interface TextFieldProps extends FieldProps, Omit<ComponentProps<"input">, "id"> {
  name: string;
  id?: string;
}

/**
 * One line of text: name, e-mail, telephone, password, date by `type`.
 * Spread react-hook-form's `register("name")` and give `error`; say `autoComplete` and `inputMode` where they fit.
 */
export function TextField({ label, hint, error, optional = false, id, className, ...input }: TextFieldProps) {
  const fieldId = id ?? input.name;
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} optional={optional}>
      <input
        type="text"
        {...input}
        id={fieldId}
        required={false}
        aria-required={!optional}
        aria-invalid={error !== undefined}
        aria-describedby={describedBy(fieldId, hint, error, input["aria-describedby"])}
        className={controlLook(error, className)}
      />
    </FieldFrame>
  );
}

interface NumberFieldProps extends TextFieldProps {
  /** Shown inside the box and read with the label, such as "in" or "cc". */
  unit: string;
  /** The unit in full for those who listen, such as "inches"; default is `unit`. */
  unitName?: string;
}

/** A typed number with its unit inside the box. Kept as text, so that no digit typed is lost. */
export function NumberField({
  label,
  hint,
  error,
  optional = false,
  id,
  unit,
  unitName,
  className,
  ...input
}: NumberFieldProps) {
  const fieldId = id ?? input.name;
  const unitId = `${fieldId}-unit`;
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} optional={optional}>
      <div className="relative max-w-48">
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          spellCheck={false}
          {...input}
          id={fieldId}
          aria-required={!optional}
          aria-invalid={error !== undefined}
          aria-describedby={describedBy(fieldId, hint, error, unitId)}
          className={controlLook(error, `pr-14 text-lg numerals ${className ?? ""}`)}
        />
        <span
          aria-hidden="true"
          className="pointer-events-none absolute inset-y-1.5 right-0 flex items-center border-l border-rule px-3 text-iron"
        >
          {unit}
        </span>
        <span id={unitId} className="sr-only">
          {unitName ?? unit}
        </span>
      </div>
    </FieldFrame>
  );
}
