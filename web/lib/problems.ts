import type { Problem, ProblemKind } from "#shared/contracts/problem.ts";

/** The server answered with problem details (RFC 9457), or with something that could not be read. */
export class ApiProblem extends Error {
  override readonly name = "ApiProblem";
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail ?? problem.title);
    this.problem = problem;
  }

  get status(): number {
    return this.problem.status;
  }

  /** Whether the problem is of this kind: the last word of its type. */
  is(kind: ProblemKind): boolean {
    return this.problem.type.split("/").at(-1) === kind;
  }
}

/** No answer came: no network, or the server is down. */
export class ConnectionProblem extends Error {
  override readonly name = "ConnectionProblem";

  constructor(cause: unknown) {
    super("The shop's server could not be reached. Check the connection and try again.", { cause });
  }
}

export interface ProblemWords {
  /** What happened. */
  title: string;
  /** More of it, when there is more. */
  detail: string | null;
  /** What was kept or did not happen. */
  safe: string;
  /** Whether the same request may go through later. */
  again: boolean;
}

/** What is said of an error: what happened, what is safe, whether to try again. */
export function problemWords(error: unknown): ProblemWords {
  if (error instanceof ConnectionProblem) {
    return {
      title: "The shop's server could not be reached",
      detail: "Check the connection and try again.",
      safe: "Nothing you typed is lost.",
      again: true,
    };
  }
  if (error instanceof ApiProblem) {
    const { title, detail, status } = error.problem;
    return {
      title,
      detail: detail ?? null,
      safe: "Nothing was changed.",
      again: status >= 500 || status === 429 || status === 408,
    };
  }
  return {
    title: "This page met a fault of its own",
    detail: "Load the page again. If it comes back, tell the shop what you were doing.",
    safe: "What the shop has of your build and order is kept.",
    again: true,
  };
}
