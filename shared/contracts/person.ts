import { z } from "zod";

export const roleSchema = z.enum(["customer", "dealer", "planner", "floor", "office"]);
export type Role = z.infer<typeof roleSchema>;

export const emailAddressSchema = z
  .string()
  .trim()
  .max(254, "Use an e-mail address of at most 254 characters.")
  .pipe(z.email("Write an e-mail address like name@example.com."));

export const personNameSchema = z
  .string()
  .trim()
  .min(1, "Write your name.")
  .max(100, "Use at most 100 characters.")
  .regex(/^[^\p{Cc}]*$/u, "Use letters, digits and punctuation only.");

/** What is shown of the signed-in person. */
export const personSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  emailVerified: z.boolean(),
});
export type PersonView = z.infer<typeof personSchema>;
