import { z } from "zod";
import { defineEmail } from "./email-kind.ts";

export const passwordChanged = defineEmail({
  kind: "password-changed",
  data: z.object({ name: z.string() }),
  write: ({ data, shop, origin }) => ({
    subject: "Your password was changed",
    parts: [
      {
        part: "paragraph",
        text: `${data.name}, the password of your account at ${shop.name} was changed, and every other session was ended.`,
      },
      { part: "paragraph", text: "If it was not you, set a new one at once and tell the shop." },
      { part: "action", label: "Set a new password", url: `${origin}/account/forgot` },
    ],
  }),
});
