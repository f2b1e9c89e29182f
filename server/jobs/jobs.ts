import { z } from "zod";

/**
 * Every job and what it carries: ids only, never a copy of what the database knows. A job may run twice and late, so
 * its worker looks first at how things stand. Its worker is in workers.ts.
 */
export const jobSchemas = {
  "send-email": z.object({ emailId: z.uuid() }),
  "check-payment": z.object({ paymentId: z.uuid() }),
  "refund-payment": z.object({ refundId: z.uuid() }),
};

export type JobName = keyof typeof jobSchemas;
export type JobData<Name extends JobName> = z.infer<(typeof jobSchemas)[Name]>;

export const jobNames: readonly JobName[] = ["send-email", "check-payment", "refund-payment"];
