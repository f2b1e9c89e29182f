// @vitest-environment node
import { createServer, type IncomingMessage, type Server, type ServerResponse } from "node:http";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { z } from "zod";
import { api, nothing, rememberCsrfToken } from "#web/lib/api.ts";
import { ApiProblem, ConnectionProblem } from "#web/lib/problems.ts";

type Answer = (request: IncomingMessage, response: ServerResponse) => void;

const okSchema = z.object({ ok: z.boolean() });
let server: Server;
let origin: string;
let answers: Record<string, Answer>;
let asked: { line: string; token: string | undefined }[];

beforeEach(async () => {
  answers = {};
  asked = [];
  server = createServer((request, response) => {
    const line = `${request.method ?? ""} ${request.url ?? ""}`;
    const token = request.headers["x-csrf-token"];
    asked.push({ line, token: typeof token === "string" ? token : undefined });
    const answer = answers[line];
    if (answer === undefined) response.writeHead(404).end();
    else answer(request, response);
  });
  await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("the server has no port");
  origin = `http://127.0.0.1:${address.port}`;
  // A browser puts the page's own origin before a path; Node has none.
  const { fetch } = globalThis;
  vi.stubGlobal("fetch", (path: string, init: RequestInit) => fetch(origin + path, init));
  rememberCsrfToken(null);
});

afterEach(async () => {
  vi.unstubAllGlobals();
  server.closeAllConnections();
  await new Promise((closed) => server.close(closed));
});

function json(status: number, body: unknown): Answer {
  return (_request, response) => {
    const type = status < 400 ? "application/json" : "application/problem+json";
    response.writeHead(status, { "Content-Type": type }).end(JSON.stringify(body));
  };
}

const csrfRefusal = {
  type: "https://shop.example/problems/csrf",
  title: "The page is out of date",
  status: 403,
};

it("reads an answer through its schema and sends no token with GET", async () => {
  answers["GET /api/thing"] = json(200, { ok: true, more: 1 });
  expect(await api.get("/api/thing", okSchema)).toEqual({ ok: true });
  expect(asked).toEqual([{ line: "GET /api/thing", token: undefined }]);
});

it("fetches the session's token before the first change and keeps it", async () => {
  answers["GET /api/session"] = json(200, { csrfToken: "first" });
  answers["POST /api/thing"] = json(200, { ok: true });
  await api.post("/api/thing", { a: 1 }, okSchema);
  await api.post("/api/thing", { a: 2 }, okSchema);
  expect(asked).toEqual([
    { line: "GET /api/session", token: undefined },
    { line: "POST /api/thing", token: "first" },
    { line: "POST /api/thing", token: "first" },
  ]);
});

it("fetches a fresh token once when the old one is refused, and sends again", async () => {
  rememberCsrfToken("old");
  answers["GET /api/session"] = json(200, { csrfToken: "fresh" });
  answers["DELETE /api/thing"] = (request, response) => {
    const fresh = request.headers["x-csrf-token"] === "fresh";
    if (fresh) response.writeHead(204).end();
    else json(403, csrfRefusal)(request, response);
  };
  expect(await api.delete("/api/thing", nothing)).toBeUndefined();
  expect(asked.map(({ token }) => token)).toEqual(["old", undefined, "fresh"]);
});

it("gives up after the second refusal of the token", async () => {
  rememberCsrfToken("old");
  answers["GET /api/session"] = json(200, { csrfToken: "fresh" });
  answers["POST /api/thing"] = json(403, csrfRefusal);
  await expect(api.post("/api/thing", {}, okSchema)).rejects.toSatisfy(
    (error) => error instanceof ApiProblem && error.is("csrf"),
  );
  expect(asked.filter(({ line }) => line === "POST /api/thing")).toHaveLength(2);
});

it("does not send again when the refusal is another one", async () => {
  rememberCsrfToken("good");
  answers["POST /api/thing"] = json(403, {
    ...csrfRefusal,
    type: "https://shop.example/problems/not-allowed",
  });
  await expect(api.post("/api/thing", {}, okSchema)).rejects.toBeInstanceOf(ApiProblem);
  expect(asked).toHaveLength(1);
});

it("carries the paths of a refusal's fields", async () => {
  rememberCsrfToken("good");
  const errors = [
    { path: "delivery.address.postalCode", message: "Write a ZIP code of five digits, or ZIP+4." },
  ];
  answers["POST /api/thing"] = json(422, {
    type: "/problems/validation",
    title: "Not all is filled in",
    status: 422,
    errors,
  });
  const error: unknown = await api.post("/api/thing", {}, okSchema).catch((caught: unknown) => caught);
  expect(error).toBeInstanceOf(ApiProblem);
  expect(error instanceof ApiProblem && error.problem.errors).toEqual(errors);
});

it("says so when an error page is no problem details", async () => {
  answers["GET /api/thing"] = (_request, response) => response.writeHead(502).end("<h1>Bad gateway</h1>");
  const error: unknown = await api.get("/api/thing", okSchema).catch((caught: unknown) => caught);
  expect(error instanceof ApiProblem && error.status).toBe(502);
});

it("says so when a good answer has another shape than the contract", async () => {
  answers["GET /api/thing"] = json(200, { ok: "yes" });
  await expect(api.get("/api/thing", okSchema)).rejects.toThrow("Load the page again");
});

it("tells a lost connection apart", async () => {
  answers["GET /api/thing"] = (request) => request.socket.destroy();
  await expect(api.get("/api/thing", okSchema)).rejects.toBeInstanceOf(ConnectionProblem);
});
