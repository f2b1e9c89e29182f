import { z } from "zod";
import { personSchema, roleSchema } from "./person.ts";

const shopSchema = z.object({
  name: z.string(),
  email: z.string(),
  phone: z.string(),
  addressLines: z.array(z.string()),
  timeZone: z.string(),
});
export type ShopView = z.infer<typeof shopSchema>;

/** The accounts of a demonstration, one for each role. */
export const demoSchema = z.object({
  password: z.string(),
  accounts: z.array(z.object({ role: roleSchema, email: z.string() })),
});
export type DemoView = z.infer<typeof demoSchema>;

/** GET /api/session: who is here, and the token that every changing request carries. */
export const sessionSchema = z.object({
  csrfToken: z.string(),
  person: personSchema.nullable(),
  cartCount: z.int(),
  shop: shopSchema,
  /** Only in a demonstration: accounts to try, with their password. */
  demo: demoSchema.nullable(),
});
export type SessionView = z.infer<typeof sessionSchema>;
