import { config } from "#server/config.ts";
import { transaction } from "#server/database/transaction.ts";
import { paymentGateway } from "#server/gateways/payment-gateway.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { Order } from "#server/models/order.ts";
import { Payment } from "#server/models/payment.ts";

/**
 * Asks Stripe for the payment page of a payment that was written down before, and notes its address. The payment's
 * id is the idempotency key and all words come from the database, so that asking again gives the same page.
 * @throws GatewayUnavailable, GatewayRefused
 */
export async function openPayment(paymentId: string): Promise<{ sessionId: string; url: string }> {
  const payment = await Payment.findByPk(paymentId, { rejectOnEmpty: true });
  if (payment.checkoutSession !== null && payment.url !== null) {
    return { sessionId: payment.checkoutSession, url: payment.url };
  }
  const order = await Order.findByPk(payment.orderId, { rejectOnEmpty: true });
  const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] });
  const opened = await paymentGateway.openCheckoutSession({
    orderNumber: order.number,
    orderId: order.id,
    paymentId: payment.id,
    email: order.contactEmail,
    currency: payment.currency.toLowerCase(),
    lines: payableLines(order, lines),
    successUrl: `${config.PUBLIC_ORIGIN}/checkout/return?session={CHECKOUT_SESSION_ID}`,
    cancelUrl: `${config.PUBLIC_ORIGIN}/checkout?left-payment=${order.number}`,
    expiresAt: payment.expiresAt,
    idempotencyKey: payment.id,
  });
  await transaction(async () => {
    const locked = await Payment.findByPk(paymentId, { lock: true, rejectOnEmpty: true });
    // A webhook may have been quicker: then the payment is past "open" and stays as it is.
    if (locked.state === "opening") {
      await locked.update({ state: "open", checkoutSession: opened.sessionId, url: opened.url });
    }
  });
  return opened;
}

function payableLines(order: Order, lines: OrderLine[]) {
  return [
    ...lines.map((line) => ({
      name: `Engine block: ${line.build.summary}`,
      description: `Spec code ${line.specCode}`,
      amountCents: line.unitCents,
      quantity: line.quantity,
    })),
    { name: "Freight", amountCents: order.freightCents, quantity: 1 },
    { name: order.taxLabel, amountCents: order.taxCents, quantity: 1 },
  ].filter((line) => line.amountCents > 0);
}
