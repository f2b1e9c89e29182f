import type { Express } from "express";
import supertest, { type Test } from "supertest";
import { z } from "zod";
import { config } from "#server/config.ts";

export type Agent = ReturnType<typeof supertest.agent>;

const sessionAnswer = z.object({ csrfToken: z.string() });

/** A browser: it keeps cookies, sends our Origin, and fetches the token that changing requests carry. */
export class Browser {
  readonly agent: Agent;

  constructor(app: Express) {
    this.agent = supertest.agent(app);
  }

  get(path: string): Test {
    return this.agent.get(path);
  }

  async csrfToken(): Promise<string> {
    const answer = await this.agent.get("/api/session").expect(200);
    return sessionAnswer.parse(answer.body).csrfToken;
  }

  async send(method: "post" | "patch" | "delete", path: string, body?: object): Promise<supertest.Response> {
    const token = await this.csrfToken();
    const request = this.agent[method](path).set("Origin", config.PUBLIC_ORIGIN).set("X-CSRF-Token", token);
    return body === undefined ? request : request.send(body);
  }

  post(path: string, body?: object): Promise<supertest.Response> {
    return this.send("post", path, body);
  }

  async signIn(email: string, password: string): Promise<supertest.Response> {
    return this.post("/api/account/sign-in", { email, password });
  }
}

const problemAnswer = z.object({
  type: z.string(),
  detail: z.string(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});

/** What kind of problem an answer is, and which fields it names. */
export function problemOf(answer: supertest.Response): { kind: string; detail: string; paths: string[] } {
  const problem = problemAnswer.parse(answer.body);
  return {
    kind: problem.type.split("/").at(-1) ?? "",
    detail: problem.detail,
    paths: (problem.errors ?? []).map((error) => error.path),
  };
}
