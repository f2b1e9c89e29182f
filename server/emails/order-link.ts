import { orderEmailSchema } from "./order-email.ts";
import { defineEmail } from "./email-kind.ts";

export const orderLink = defineEmail({
  kind: "order-link",
  data: orderEmailSchema,
  link: "order-link",
  write: ({ data, shop, link }) => ({
    subject: `Order ${data.orderNumber}: your new link`,
    parts: [
      { part: "paragraph", text: `${data.name}, somebody asked ${shop.name} for a new link to this order.` },
      { part: "action", label: "Open this order", url: link },
      {
        part: "paragraph",
        text: "If it was not you, do nothing: the link came to this address alone.",
      },
    ],
  }),
});
