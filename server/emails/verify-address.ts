import { z } from "zod";
import { defineEmail } from "./email-kind.ts";

export const verifyAddress = defineEmail({
  kind: "verify-address",
  data: z.object({ name: z.string() }),
  link: "verify-email",
  write: ({ data, shop, link }) => ({
    subject: "Confirm your e-mail address",
    parts: [
      { part: "paragraph", text: `${data.name}, an account at ${shop.name} was made with this address.` },
      {
        part: "paragraph",
        text: "Open the page and press its button to confirm that the address is yours. The link is good for 24 hours.",
      },
      { part: "action", label: "Confirm this address", url: link },
      {
        part: "paragraph",
        text: "If you made no account, do nothing: without you nobody can use it to see your orders.",
      },
    ],
  }),
});
