import { type CardEntry, type CardProblems, checkCard, type CheckedCard } from "./card-entry.ts";
import { behaviourOf, type Refusal, refusalWords } from "./cards.ts";
import { shown } from "./checkout-sessions.ts";
import { newId } from "./identifiers.ts";
import type { Charge, PaymentIntent, Session } from "./records.ts";
import { recordEvent, type Work } from "./work.ts";

export type PaymentResult =
  | { outcome: "paid"; successUrl: string }
  | { outcome: "confirm" }
  | { outcome: "declined"; code: string; declineCode: string | null; message: string }
  | { outcome: "invalid"; problems: CardProblems }
  | { outcome: "closed"; status: "complete" | "expired" };

/** Pays an open session with a card, as far as the card's bank lets it. */
export function payWithCard(work: Work, session: Session, entry: CardEntry): PaymentResult {
  if (session.status !== "open") return { outcome: "closed", status: session.status };
  const card = checkCard(entry, work.now);
  if ("problems" in card) return { outcome: "invalid", problems: card.problems };
  const intent = intentOf(work, session);
  const behaviour = behaviourOf(card.number);
  if (!behaviour.asksToConfirm) return settle(work, session, intent, card, behaviour.refusal);
  intent.status = "requires_action";
  intent.next_action = {
    type: "redirect_to_url",
    redirect_to_url: {
      url: `${work.origin}/pay/${session.id}/confirm`,
      return_url: `${work.origin}/pay/${session.id}`,
    },
  };
  work.state.waitingCards[intent.id] = {
    card: card.details,
    name: card.name,
    refusal: behaviour.refusal,
  };
  recordEvent(work, "payment_intent.requires_action", intent);
  return { outcome: "confirm" };
}

/** What happens after the bank asked the buyer; undefined when it asked nothing. */
export function confirmPayment(work: Work, session: Session, agreed: boolean): PaymentResult | undefined {
  if (session.status !== "open") return { outcome: "closed", status: session.status };
  const intent = session.payment_intent === null ? undefined : work.state.intents[session.payment_intent];
  const waiting = intent && work.state.waitingCards[intent.id];
  if (intent === undefined || waiting === undefined) return undefined;
  delete work.state.waitingCards[intent.id];
  intent.next_action = null;
  if (agreed)
    return settle(work, session, intent, { details: waiting.card, name: waiting.name }, waiting.refusal);
  const message = "Your bank could not confirm that it was you. Try again or use another card.";
  intent.status = "requires_payment_method";
  intent.last_payment_error = {
    type: "invalid_request_error",
    code: "payment_intent_authentication_failure",
    message,
  };
  recordEvent(work, "payment_intent.payment_failed", intent);
  return { outcome: "declined", code: "payment_intent_authentication_failure", declineCode: null, message };
}

/** Whether a bank waits for the buyer's word on this session. */
export function awaitsConfirmation(work: Work, session: Session): boolean {
  return session.payment_intent !== null && work.state.waitingCards[session.payment_intent] !== undefined;
}

function settle(
  work: Work,
  session: Session,
  intent: PaymentIntent,
  card: Pick<CheckedCard, "details" | "name">,
  refusal: Refusal | null,
): PaymentResult {
  const charge = chargeOf(work, intent, session, card, refusal);
  work.state.charges[charge.id] = charge;
  intent.latest_charge = charge.id;
  if (refusal !== null) {
    const message = refusalWords(refusal);
    intent.status = "requires_payment_method";
    intent.last_payment_error = {
      type: "card_error",
      code: refusal.code,
      decline_code: refusal.declineCode,
      message,
      charge: charge.id,
    };
    recordEvent(work, "charge.failed", charge);
    recordEvent(work, "payment_intent.payment_failed", intent);
    return { outcome: "declined", code: refusal.code, declineCode: refusal.declineCode, message };
  }
  intent.status = "succeeded";
  intent.amount_received = intent.amount;
  intent.last_payment_error = null;
  session.status = "complete";
  session.payment_status = "paid";
  session.customer_details = { email: session.customer_email, name: card.name, address: null, phone: null };
  recordEvent(work, "charge.succeeded", charge);
  recordEvent(work, "payment_intent.succeeded", intent);
  recordEvent(work, "checkout.session.completed", shown(work, session));
  return { outcome: "paid", successUrl: successUrlOf(session) };
}

/** Where the shop wants its buyer after paying. */
export function successUrlOf(session: Session): string {
  return session.success_url.replaceAll("{CHECKOUT_SESSION_ID}", session.id);
}

/** A session has one payment, made at the first attempt and used by the later ones. */
function intentOf(work: Work, session: Session): PaymentIntent {
  const there = session.payment_intent === null ? undefined : work.state.intents[session.payment_intent];
  if (there !== undefined) return there;
  const data = work.state.intentData[session.id];
  const id = newId("pi");
  const intent: PaymentIntent = {
    id,
    object: "payment_intent",
    amount: session.amount_total,
    amount_capturable: 0,
    amount_received: 0,
    canceled_at: null,
    capture_method: "automatic_async",
    client_secret: newId(`${id}_secret`),
    confirmation_method: "automatic",
    created: work.now,
    currency: session.currency,
    customer: null,
    description: data?.description ?? null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    metadata: data?.metadata ?? {},
    next_action: null,
    payment_method_types: ["card"],
    receipt_email: null,
    status: "requires_payment_method",
  };
  work.state.intents[id] = intent;
  session.payment_intent = id;
  recordEvent(work, "payment_intent.created", intent);
  return intent;
}

function chargeOf(
  work: Work,
  intent: PaymentIntent,
  session: Session,
  card: Pick<CheckedCard, "details" | "name">,
  refusal: Refusal | null,
): Charge {
  const paid = refusal === null;
  return {
    id: newId("ch"),
    object: "charge",
    amount: intent.amount,
    amount_captured: paid ? intent.amount : 0,
    amount_refunded: 0,
    billing_details: { address: null, email: session.customer_email, name: card.name, phone: null },
    captured: paid,
    created: work.now,
    currency: intent.currency,
    customer: null,
    description: intent.description,
    disputed: false,
    failure_code: refusal?.code ?? null,
    failure_message: refusal === null ? null : refusalWords(refusal),
    livemode: false,
    metadata: intent.metadata,
    outcome: outcomeOf(refusal),
    paid,
    payment_intent: intent.id,
    payment_method_details: { type: "card", card: card.details },
    receipt_email: intent.receipt_email,
    refunded: false,
    status: paid ? "succeeded" : "failed",
  };
}

function outcomeOf(refusal: Refusal | null): Charge["outcome"] {
  if (refusal === null) {
    return {
      network_status: "approved_by_network",
      reason: null,
      risk_level: "normal",
      seller_message: "Payment complete",
      type: "authorized",
    };
  }
  if (refusal.declineCode === "fraudulent") {
    return {
      network_status: "not_sent_to_network",
      reason: "highest_risk_level",
      risk_level: "highest",
      seller_message: "Blocked as too great a risk",
      type: "blocked",
    };
  }
  return {
    network_status: "declined_by_network",
    reason: refusal.declineCode,
    risk_level: "normal",
    seller_message: "Declined by the bank",
    type: "issuer_declined",
  };
}
