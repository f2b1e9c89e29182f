import { z } from "zod";

const flag = z
  .enum(["0", "1"])
  .default("0")
  .transform((value) => value === "1");

const port = z.coerce.number().int().min(0).max(65_535);

/** Origin only: scheme, host and port, as browsers send it. */
const origin = z
  .url({ protocol: /^https?$/ })
  .refine((text) => new URL(text).origin === text, "must be an origin such as https://shop.example");

const settingsSchema = z
  .object({
    NODE_ENV: z.enum(["development", "test", "production"]).default("development"),
    HOST: z.string().min(1).default("127.0.0.1"),
    PORT: port.default(4700),
    PUBLIC_ORIGIN: origin.default("http://127.0.0.1:4700"),
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, hostname: /.*/ }),
    DATABASE_POOL: z.coerce.number().int().min(2).max(200).default(10),
    SESSION_SECRET: z.string().min(32, "must have at least 32 characters"),
    STRIPE_SECRET_KEY: z.string().min(1),
    STRIPE_WEBHOOK_SECRET: z.string().min(1),
    STRIPE_API_ORIGIN: origin.optional(),
    SMTP_URL: z.url({ protocol: /^smtps?$/, hostname: /.*/ }),
    MAIL_FROM: z.string().min(3),
    /** How many proxies stand in front; 0 = none, then no forwarded header is believed. */
    TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
    LOG_LEVEL: z.enum(["silent", "fatal", "error", "warn", "info", "debug", "trace"]).default("info"),
    MIGRATE_ON_START: flag,
    DEMO: flag,
    MAILBOX_URL: z.url().optional(),
    SERVE_WEB: z.string().min(1).default("dist"),
  })
  .superRefine((settings, context) => {
    if (settings.NODE_ENV !== "production") return;
    const refuse = (name: string, message: string): void => {
      context.addIssue({ code: "custom", path: [name], message });
    };
    if (settings.DEMO) refuse("DEMO", "is not allowed in production");
    if (settings.STRIPE_API_ORIGIN !== undefined)
      refuse("STRIPE_API_ORIGIN", "is not allowed in production: it stands for the test payment service");
  });

export type Config = z.infer<typeof settingsSchema>;

/** What is wrong with the environment, in one sentence. */
class ConfigurationError extends Error {
  override readonly name = "ConfigurationError";
}

/**
 * Reads the environment. An empty variable counts as not set.
 * @throws ConfigurationError naming every variable that is missing or wrong; values are never repeated
 */
export function readConfig(environment: Record<string, string | undefined>): Config {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ""));
  const parsed = settingsSchema.safeParse(given);
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.map((issue) => {
    const name = issue.path.join(".");
    if (given[name] === undefined) return `${name} is not set`;
    return `${name} ${issue.code === "custom" || issue.code === "too_small" ? issue.message : "is not valid"}`;
  });
  throw new ConfigurationError(`The environment is not complete: ${[...new Set(faults)].join("; ")}.`);
}

export const config = readConfig(process.env);
