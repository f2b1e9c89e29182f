import { transaction } from "#server/database/transaction.ts";
import { paymentGateway } from "#server/gateways/payment-gateway.ts";
import { Payment } from "#server/models/payment.ts";
import { Refund } from "#server/models/refund.ts";
import { recordRefund } from "./record-refund.ts";

/**
 * Sends back the money of a refund that was written down before. The refund's id is the idempotency key, so that a
 * repeated job returns it once.
 * @throws GatewayUnavailable (the job is then tried again), GatewayRefused
 */
export async function refundPayment(refundId: string): Promise<void> {
  const refund = await Refund.findByPk(refundId, { rejectOnEmpty: true });
  if (refund.state !== "requested") return;
  const payment = await Payment.findByPk(refund.paymentId, { rejectOnEmpty: true });
  if (payment.paymentIntent === null) throw new Error(`payment ${payment.id} has nothing to return`);
  const answer = await paymentGateway.refund({
    paymentIntentId: payment.paymentIntent,
    amountCents: refund.amountCents,
    reason: refund.reason === "paid-twice" ? "duplicate" : "requested_by_customer",
    idempotencyKey: refund.id,
    metadata: { refund_id: refund.id },
  });
  await transaction(() => recordRefund({ ...answer, ourRefundId: refund.id }));
}
