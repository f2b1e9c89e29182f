import { transaction } from "#server/database/transaction.ts";
import { paymentGateway } from "#server/gateways/payment-gateway.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { Payment } from "#server/models/payment.ts";
import { expirePayment } from "./expire-payment.ts";
import { NEVER_PAID, sessionOf } from "./payment-session.ts";
import { recordPayment } from "./record-payment.ts";

/**
 * Asks Stripe how an unfinished payment stands, for the case that its webhook never came, and finishes what a crash
 * left open. While the page can still be paid, it comes back after the page's end.
 * @throws GatewayUnavailable (the job is then tried again)
 */
export async function checkPayment(paymentId: string): Promise<void> {
  const payment = await Payment.findByPk(paymentId);
  if (!payment || (payment.state !== "opening" && payment.state !== "open")) return;
  const sessionId = await sessionOf(payment);
  if (sessionId === null) {
    await transaction(() => expirePayment(paymentId, NEVER_PAID));
    return;
  }
  const session = await paymentGateway.readCheckoutSession(sessionId);
  if (session.status === "complete") {
    const { outcome } = await transaction(() => recordPayment(session));
    // Money that fits no payment of ours is for a person to look at: the job fails and stays in sight.
    if (outcome === "does not match")
      throw new Error(`checkout session ${sessionId} does not match payment ${paymentId}`);
    return;
  }
  if (session.status === "expired") {
    await transaction(() => expirePayment(paymentId, NEVER_PAID));
    return;
  }
  const again = Math.max(payment.expiresAt.getTime() + 60_000, Date.now() + 60_000);
  await transaction(() => enqueue("check-payment", { paymentId }, { startAfter: new Date(again) }));
}
