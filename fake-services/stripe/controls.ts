import express, { type Request, type Response, Router } from "express";
import { z } from "zod";
import { expireSession, findSession } from "./checkout-sessions.ts";
import { ApiError } from "./errors.ts";
import { confirmPayment, payWithCard, type PaymentResult } from "./payments.ts";
import type { FakeStripe } from "./service.ts";

const webhookControl = z.strictObject({
  mode: z.enum(["deliver", "hold", "lose", "duplicate", "reorder", "delay"]).optional(),
  delayMs: z.number().int().min(0).default(0),
  /** Where to send from now on. */
  url: z.url().optional(),
});

const release = z.strictObject({ order: z.enum(["as-happened", "reversed"]).default("as-happened") });

const fault = z.strictObject({
  mode: z.enum(["none", "hang", "500", "429", "lose-answer"]),
  paths: z.array(z.string().startsWith("/v1/")).default([]),
  count: z.number().int().min(1).nullable().default(null),
});

const payment = z.strictObject({
  card: z.string(),
  expiry: z.string().default("12 / 40"),
  cvc: z.string().optional(),
  name: z.string().default("Test Buyer"),
  /** What the buyer answers when the bank asks; left out, the payment waits. */
  confirmation: z.enum(["complete", "fail"]).optional(),
});

/** Addresses for tests: webhooks, faults, the clock, and paying without a browser. */
export function controlRoutes(fake: FakeStripe): Router {
  const router = Router();
  router.use(express.json());
  router.post("/webhooks", (request, response) => {
    const { mode, delayMs, url } = webhookControl.parse(request.body);
    if (mode !== undefined) fake.planner.plan = { mode, delayMs };
    if (url !== undefined) fake.webhooks.url = url;
    fake.webhooks.wake();
    response.json({ ...fake.planner.plan, url: fake.webhooks.url ?? null });
  });
  router.post("/webhooks/release", (request, response) => {
    const released = fake.planner.release(release.parse(request.body ?? {}).order);
    fake.commit();
    response.json({ released });
  });
  router.get("/webhooks/attempts", (_request, response) => {
    response.json(attempts(fake));
  });
  router.post("/faults", (request, response) => {
    const plan = fault.parse(request.body);
    fake.faults.set(plan);
    response.json(plan);
  });
  router.post("/clock/expire-session/:id", (request, response) => {
    const work = fake.work();
    const session = findSession(work, request.params.id);
    if (session.status === "open") {
      session.expires_at = work.now;
      expireSession(work, session);
    }
    fake.commit();
    response.json({ id: session.id, status: session.status });
  });
  router.post("/checkout/:session/pay", (request, response) => {
    const result = pay(fake, request.params.session, payment.parse(request.body));
    fake.commit();
    response.status(statusOf(result)).json(result);
  });
  router.get("/state", (_request, response) => {
    response.json(summary(fake));
  });
  router.use(controlError);
  return router;
}

function pay(fake: FakeStripe, sessionId: string, form: z.output<typeof payment>): PaymentResult {
  const work = fake.work();
  const session = findSession(work, sessionId);
  const cvc = form.cvc ?? (/^3[47]/.test(form.card) ? "1234" : "123");
  const result = payWithCard(work, session, {
    number: form.card,
    expiry: form.expiry,
    cvc,
    name: form.name,
  });
  if (result.outcome !== "confirm" || form.confirmation === undefined) return result;
  return confirmPayment(work, session, form.confirmation === "complete") ?? result;
}

function statusOf(result: PaymentResult): number {
  switch (result.outcome) {
    case "paid":
    case "confirm":
      return 200;
    case "declined":
    case "invalid":
      return 402;
    case "closed":
      return 410;
  }
}

function attempts(fake: FakeStripe): object {
  const { deliveries, events } = fake.store.state;
  return {
    attempts: deliveries
      .flatMap((delivery) =>
        delivery.attempts.map((attempt) => ({
          eventId: delivery.eventId,
          type: events[delivery.eventId]?.type ?? null,
          ...attempt,
        })),
      )
      .sort((a, b) => a.at - b.at),
    deliveries: deliveries.map((delivery) => ({
      eventId: delivery.eventId,
      type: events[delivery.eventId]?.type ?? null,
      state: delivery.state,
      attempts: delivery.attempts.length,
    })),
  };
}

function summary(fake: FakeStripe): object {
  const { sessions, charges, refunds } = fake.store.state;
  const captured = Object.values(charges).reduce((sum, charge) => sum + charge.amount_captured, 0);
  const returned = Object.values(refunds).reduce((sum, refund) => sum + refund.amount, 0);
  return {
    capturedCents: captured,
    refundedCents: returned,
    hangingRequests: fake.faults.hanging,
    sessions: Object.values(sessions).map((session) => ({
      id: session.id,
      status: session.status,
      paymentStatus: session.payment_status,
      amountCents: session.amount_total,
      paymentIntentId: session.payment_intent,
      metadata: session.metadata,
    })),
    charges: Object.values(charges).map((charge) => ({
      id: charge.id,
      paymentIntentId: charge.payment_intent,
      paid: charge.paid,
      amountCents: charge.amount,
      refundedCents: charge.amount_refunded,
      failureCode: charge.failure_code,
      metadata: charge.metadata,
    })),
    refunds: Object.values(refunds).map((refund) => ({
      id: refund.id,
      paymentIntentId: refund.payment_intent,
      amountCents: refund.amount,
      reason: refund.reason,
      metadata: refund.metadata,
    })),
  };
}

function controlError(
  error: unknown,
  _request: Request,
  response: Response,
  next: (error: unknown) => void,
): void {
  if (error instanceof z.ZodError) response.status(400).json({ problems: error.issues });
  else if (error instanceof ApiError) response.status(error.details.status).json({ problem: error.message });
  else next(error);
}
