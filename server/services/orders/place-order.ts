import { UniqueConstraintError } from "sequelize";
import { transaction } from "#server/database/transaction.ts";
import { paymentGateway } from "#server/gateways/payment-gateway.ts";
import { GatewayRefused } from "#server/gateways/stripe.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { Cart } from "#server/models/cart.ts";
import { CartLine } from "#server/models/cart-line.ts";
import { Order } from "#server/models/order.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { Payment } from "#server/models/payment.ts";
import { type CartHolder, findCart } from "#server/services/cart/find-cart.ts";
import { hashOf, type TotalledCart, totalCart } from "#server/services/checkout/total-cart.ts";
import { checkPayment } from "#server/services/payments/check-payment.ts";
import { expirePayment } from "#server/services/payments/expire-payment.ts";
import { openPayment } from "#server/services/payments/open-payment.ts";
import { NEVER_PAID, sessionOf } from "#server/services/payments/payment-session.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { PlacedOrder, PlaceOrderRequest } from "#shared/contracts/checkout.ts";
import { formatCents } from "#shared/money/cents.ts";
import { addHistory } from "./add-history.ts";
import { newOrderNumber } from "./new-order-number.ts";

/** How long a payment page can be paid. Stripe allows 30 minutes to 24 hours. */
const PAYABLE_FOR = 60 * 60_000;
/** A page with less than this left is not offered again. */
const LEAST_LEFT = 10 * 60_000;
/** When the server first asks by itself how a payment stands. */
const FIRST_CHECK = 10 * 60_000;

/**
 * Places an order for the holder's cart and opens its payment page. The order waits for its payment and is seen by
 * nobody in the shop until then. A cart has one payable page at a time: the same order gets the same page, another
 * one first ends the page before it.
 * @throws Refusal price-changed, build-refused, payment-closed (paid already), conflict; GatewayUnavailable
 */
export async function placeOrder(
  holder: CartHolder,
  request: PlaceOrderRequest,
): Promise<PlacedOrder & { orderId: string }> {
  const cart = await findCart(holder);
  if (!cart) throw new Refusal("conflict", "The cart is empty.");
  const totalled = await totalCart(holder, request.delivery);
  if (totalled.totals.totalCents !== request.expectedTotalCents) {
    throw new Refusal(
      "price-changed",
      `The total is ${formatCents(totalled.totals.totalCents)} today; the page showed ${formatCents(request.expectedTotalCents)}. Look at the new total and pay then.`,
      { extra: { totals: totalled.totals } },
    );
  }
  const contentHash = hashOf({ ...request, lines: totalled.cart.lines, personId: holder.personId });
  // Two browsers may do this at once; the unique index lets one through and the other looks again.
  for (let attempt = 1; ; attempt += 1) {
    const standing = await settleStandingPayment(cart.id, contentHash);
    try {
      const paymentId = standing ?? (await writeOrder(cart.id, holder, request, totalled, contentHash));
      return await openedOrder(paymentId);
    } catch (error) {
      if (!(error instanceof UniqueConstraintError) || attempt >= 5) throw error;
    }
  }
}

async function openedOrder(paymentId: string): Promise<PlacedOrder & { orderId: string }> {
  const payment = await Payment.findByPk(paymentId, { rejectOnEmpty: true });
  const order = await Order.findByPk(payment.orderId, { rejectOnEmpty: true });
  try {
    const { url } = await openPayment(paymentId);
    return { orderNumber: order.number, orderId: order.id, paymentUrl: url };
  } catch (error) {
    if (!(error instanceof GatewayRefused)) throw error;
    await transaction(() => expirePayment(paymentId, "The payment service refused to open a payment page."));
    throw new Refusal(
      "conflict",
      `The payment service does not take this order: ${error.message} Nothing was charged; check the e-mail address, or call us.`,
    );
  }
}

/** Ends the cart's payable page unless it is for the very same order; the id of the payment to go on with, if any. */
async function settleStandingPayment(cartId: string, contentHash: string): Promise<string | null> {
  const payment = await Payment.findOne({ where: { cartId, state: ["opening", "open"] } });
  if (!payment) return null;
  const order = await Order.findByPk(payment.orderId, { rejectOnEmpty: true });
  const sessionId = await sessionOf(payment);
  if (sessionId === null) {
    await transaction(() => expirePayment(payment.id, NEVER_PAID));
    return null;
  }
  const isSame = order.contentHash === contentHash && payment.expiresAt.getTime() - Date.now() > LEAST_LEFT;
  if (isSame) {
    const session = await paymentGateway.readCheckoutSession(sessionId);
    if (session.status === "open") return payment.id;
  }
  const ended = await paymentGateway.expireCheckoutSession(sessionId);
  if (ended === "already-complete") {
    await checkPayment(payment.id);
    throw paidAlready(order.number);
  }
  await transaction(() =>
    expirePayment(payment.id, "The buyer changed the order before paying; nothing was charged."),
  );
  return null;
}

function paidAlready(orderNumber: string): Refusal {
  return new Refusal(
    "payment-closed",
    `This cart was paid already, as order ${orderNumber}. Nothing was charged now.`,
    {
      extra: { orderNumber },
    },
  );
}

/** Writes order, lines, history, payment and the job that looks after it; the id of the payment. */
async function writeOrder(
  cartId: string,
  holder: CartHolder,
  request: PlaceOrderRequest,
  totalled: TotalledCart,
  contentHash: string,
): Promise<string> {
  return transaction(async () => {
    await lockUnchangedCart(cartId, totalled);
    const order = await Order.create(orderValues(cartId, holder, request, totalled, contentHash));
    await OrderLine.bulkCreate(lineValues(order.id, totalled));
    await addHistory(order, "Order written; waiting for the payment.", holder.personId);
    const payment = await Payment.create({
      orderId: order.id,
      cartId,
      state: "opening",
      amountCents: order.totalCents,
      currency: order.currency,
      expiresAt: new Date(Date.now() + PAYABLE_FOR),
    });
    await enqueue(
      "check-payment",
      { paymentId: payment.id },
      { startAfter: new Date(Date.now() + FIRST_CHECK) },
    );
    return payment.id;
  });
}

async function lockUnchangedCart(cartId: string, totalled: TotalledCart): Promise<void> {
  const cart = await Cart.findByPk(cartId, { lock: true, rejectOnEmpty: true });
  if (cart.closedAt !== null) {
    const paid = await Payment.findOne({ where: { cartId, state: "paid" }, rejectOnEmpty: true });
    throw paidAlready((await Order.findByPk(paid.orderId, { rejectOnEmpty: true })).number);
  }
  const rows = await CartLine.findAll({ where: { cartId } });
  const now = rows.map((row) => `${row.id} ${row.quantity}`).sort();
  const then = totalled.cart.lines.map((line) => `${line.id} ${line.quantity}`).sort();
  if (now.join() !== then.join()) {
    throw new Refusal("conflict", "The cart was changed in another window. Look at it once more, then pay.");
  }
}

function orderValues(
  cartId: string,
  holder: CartHolder,
  { contact, delivery }: PlaceOrderRequest,
  {
    cart,
    totals,
    taxLabel,
    taxCalculation,
    catalogueVersion,
    priceListVersion,
    estimatedShipOn,
  }: TotalledCart,
  contentHash: string,
) {
  const number = newOrderNumber();
  const words = [
    number,
    number.replace("-", ""),
    contact.name,
    contact.email,
    ...cart.lines.map((line) => line.build.summary),
  ];
  return {
    number,
    cartId,
    personId: holder.personId,
    state: "awaiting-payment" as const,
    contactName: contact.name,
    contactEmail: contact.email,
    contactPhone: contact.phone,
    deliveryMethod: delivery.method,
    deliveryAddress: delivery.method === "freight" ? delivery.address : null,
    catalogueVersion,
    priceListVersion,
    currency: totals.currency,
    goodsCents: totals.goodsCents,
    freightCents: totals.freightCents,
    taxCents: totals.taxCents,
    totalCents: totals.totalCents,
    taxLabel,
    taxCalculation,
    contentHash,
    searchText: words.join(" ").toLowerCase(),
    estimatedShipOn,
  };
}

function lineValues(orderId: string, { cart }: TotalledCart) {
  return cart.lines.map((line, index) => ({
    orderId,
    position: index + 1,
    specCode: line.build.specCode,
    numbers: line.build.numbers,
    engraving: line.engraving,
    specialRequest: line.specialRequest,
    quantity: line.quantity,
    unitCents: line.build.priceCents,
    totalCents: line.totalCents,
    build: line.build,
  }));
}
