import { queueEmail } from "#server/emails/queue-email.ts";
import type { OrderEmailKind } from "#server/emails/order-email.ts";
import type { Order } from "#server/models/order.ts";
import type { OrderLine } from "#server/models/order-line.ts";

/** Queues a message to an order's buyer, within the caller's transaction; one for each event key. */
export async function queueOrderEmail(
  kind: OrderEmailKind,
  order: Order,
  lines: OrderLine[],
  eventKey: string,
): Promise<void> {
  await queueEmail({
    kind,
    to: { name: order.contactName, address: order.contactEmail },
    orderId: order.id,
    eventKey,
    data: {
      orderNumber: order.number,
      name: order.contactName,
      lines: lines.map((line) => ({
        summary: line.build.summary,
        specCode: line.specCode,
        quantity: line.quantity,
        totalCents: line.totalCents,
        weight: line.build.weight,
        specialRequest: line.specialRequest,
        specialRequestAnswer: line.specialRequestAnswer,
      })),
      goodsCents: order.goodsCents,
      freightCents: order.freightCents,
      taxCents: order.taxCents,
      taxLabel: order.taxLabel,
      totalCents: order.totalCents,
      pickUp: order.deliveryMethod === "pick-up",
      estimatedShipOn: order.estimatedShipOn,
      promisedShipOn: order.promisedShipOn,
      declineReason: order.declineReason,
    },
  });
}
