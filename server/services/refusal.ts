import type { Problem, ProblemKind } from "#shared/contracts/problem.ts";

/**
 * What a service answers when it will not do what it was asked; the API turns it into problem details. `detail` is a
 * plain sentence for the reader, `errors` points at fields, `extra` are further members of the problem, `retryAfter`
 * is in seconds, `action` names the
 * permission that was missing.
 */
export class Refusal extends Error {
  override readonly name = "Refusal";
  readonly kind: ProblemKind;
  readonly errors: NonNullable<Problem["errors"]> | undefined;
  readonly extra: Record<string, unknown> | undefined;
  readonly retryAfter: number | undefined;
  readonly action: string | undefined;

  constructor(
    kind: ProblemKind,
    detail: string,
    more: {
      action?: string;
      errors?: NonNullable<Problem["errors"]>;
      extra?: Record<string, unknown>;
      retryAfter?: number;
    } = {},
  ) {
    super(detail);
    this.kind = kind;
    this.errors = more.errors;
    this.extra = more.extra;
    this.retryAfter = more.retryAfter;
    this.action = more.action;
  }
}
