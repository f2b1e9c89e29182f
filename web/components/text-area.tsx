import { useState, type ChangeEvent, type ComponentProps } from "react";
import { controlLook, describedBy, FieldFrame, type FieldProps } from "./field.tsx";
import { classNames } from "./class-names.ts";

interface TextAreaProps extends FieldProps, Omit<ComponentProps<"textarea">, "id"> {
  name: string;
  id?: string;
  /** The most characters; counted below. Typing past it is let through and marked, so that nothing pasted is lost. */
  most?: number;
}

/** Several lines of text with a count of what is left. */
export function TextArea({
  label,
  hint,
  error,
  optional = false,
  id,
  most,
  className,
  onChange,
  ...area
}: TextAreaProps) {
  const fieldId = id ?? area.name;
  const [typed, setTyped] = useState<string | null>(null);
  const given = area.value ?? area.defaultValue;
  const length = (typed ?? (typeof given === "string" ? given : "")).length;
  const countId = `${fieldId}-count`;
  const change = (event: ChangeEvent<HTMLTextAreaElement>) => {
    setTyped(event.target.value);
    onChange?.(event);
  };
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} optional={optional}>
      <textarea
        rows={4}
        {...area}
        onChange={change}
        id={fieldId}
        aria-required={!optional}
        aria-invalid={error !== undefined}
        aria-describedby={describedBy(fieldId, hint, error, most === undefined ? undefined : countId)}
        className={controlLook(error, className)}
      />
      {most !== undefined && (
        <p id={countId} className={classNames("mt-1 text-sm", length > most ? "text-stop" : "text-iron")}>
          {length > most
            ? `${length - most} characters too many`
            : `${most - length} of ${most} characters left`}
        </p>
      )}
    </FieldFrame>
  );
}
