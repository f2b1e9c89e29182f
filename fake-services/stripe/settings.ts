import { z } from "zod";

const schema = z.object({
  FAKE_STRIPE_PORT: z.coerce.number().int().min(0).max(65_535).default(0),
  FAKE_STRIPE_SECRET_KEY: z.string().min(1),
  FAKE_STRIPE_WEBHOOK_SECRET: z.string().min(1),
  /** Where webhooks go; may also be set later through the controls. */
  FAKE_STRIPE_WEBHOOK_URL: z.url().optional(),
  FAKE_STRIPE_STATE_FILE: z.string().min(1).optional(),
  /** Shown at the top of the payment page. */
  FAKE_STRIPE_MERCHANT: z.string().min(1).default("Osier Creek Iron"),
  /** The first wait before a webhook is sent again; it doubles each time. */
  FAKE_STRIPE_RETRY_MILLISECONDS: z.coerce.number().int().min(1).default(500),
});

export interface Settings {
  port: number;
  secretKey: string;
  webhookSecret: string;
  webhookUrl: string | undefined;
  stateFile: string | undefined;
  merchant: string;
  retryMilliseconds: number;
}

/** Reads the settings; empty counts as unset. */
export function readSettings(environment: NodeJS.ProcessEnv): Settings {
  const set = schema.parse(
    Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== "")),
  );
  return {
    port: set.FAKE_STRIPE_PORT,
    secretKey: set.FAKE_STRIPE_SECRET_KEY,
    webhookSecret: set.FAKE_STRIPE_WEBHOOK_SECRET,
    webhookUrl: set.FAKE_STRIPE_WEBHOOK_URL,
    stateFile: set.FAKE_STRIPE_STATE_FILE,
    merchant: set.FAKE_STRIPE_MERCHANT,
    retryMilliseconds: set.FAKE_STRIPE_RETRY_MILLISECONDS,
  };
}
