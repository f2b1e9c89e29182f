import { z } from "zod";
import { invalidRequest } from "./errors.ts";
import type { FormFields } from "./form-body.ts";

export const text = z.string().min(1).max(5000);
export const metadataParameter = z.record(z.string().max(40), z.string().max(500));

/** A whole number; every value of a form is a string. */
export const integer = z.string().transform((value, context) => {
  if (!/^-?\d{1,12}$/.test(value)) {
    context.addIssue({
      code: "custom",
      message: `Invalid integer: ${value}`,
      params: { code: "parameter_invalid_integer" },
    });
    return z.NEVER;
  }
  return Number(value);
});

export const amount = integer.pipe(z.number().min(0).max(99_999_999));

/** Parameters that every list takes. */
export const listParameters = {
  limit: integer.pipe(z.number().min(1).max(100)).optional(),
  starting_after: text.optional(),
  ending_before: text.optional(),
};

/** Checks parameters; the first thing wrong becomes an error that names its parameter. */
export function parseParameters<Schema extends z.ZodType>(
  schema: Schema,
  fields: FormFields,
): z.output<Schema> {
  const result = schema.safeParse(fields);
  if (result.success) return result.data;
  const [issue] = result.error.issues;
  if (issue === undefined) throw result.error;
  throw problemOf(issue, fields);
}

function problemOf(issue: z.core.$ZodIssue, fields: FormFields): Error {
  if (issue.code === "unrecognized_keys") {
    const param = parameterName([...issue.path, issue.keys[0] ?? ""]);
    return invalidRequest(`Unknown parameter: ${param}`, {
      code: "parameter_unknown",
      param,
      beforeWork: true,
    });
  }
  const param = parameterName(issue.path);
  const given = valueAt(fields, issue.path);
  if (given === undefined) {
    return invalidRequest(`Missing required parameter: ${param}`, {
      code: "parameter_missing",
      param,
      beforeWork: true,
    });
  }
  if (given === "") {
    return invalidRequest(`Parameter ${param} may not be empty`, {
      code: "parameter_invalid_empty",
      param,
      beforeWork: true,
    });
  }
  const code =
    issue.code === "custom" ? String(issue.params?.["code"] ?? "parameter_invalid") : "parameter_invalid";
  return invalidRequest(`Parameter ${param}: ${issue.message}`, { code, param, beforeWork: true });
}

function parameterName(path: PropertyKey[]): string {
  const [first = "", ...rest] = path.map(String);
  return first + rest.map((name) => `[${name}]`).join("");
}

function valueAt(fields: FormFields, path: PropertyKey[]): unknown {
  let value: unknown = fields;
  for (const name of path) {
    if (typeof value !== "object" || value === null) return undefined;
    value = Object.entries(value).find(([key]) => key === String(name))?.[1];
  }
  return value;
}
