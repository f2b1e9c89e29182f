import type { Problem } from "#shared/contracts/problem.ts";
import { ApiProblem, ConnectionProblem } from "./problems.ts";

/** Reads a value into a type or throws; every zod schema is one. */
export interface Reader<T> {
  parse: (value: unknown) => T;
}

/** For answers without a body (204). */
export const nothing: Reader<undefined> = { parse: () => undefined };

type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

interface Options {
  signal?: AbortSignal | undefined;
}

let csrfToken: string | null = null;

/** Told by whoever reads the session, so that the token is not asked for twice. */
export function rememberCsrfToken(token: string | null): void {
  csrfToken = token;
}

async function currentCsrfToken(): Promise<string> {
  if (csrfToken !== null) return csrfToken;
  const session = await read(await reach("/api/session", { method: "GET" }));
  if (typeof session === "object" && session !== null && "csrfToken" in session) {
    const { csrfToken: token } = session;
    if (typeof token === "string") {
      csrfToken = token;
      return token;
    }
  }
  throw unreadable(200);
}

async function reach(path: string, init: RequestInit): Promise<Response> {
  const headers = new Headers(init.headers);
  headers.set("Accept", "application/json, application/problem+json");
  try {
    return await fetch(path, { ...init, headers, credentials: "same-origin" });
  } catch (cause) {
    if (init.signal?.aborted === true) throw cause;
    throw new ConnectionProblem(cause);
  }
}

/** The body of a good answer; a bad one is thrown as ApiProblem. */
async function read(response: Response): Promise<unknown> {
  const text = await response.text();
  if (!response.ok) throw new ApiProblem(await problemOf(response, text));
  if (text === "") return undefined;
  const body = parsed(text);
  if (body === undefined) throw unreadable(response.status);
  return body;
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    throw error;
  }
}

async function problemOf(response: Response, text: string): Promise<Problem> {
  // Loaded when first needed: the first page does without the schemas.
  const { problemSchema } = await import("#shared/contracts/problem.ts");
  const problem = problemSchema.safeParse(parsed(text));
  if (problem.success) return problem.data;
  return {
    type: "about:blank",
    title: "The shop's server did not answer as it should",
    detail: "Try again in a moment.",
    status: response.status,
  };
}

function unreadable(status: number): ApiProblem {
  return new ApiProblem({
    type: "about:blank",
    title: "The answer of the shop's server could not be read",
    detail: "Load the page again; it may be older than the server.",
    status,
  });
}

async function send(method: Method, path: string, body: unknown, options: Options): Promise<unknown> {
  const attempt = async () => {
    const headers = new Headers();
    if (body !== undefined) headers.set("Content-Type", "application/json");
    if (method !== "GET") headers.set("X-CSRF-Token", await currentCsrfToken());
    const response = await reach(path, {
      method,
      headers,
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      ...(options.signal === undefined ? {} : { signal: options.signal }),
    });
    return read(response);
  };
  try {
    return await attempt();
  } catch (error) {
    // The session ended or began anew since the token was fetched: nothing was done yet, so ask again, once.
    if (method === "GET" || !(error instanceof ApiProblem) || error.status !== 403 || !error.is("csrf"))
      throw error;
    csrfToken = null;
    return attempt();
  }
}

async function request<T>(
  method: Method,
  path: string,
  body: unknown,
  reader: Reader<T>,
  options: Options,
): Promise<T> {
  const answer = await send(method, path, body, options);
  try {
    return reader.parse(answer);
  } catch (cause) {
    const problem = unreadable(200);
    problem.cause = cause;
    throw problem;
  }
}

/**
 * The server's API. Answers are read through the contract's schema; a refusal is thrown as ApiProblem
 * (with a path for each wrong field), no answer at all as ConnectionProblem.
 */
export const api = {
  get: <T>(path: string, reader: Reader<T>, options: Options = {}) =>
    request("GET", path, undefined, reader, options),
  post: <T>(path: string, body: unknown, reader: Reader<T>, options: Options = {}) =>
    request("POST", path, body, reader, options),
  put: <T>(path: string, body: unknown, reader: Reader<T>, options: Options = {}) =>
    request("PUT", path, body, reader, options),
  patch: <T>(path: string, body: unknown, reader: Reader<T>, options: Options = {}) =>
    request("PATCH", path, body, reader, options),
  delete: <T>(path: string, reader: Reader<T>, options: Options = {}) =>
    request("DELETE", path, undefined, reader, options),
};
