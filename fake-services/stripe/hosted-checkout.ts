import express, { type Response, Router } from "express";
import { z } from "zod";
import { findSession } from "./checkout-sessions.ts";
import { ApiError } from "./errors.ts";
import { parseForm } from "./form-body.ts";
import { checkoutPage } from "./pages/checkout-page.ts";
import { styleSheet } from "./pages/layout.ts";
import { closedPage, confirmPage, unknownPage } from "./pages/other-pages.ts";
import { awaitsConfirmation, confirmPayment, payWithCard, type PaymentResult } from "./payments.ts";
import type { Session } from "./records.ts";
import type { FakeStripe } from "./service.ts";

const cardForm = z.object({
  number: z.string().default(""),
  expiry: z.string().default(""),
  cvc: z.string().default(""),
  name: z.string().default(""),
});
const decisionForm = z.object({ decision: z.enum(["complete", "fail"]) });

/** The pages on which a buyer pays. They work without script. */
export function hostedCheckoutRoutes(fake: FakeStripe): Router {
  const router = Router();
  router.use(express.text({ type: "application/x-www-form-urlencoded", limit: "20kb" }));
  router.use((_request, response, next) => {
    response.set({
      "Content-Security-Policy":
        "default-src 'none'; style-src 'self'; img-src data:; base-uri 'none'; frame-ancestors 'none'",
      "Cache-Control": "no-store",
      "Referrer-Policy": "no-referrer",
    });
    next();
  });
  router.get("/style.css", (_request, response) => {
    response.type("css").send(styleSheet);
  });
  router.get("/:session", (request, response) => {
    withSession(fake, request.params.session, response, (session) => {
      if (session.status !== "open") send(response, closedPage(fake.settings.merchant, session));
      else send(response, emptyCheckout(fake, session));
    });
  });
  router.post("/:session", (request, response) => {
    withSession(fake, request.params.session, response, (session) => {
      const entry = cardForm.parse(formOf(request.body));
      const result = payWithCard(fake.work(), session, entry);
      fake.commit();
      answer(fake, session, result, response, entry);
    });
  });
  router.get("/:session/confirm", (request, response) => {
    withSession(fake, request.params.session, response, (session) => {
      if (session.status !== "open") send(response, closedPage(fake.settings.merchant, session));
      else if (awaitsConfirmation(fake.work(), session))
        send(response, confirmPage(fake.settings.merchant, session));
      else response.redirect(303, `/pay/${session.id}`);
    });
  });
  router.post("/:session/confirm", (request, response) => {
    withSession(fake, request.params.session, response, (session) => {
      const form = decisionForm.safeParse(formOf(request.body));
      const result = form.success
        ? confirmPayment(fake.work(), session, form.data.decision === "complete")
        : undefined;
      fake.commit();
      if (result === undefined) response.redirect(303, `/pay/${session.id}`);
      else answer(fake, session, result, response, { expiry: "", name: "" });
    });
  });
  return router;
}

function answer(
  fake: FakeStripe,
  session: Session,
  result: PaymentResult,
  response: Response,
  typed: { expiry: string; name: string },
): void {
  const { merchant } = fake.settings;
  const view = { merchant, session, lines: linesOf(fake, session), typed };
  switch (result.outcome) {
    case "paid":
      response.redirect(303, result.successUrl);
      break;
    case "confirm":
      response.redirect(303, `/pay/${session.id}/confirm`);
      break;
    case "declined":
      send(response, checkoutPage({ ...view, refused: result.message }));
      break;
    case "invalid":
      send(
        response,
        checkoutPage({
          ...view,
          problems: result.problems,
          refused: "Nothing was charged. Check the fields marked below.",
        }),
      );
      break;
    case "closed":
      send(response, closedPage(merchant, session));
      break;
  }
}

function emptyCheckout(fake: FakeStripe, session: Session): string {
  return checkoutPage({ merchant: fake.settings.merchant, session, lines: linesOf(fake, session) });
}

function linesOf(
  fake: FakeStripe,
  session: Session,
): ReturnType<FakeStripe["work"]>["state"]["sessionLines"][string] {
  return fake.store.state.sessionLines[session.id] ?? [];
}

function withSession(
  fake: FakeStripe,
  id: string,
  response: Response,
  use: (session: Session) => void,
): void {
  try {
    const session = findSession(fake.work(), id);
    fake.commitEvents();
    use(session);
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    response.status(404);
    send(response, unknownPage(fake.settings.merchant));
  }
}

function formOf(body: unknown): object {
  return parseForm(typeof body === "string" ? body : "");
}

function send(response: Response, page: string): void {
  response.type("html").send(page);
}
