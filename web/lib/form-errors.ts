import type { FieldErrors, FieldPath, FieldValues, UseFormSetError } from "react-hook-form";
import { ApiProblem } from "./problems.ts";

export interface FormError {
  field?: string | undefined;
  message: string;
}

/** Every message of a react-hook-form, with the field's path, in the order of the form. For ErrorSummary. */
export function formErrors<Values extends FieldValues>(errors: FieldErrors<Values>): FormError[] {
  return collect(errors, "");
}

function collect(node: object, path: string): FormError[] {
  return Object.entries(node).flatMap(([key, value]: [string, unknown]): FormError[] => {
    if (typeof value !== "object" || value === null || key === "ref") return [];
    const here = path === "" ? key : `${path}.${key}`;
    if ("message" in value && typeof value.message === "string" && "type" in value) {
      return [{ field: here.startsWith("root") ? undefined : here, message: value.message }];
    }
    return collect(value, here);
  });
}

/**
 * Puts a refusal of the server on the fields that it names, and the rest on the form as a whole.
 * `fields` are the paths that the form has.
 */
export function showRefusal<Values extends FieldValues>(
  error: unknown,
  fields: readonly FieldPath<Values>[],
  setError: UseFormSetError<Values>,
): void {
  const named = error instanceof ApiProblem ? (error.problem.errors ?? []) : [];
  let placed = 0;
  for (const { path, message } of named) {
    const field = fields.find((known) => known === path);
    if (field === undefined) continue;
    setError(field, { type: "server", message });
    placed += 1;
  }
  if (placed > 0 && placed === named.length) return;
  const loose = named
    .filter(({ path }) => !fields.some((known) => known === path))
    .map(({ message }) => message);
  const whole = error instanceof Error ? error.message : "The form could not be sent.";
  setError("root.server", { type: "server", message: loose.length > 0 ? loose.join(" ") : whole });
}
