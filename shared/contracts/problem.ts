import { z } from "zod";

/**
 * RFC 9457 problem details; `errors` points at each field that has to be mended. A kind of problem may carry members
 * of its own, such as `orderNumber` with payment-closed.
 */
export const problemSchema = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});
export type Problem = z.infer<typeof problemSchema>;

/** The last word of a problem's `type`, by which the client tells problems apart. */
export type ProblemKind =
  | "validation"
  | "not-signed-in"
  | "not-allowed"
  | "not-found"
  | "csrf"
  | "too-many-requests"
  | "conflict"
  | "price-changed"
  | "build-refused"
  | "payment-closed"
  | "bad-signature"
  | "gateway-unavailable"
  | "too-large"
  | "internal";
