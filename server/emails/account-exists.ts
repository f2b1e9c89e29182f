import { z } from "zod";
import { defineEmail } from "./email-kind.ts";

export const accountExists = defineEmail({
  kind: "account-exists",
  data: z.object({ name: z.string() }),
  write: ({ data, shop, origin }) => ({
    subject: "You already have an account",
    parts: [
      {
        part: "paragraph",
        text: `${data.name}, somebody tried to make an account at ${shop.name} with this address. There is one already, and nothing about it was changed.`,
      },
      {
        part: "paragraph",
        text: "If it was you, sign in with the password you have, or set a new one from the sign-in page.",
      },
      { part: "action", label: "Go to sign-in", url: `${origin}/account/sign-in` },
    ],
  }),
});
