import { createTestDatabase } from "./database.ts";
import { freePort } from "./free-port.ts";

// Set before the test file imports anything of server/, which reads its environment once.
const database = await createTestDatabase();

Object.assign(process.env, {
  NODE_ENV: "test",
  LOG_LEVEL: "silent",
  DATABASE_URL: database.url,
  DATABASE_POOL: "5",
  PUBLIC_ORIGIN: "http://127.0.0.1:4700",
  SERVE_WEB: "none",
  SESSION_SECRET: "a-session-secret-that-only-the-tests-know",
  STRIPE_SECRET_KEY: "sk_test_known_to_the_tests_only",
  STRIPE_WEBHOOK_SECRET: "whsec_known_to_the_tests_only",
  // Nobody listens there until the file calls startFakeStripe() or startFakeMail().
  STRIPE_API_ORIGIN: `http://127.0.0.1:${String(await freePort())}`,
  SMTP_URL: `smtp://127.0.0.1:${String(await freePort())}`,
  MAIL_FROM: "Test Shop <orders@shop.example>",
});
