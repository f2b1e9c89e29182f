import { longDate } from "#shared/units/date-text.ts";
import { blockRows, liftingCaution, orderEmailSchema } from "./order-email.ts";
import { defineEmail } from "./email-kind.ts";
import type { LetterPart } from "./letter.ts";

export const orderAccepted = defineEmail({
  kind: "order-accepted",
  data: orderEmailSchema,
  link: "order-link",
  write: ({ data, shop, link }) => ({
    subject: `Order ${data.orderNumber}: accepted, ships ${longDate(data.promisedShipOn ?? data.estimatedShipOn)}`,
    parts: [
      { part: "paragraph", text: `${data.name}, ${shop.name} has accepted your order.` },
      {
        part: "rows",
        rows: [["Promised ship date", longDate(data.promisedShipOn ?? data.estimatedShipOn)]],
      },
      blockRows(data),
      ...data.lines
        .filter((line) => line.specialRequest !== "")
        .map((line): LetterPart => ({
          part: "rows",
          rows: [
            ["You asked", line.specialRequest],
            ["The shop answers", line.specialRequestAnswer],
          ],
        })),
      {
        part: "paragraph",
        text: "Next, castings are set aside and the machining is scheduled. You hear from us when the order ships, or before if the date has to move.",
      },
      { part: "action", label: "Follow this order", url: link },
      liftingCaution(data),
    ],
  }),
});
