import { Order } from "#server/models/order.ts";
import { Payment, type PaymentState } from "#server/models/payment.ts";
import type { CheckoutResult } from "#shared/contracts/checkout.ts";

const states: Record<PaymentState, CheckoutResult["state"]> = {
  opening: "waiting",
  open: "waiting",
  paid: "paid",
  expired: "expired",
  surplus: "returned",
};

/** How the payment behind a checkout session stands; it only reads. Null for an unknown session. */
export async function checkoutResult(
  session: string,
): Promise<{ order: Order; result: CheckoutResult } | null> {
  const payment = await Payment.findOne({ where: { checkoutSession: session } });
  if (!payment) return null;
  const order = await Order.findByPk(payment.orderId, { rejectOnEmpty: true });
  return {
    order,
    result: {
      orderNumber: order.number,
      state: states[payment.state],
      totalCents: payment.amountCents,
      email: order.contactEmail,
    },
  };
}
