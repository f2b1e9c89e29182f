import { z } from "zod";
import { emailAddressSchema, personNameSchema } from "./person.ts";

/** At least 8 characters, any of them, never cut short (OWASP ASVS 5.0: 6.2.1, 6.2.5, 6.2.8, 6.2.9). */
export const newPasswordSchema = z
  .string()
  .min(8, "Use at least 8 characters; 15 or more is better.")
  .max(200, "Use at most 200 characters.");

export const registerRequestSchema = z.object({
  name: personNameSchema,
  email: emailAddressSchema,
  password: newPasswordSchema,
});
export type RegisterRequest = z.infer<typeof registerRequestSchema>;

export const signInRequestSchema = z.object({
  email: emailAddressSchema,
  password: z.string().min(1, "Write your password.").max(200),
});
export type SignInRequest = z.infer<typeof signInRequestSchema>;

const tokenSchema = z.string().min(20).max(200);

export const verifyRequestSchema = z.object({ token: tokenSchema });
export type VerifyRequest = z.infer<typeof verifyRequestSchema>;

export const forgotRequestSchema = z.object({ email: emailAddressSchema });
export type ForgotRequest = z.infer<typeof forgotRequestSchema>;

export const resetRequestSchema = z.object({ token: tokenSchema, password: newPasswordSchema });
export type ResetRequest = z.infer<typeof resetRequestSchema>;

export const changePasswordRequestSchema = z.object({
  currentPassword: z.string().min(1, "Write your present password.").max(200),
  newPassword: newPasswordSchema,
});
export type ChangePasswordRequest = z.infer<typeof changePasswordRequestSchema>;

/** The answer to register, forgot and the like: the same whether or not the address is known. */
export const acknowledgementSchema = z.object({ message: z.string() });
