import type { ComponentProps, ReactNode } from "react";
import { describedBy, FieldError, type FieldProps } from "./field.tsx";
import { classNames } from "./class-names.ts";

interface RadioGroupProps extends Omit<FieldProps, "optional">, Omit<ComponentProps<"input">, "id" | "type"> {
  name: string;
  id?: string;
  options: { value: string; label: ReactNode; hint?: ReactNode }[];
}

/**
 * A short question with a few answers, as a fieldset. The rest of the props go to every radio,
 * so `register("delivery.method")` can be spread; use OptionList for the options of a build.
 */
export function RadioGroup({ label, hint, error, id, options, className, ...input }: RadioGroupProps) {
  const fieldId = id ?? input.name;
  return (
    <fieldset
      aria-describedby={describedBy(fieldId, hint, error)}
      className={classNames(error !== undefined && "border-l-3 border-stop pl-3", className)}
    >
      <legend className="font-medium">{label}</legend>
      {hint !== undefined && (
        <p id={`${fieldId}-hint`} className="text-sm text-iron">
          {hint}
        </p>
      )}
      {error !== undefined && <FieldError id={`${fieldId}-error`}>{error}</FieldError>}
      <div className="mt-1.5 divide-y divide-rule border-y border-rule">
        {options.map((option, index) => {
          const optionId = index === 0 ? fieldId : `${fieldId}-${option.value}`;
          return (
            <label
              key={option.value}
              htmlFor={optionId}
              className="flex min-h-target gap-3 px-1 py-2.5 hover:bg-wash"
            >
              <input
                {...input}
                type="radio"
                value={option.value}
                id={optionId}
                {...(input.value === undefined ? {} : { checked: input.value === option.value })}
                className="size-5 mt-0.5 shrink-0 accent-dye"
              />
              <span>
                {option.label}
                {option.hint !== undefined && <span className="block text-sm text-iron">{option.hint}</span>}
              </span>
            </label>
          );
        })}
      </div>
    </fieldset>
  );
}
