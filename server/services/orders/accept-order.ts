import { transaction } from "#server/database/transaction.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { today } from "#server/services/shop/today.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { AcceptOrderRequest } from "#shared/contracts/orders.ts";
import { longDate } from "#shared/units/date-text.ts";
import { addHistory } from "./add-history.ts";
import { lockOrder, moveOrder } from "./lock-order.ts";
import { proposeShipDate } from "./propose-ship-date.ts";
import { queueOrderEmail } from "./queue-order-email.ts";

/**
 * The shop takes an order on and promises a ship date (ISO, the shop's calendar). Every special request must be
 * answered, and a date other than the estimate needs a reason, which the history keeps.
 * @throws Refusal not-found, validation (with paths), conflict when the order is no longer waiting
 */
export async function acceptOrder(
  number: string,
  request: AcceptOrderRequest,
  personId: string,
): Promise<void> {
  await transaction(async () => {
    const order = await lockOrder({ number });
    const lines = await OrderLine.findAll({ where: { orderId: order.id }, order: [["position", "ASC"]] });
    if (order.state === "placed") await checkRequest(lines, request);
    await moveOrder(order, "accepted", {
      promisedShipOn: request.promisedShipOn,
      openedBy: null,
      openedAt: null,
    });
    for (const line of lines) {
      const answer = request.answers[line.id];
      if (line.specialRequest !== "" && answer) await line.update({ specialRequestAnswer: answer });
    }
    const reason =
      request.dateReason === "" ? "" : ` The date differs from the estimate: ${request.dateReason}`;
    await addHistory(order, `Accepted; ships on ${longDate(request.promisedShipOn)}.${reason}`, personId);
    await queueOrderEmail("order-accepted", order, lines, `order-accepted:${order.id}`);
  });
}

async function checkRequest(lines: OrderLine[], request: AcceptOrderRequest): Promise<void> {
  const errors = lines
    .filter((line) => line.specialRequest !== "" && !request.answers[line.id])
    .map((line) => ({ path: `answers.${line.id}`, message: "Answer the special request before accepting." }));
  if (request.promisedShipOn < (await today())) {
    errors.push({ path: "promisedShipOn", message: "This date has passed. Choose today or later." });
  } else if (request.promisedShipOn !== (await proposeShipDate(lines)) && request.dateReason === "") {
    errors.push({ path: "dateReason", message: "The date differs from the estimate. Say why." });
  }
  if (errors.length > 0)
    throw new Refusal("validation", "The order cannot be accepted like this.", { errors });
}
