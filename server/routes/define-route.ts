import type { Request, Response } from "express";
import type { z } from "zod";
import type { Actor } from "#server/policies/actor.ts";
import type { Policy } from "#server/policies/policy.ts";
import type { BrowserSession } from "#server/middleware/browser-session.ts";
import { RequestMismatch } from "#server/middleware/request-mismatch.ts";
import type { ProblemKind } from "#shared/contracts/problem.ts";

type Method = "get" | "post" | "patch" | "delete";

type Caching = "never" | "revalidate" | "forever";

/** An answer that is not JSON of the response schema, as a redirect. */
export class Answer {
  readonly send: (response: Response) => void;

  constructor(send: (response: Response) => void) {
    this.send = send;
  }
}

type Shape = z.ZodType | undefined;
type Read<Schema extends Shape> = Schema extends z.ZodType ? z.output<Schema> : undefined;
type Written<Schema extends Shape> = Schema extends z.ZodType ? z.input<Schema> : void;

interface Asked<Params, Query, Body> {
  params: Params;
  query: Query;
  body: Body;
  actor: Actor;
  /** What this browser's session holds: its cart, its orders, who signed in. */
  session: BrowserSession;
  /** For what a route cannot say with the rest: the client's address, a header. Answer by returning, not through `response`. */
  request: Request;
  response: Response;
}

interface Definition<Params extends Shape, Query extends Shape, Body extends Shape, Reply extends Shape> {
  method: Method;
  /** As Express writes it: /api/orders/:number */
  path: `/${string}`;
  /** One line for the API document. */
  summary: string;
  /** Asked before anything is read; permissions on the record itself are asked by the handler: `policy.require(actor, record)`. */
  access: Pick<Policy<never>, "action" | "mayAsk">;
  params?: Params;
  query?: Query;
  body?: Body;
  /** What the answer looks like; anything else that the handler returns is left out. Without it the answer is empty. */
  response?: Reply;
  /** 200 with a response, else 204. */
  status?: number;
  /** Answers are kept nowhere, but for: kept and asked about each time (ETag), or kept for good. */
  caching?: Caching;
  /** Problems besides those that every route may answer with, for the API document. */
  problems?: readonly ProblemKind[];
  handle(
    asked: Asked<Read<Params>, Read<Query>, Read<Body>>,
  ): Promise<Written<Reply> | Answer> | Written<Reply> | Answer;
}

/** A route as data: registered, documented and tested from the same list (routes/index.ts). */
export interface Route {
  method: Method;
  path: `/${string}`;
  summary: string;
  access: Pick<Policy<never>, "action" | "mayAsk">;
  params: z.ZodType | undefined;
  query: z.ZodType | undefined;
  body: z.ZodType | undefined;
  response: z.ZodType | undefined;
  status: number;
  caching: Caching;
  problems: readonly ProblemKind[];
  /** Parses with the schemas, in the order params, query, body; a ZodError says which part did not fit. */
  run(asked: Asked<unknown, unknown, unknown>): Promise<unknown>;
}

/**
 * Declares a route. A route parses, asks its policy, calls one service and presents what comes back:
 *
 *     export const orderRoutes = [
 *       defineRoute({
 *         method: "post",
 *         path: "/api/orders/:number/accept",
 *         summary: "Accept an order with a promised date",
 *         access: acceptOrders,
 *         params: z.object({ number: orderNumberSchema }),
 *         body: acceptOrderRequestSchema,
 *         response: orderReviewSchema,
 *         problems: ["conflict"],
 *         handle: async ({ params, body, actor }) => { … },
 *       }),
 *     ];
 *
 * Refusals that services throw become problem details by themselves. Changing methods need the CSRF token.
 */
export function defineRoute<
  Params extends Shape = undefined,
  Query extends Shape = undefined,
  Body extends Shape = undefined,
  Reply extends Shape = undefined,
>(definition: Definition<Params, Query, Body, Reply>): Route {
  const { params, query, body, response } = definition;
  return {
    method: definition.method,
    path: definition.path,
    summary: definition.summary,
    access: definition.access,
    params,
    query,
    body,
    response,
    status: definition.status ?? (response === undefined ? 204 : 200),
    caching: definition.caching ?? "never",
    problems: definition.problems ?? [],
    run: async (asked) =>
      await definition.handle({
        ...asked,
        params: read(params, "params", asked.params),
        query: read(query, "query", asked.query),
        body: read(body, "body", asked.body),
      }),
  };
}

function read<Schema extends Shape>(
  schema: Schema | undefined,
  part: "params" | "query" | "body",
  value: unknown,
): Read<Schema> {
  if (schema === undefined) return undefined as Read<Schema>;
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw new RequestMismatch(part, parsed.error.issues);
  return parsed.data as Read<Schema>;
}
