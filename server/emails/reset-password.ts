import { z } from "zod";
import { defineEmail } from "./email-kind.ts";

export const resetPassword = defineEmail({
  kind: "reset-password",
  data: z.object({ name: z.string() }),
  link: "reset-password",
  write: ({ data, shop, link }) => ({
    subject: "Set a new password",
    parts: [
      {
        part: "paragraph",
        text: `${data.name}, somebody asked to set a new password for your account at ${shop.name}.`,
      },
      {
        part: "paragraph",
        text: "The link works once, for 30 minutes. Setting a new password signs you out everywhere.",
      },
      { part: "action", label: "Set a new password", url: link },
      { part: "paragraph", text: "If it was not you, do nothing: your password stays as it is." },
    ],
  }),
});
