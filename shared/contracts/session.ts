import { z } from "zod";
import { personSchema } from "./person.ts";

const shopSchema = z.object({
  name: z.string(),
  email: z.string(),
  phone: z.string(),
  addressLines: z.array(z.string()),
  timeZone: z.string(),
});
export type ShopView = z.infer<typeof shopSchema>;

/** GET /api/session: who is here, and the token that every changing request carries. */
export const sessionSchema = z.object({
  csrfToken: z.string(),
  person: personSchema.nullable(),
  cartCount: z.int(),
  shop: shopSchema,
  demo: z.boolean(),
});
export type SessionView = z.infer<typeof sessionSchema>;
