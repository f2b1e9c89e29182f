import { startChild, type RunningChild } from "./child-process.ts";
import { createTestDatabase } from "./database.ts";
import { startFakeMail, type FakeMail } from "./fake-mail.ts";
import { startFakeStripe, type FakeStripe } from "./fake-stripe.ts";
import { freePort } from "./free-port.ts";

export interface TestServer extends RunningChild {
  origin: string;
  databaseUrl: string;
}

const webhookPath = "/api/stripe-webhook";

async function answersWell(url: string): Promise<boolean> {
  try {
    return (await fetch(url, { signal: AbortSignal.timeout(2000) })).ok;
  } catch (error) {
    // Not listening yet.
    if (error instanceof Error) return false;
    throw error;
  }
}

/**
 * Starts the server as a process of its own on a free port and waits for /readyz. It gets the database of
 * DATABASE_URL in `env`, else a new one. Without fakes in `env` its mail and payments reach nobody.
 */
export async function startServer(env: Record<string, string> = {}): Promise<TestServer> {
  const port = env["PORT"] ?? String(await freePort());
  const origin = `http://127.0.0.1:${port}`;
  const databaseUrl = env["DATABASE_URL"] ?? (await createTestDatabase()).url;
  const child = await startChild({
    name: "server",
    file: "server/main.ts",
    env: {
      NODE_ENV: "test",
      LOG_LEVEL: "info",
      HOST: "127.0.0.1",
      PORT: port,
      PUBLIC_ORIGIN: origin,
      DATABASE_URL: databaseUrl,
      DATABASE_POOL: "5",
      SESSION_SECRET: "a-session-secret-that-only-the-tests-know",
      STRIPE_SECRET_KEY: "sk_test_known_to_the_tests_only",
      STRIPE_WEBHOOK_SECRET: "whsec_known_to_the_tests_only",
      STRIPE_API_ORIGIN: "http://127.0.0.1:9",
      SMTP_URL: "smtp://127.0.0.1:9",
      MAIL_FROM: "Test Shop <orders@shop.example>",
      MIGRATE_ON_START: "0",
      DEMO: "0",
      SERVE_WEB: process.env["SERVE_WEB"] ?? "none",
      ...env,
    },
    isReady: () => answersWell(`${origin}/readyz`),
  });
  return { ...child, origin, databaseUrl };
}

export interface TestShop {
  origin: string;
  server: TestServer;
  stripe: FakeStripe;
  mail: FakeMail;
}

/** The whole shop: both fakes and a server wired to each other, with the demo shop and its accounts inside. */
export async function startShop(env: Record<string, string> = {}): Promise<TestShop> {
  const port = env["PORT"] ?? String(await freePort());
  const webhookUrl = `http://127.0.0.1:${port}${webhookPath}`;
  const [stripe, mail] = await Promise.all([startFakeStripe({ webhookUrl }), startFakeMail()]);
  const server = await startServer({
    ...stripe.serverEnvironment,
    ...mail.serverEnvironment,
    DEMO: "1",
    PORT: port,
    ...env,
  });
  return { origin: server.origin, server, stripe, mail };
}
