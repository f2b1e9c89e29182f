import { formatCents } from "#shared/money/cents.ts";
import { orderEmailSchema } from "./order-email.ts";
import { defineEmail } from "./email-kind.ts";

export const paymentReturned = defineEmail({
  kind: "payment-returned",
  data: orderEmailSchema,
  link: "order-link",
  write: ({ data, shop, link }) => ({
    subject: `A second payment of ${formatCents(data.totalCents)} goes back to your card`,
    parts: [
      {
        part: "paragraph",
        text: `${data.name}, a payment of ${formatCents(data.totalCents)} reached ${shop.name} as order ${data.orderNumber}, although the same cart had been paid or closed before.`,
      },
      {
        part: "paragraph",
        text: "It goes back by itself, in full, to the card it came from. Banks usually show it within 5 to 10 days. Your first order stands as it was; you need do nothing.",
      },
      { part: "action", label: "See what happened", url: link },
    ],
  }),
});
