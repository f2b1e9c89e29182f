import { createServer, type Server } from "node:http";
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, render } from "@testing-library/react";
import type { ReactElement } from "react";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { vi } from "vitest";
import { Announcer } from "#web/components/announcer.tsx";
import { rememberCsrfToken } from "#web/lib/api.ts";

/** What the server answers to one "METHOD /path": a body, a refusal with its status, or a wait that the test ends. */
type Answer = unknown;

interface Refusal {
  refusal: number;
  kind: string;
  detail: string;
  [member: string]: unknown;
}

export function refuse(refusal: number, kind: string, detail: string, more: object = {}): Refusal {
  return { refusal, kind, detail, ...more };
}

function isRefusal(answer: unknown): answer is Refusal {
  return typeof answer === "object" && answer !== null && "refusal" in answer;
}

/** A real HTTP server that answers what the test says, and notes what was asked. */
export interface Shop {
  answers: Record<string, Answer>;
  asked: { line: string; body: unknown }[];
  /** Bodies of one "METHOD /path", in order. */
  bodies: (line: string) => unknown[];
  close: () => Promise<void>;
}

export async function openShop(): Promise<Shop> {
  const answers: Record<string, Answer> = {};
  const asked: Shop["asked"] = [];
  const server = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on("data", (chunk: Buffer) => chunks.push(chunk));
    request.on("end", () => {
      const line = `${request.method ?? ""} ${request.url ?? ""}`;
      const text = Buffer.concat(chunks).toString();
      asked.push({ line, body: text === "" ? undefined : JSON.parse(text) });
      void Promise.resolve(answers[line] ?? refuse(404, "not-found", `nothing answers ${line}`)).then(
        (answer) => {
          if (!isRefusal(answer)) {
            response.writeHead(200, { "Content-Type": "application/json" }).end(JSON.stringify(answer));
            return;
          }
          const { refusal, kind, ...members } = answer;
          const problem = { type: `/problems/${kind}`, title: kind, status: refusal, ...members };
          response
            .writeHead(refusal, { "Content-Type": "application/problem+json" })
            .end(JSON.stringify(problem));
        },
      );
    });
  });
  await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
  const { fetch } = globalThis;
  // A browser puts the page's own origin before a path.
  vi.stubGlobal("fetch", (path: string, init: RequestInit) => {
    const { signal, ...rest } = init;
    void signal; // jsdom's signal is not the one that Node's fetch knows.
    return fetch(originOf(server) + path, rest);
  });
  rememberCsrfToken("a token of the test");
  return {
    answers,
    asked,
    bodies: (line) => asked.filter((request) => request.line === line).map((request) => request.body),
    close: async () => {
      cleanup();
      vi.unstubAllGlobals();
      rememberCsrfToken(null);
      window.sessionStorage.clear();
      server.closeAllConnections();
      await new Promise((closed) => server.close(closed));
    },
  };
}

function originOf(server: Server): string {
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("the server has no port");
  return `http://127.0.0.1:${address.port}`;
}

/** Draws a page at an address as the program does; other addresses show their own path. */
export function renderPage(page: ReactElement, { at = "/", pattern = "/" } = {}) {
  vi.stubGlobal("matchMedia", () => ({
    matches: false,
    addEventListener: () => null,
    removeEventListener: () => null,
  }));
  vi.stubGlobal("scrollTo", () => null);
  // jsdom lays nothing out and has neither of these.
  Element.prototype.scrollIntoView = () => undefined;
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function close() {
    this.open = false;
    this.dispatchEvent(new Event("close"));
  };
  const router = createMemoryRouter(
    [
      { path: pattern, element: page },
      { path: "*", element: <p>another page</p> },
    ],
    {
      initialEntries: [at],
    },
  );
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  render(
    <QueryClientProvider client={client}>
      <Announcer>
        <RouterProvider router={router} />
      </Announcer>
    </QueryClientProvider>,
  );
  return { router, client };
}
