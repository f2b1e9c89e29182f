import { formatCents } from "#shared/money/cents.ts";
import { blockRows, orderEmailSchema } from "./order-email.ts";
import { defineEmail } from "./email-kind.ts";

export const orderDeclined = defineEmail({
  kind: "order-declined",
  data: orderEmailSchema,
  link: "order-link",
  write: ({ data, shop, link }) => ({
    subject: `Order ${data.orderNumber}: declined, your payment goes back`,
    parts: [
      { part: "paragraph", text: `${data.name}, ${shop.name} could not take your order on.` },
      { part: "rows", rows: [["Why", data.declineReason ?? ""]] },
      blockRows(data),
      {
        part: "paragraph",
        text: `The whole payment of ${formatCents(data.totalCents)} goes back to the card it came from. Banks usually show it within 5 to 10 days; you need do nothing. The spec codes above open your builds again, should you want to change one and order anew.`,
      },
      { part: "action", label: "See this order", url: link },
      { part: "paragraph", text: `Questions: answer this message or call ${shop.name}.` },
    ],
  }),
});
