import type { z } from "zod";

/** Thrown when a part of a request does not fit its schema. */
export class RequestMismatch extends Error {
  override readonly name = "RequestMismatch";
  readonly part: "params" | "query" | "body";
  readonly issues: z.core.$ZodIssue[];

  constructor(part: "params" | "query" | "body", issues: z.core.$ZodIssue[]) {
    super(`The ${part} do not fit`);
    this.part = part;
    this.issues = issues;
  }
}
