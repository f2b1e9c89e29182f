import express, { type Express, type Response } from "express";
import type { Mailbox } from "./mailbox.ts";
import { controlSchema } from "./message.ts";
import { framedHtml, listPage, messagePage, missingPage } from "./pages.ts";

const ownPolicy =
  "default-src 'none'; style-src 'unsafe-inline'; frame-src 'self'; base-uri 'none'; form-action 'none'";
const messagePolicy =
  "sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:";

function sendPage(response: Response, html: string, status = 200): void {
  response.status(status).set("content-security-policy", ownPolicy).type("html").send(html);
}

/** The mailbox's pages for people, and its JSON for tests. */
export function createMailboxApp(mailbox: Mailbox): Express {
  const app = express();
  app.disable("x-powered-by");
  app.use((_request, response, next) => {
    response.set({
      "cache-control": "no-store",
      "referrer-policy": "no-referrer",
      "x-content-type-options": "nosniff",
    });
    next();
  });

  app.get("/", (_request, response) => {
    sendPage(response, listPage(mailbox.list()));
  });
  app.get("/read/:id", (request, response) => {
    const message = mailbox.find(request.params.id);
    if (message === undefined) sendPage(response, missingPage(), 404);
    else sendPage(response, messagePage(message));
  });
  app.get("/read/:id/html", (request, response) => {
    const html = mailbox.find(request.params.id)?.html ?? null;
    if (html === null) sendPage(response, missingPage(), 404);
    else response.set("content-security-policy", messagePolicy).type("html").send(framedHtml(html));
  });

  app.get("/messages", (request, response) => {
    const { to } = request.query;
    response.json(mailbox.list(typeof to === "string" ? to : undefined));
  });
  app.get("/messages/:id", (request, response) => {
    const message = mailbox.find(request.params.id);
    if (message === undefined) response.status(404).json({ error: "No such message" });
    else response.json(message);
  });
  app.delete("/messages", (_request, response) => {
    mailbox.clear();
    response.status(204).end();
  });
  app.post("/control", express.json(), (request, response) => {
    const behaviour = controlSchema.safeParse(request.body);
    if (!behaviour.success) {
      response.status(400).json({ error: behaviour.error.message });
      return;
    }
    mailbox.control(behaviour.data);
    response.json(behaviour.data);
  });
  return app;
}
