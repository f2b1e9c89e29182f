import { longDate } from "#shared/units/date-text.ts";
import { blockRows, liftingCaution, orderEmailSchema, totalRows } from "./order-email.ts";
import { defineEmail } from "./email-kind.ts";

export const orderPlaced = defineEmail({
  kind: "order-placed",
  data: orderEmailSchema,
  link: "order-link",
  write: ({ data, shop, link }) => ({
    subject: `Order ${data.orderNumber}: receipt`,
    parts: [
      { part: "paragraph", text: `${data.name}, ${shop.name} has your order and your payment.` },
      blockRows(data),
      totalRows(data),
      {
        part: "paragraph",
        text: `A planner now looks the order over and answers by e-mail with the date the shop can keep. The estimate is ${longDate(data.estimatedShipOn)}. If the shop cannot take the order on, the whole payment goes back to your card.`,
      },
      { part: "action", label: "Follow this order", url: link },
      {
        part: "paragraph",
        text: "This link opens your order without a password. Do not pass it on.",
      },
      liftingCaution(data),
    ],
  }),
});
