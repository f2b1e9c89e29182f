import { readFile } from "node:fs/promises";
import { join } from "node:path";

/** The line with which a fake says that it listens, once it stands whole in its log. */
async function readyLine(logFile) {
  const text = await readFile(logFile, "utf8");
  const line = text
    .split("\n")
    .find((candidate, index, all) => index < all.length - 1 && candidate.startsWith('{"ready":true'));
  return line === undefined ? undefined : JSON.parse(line);
}

/** Starts the stand-ins for the payment service and for the mail server, each a process of its own. */
export async function startFakes(supervision, { dataFolder, ports, secrets, webhookUrl }) {
  const stripe = await supervision.start(
    "payment fake",
    ["--import", "tsx", "fake-services/stripe/main.ts"],
    {
      ...process.env,
      FAKE_STRIPE_PORT: String(ports.stripe),
      FAKE_STRIPE_SECRET_KEY: secrets.stripeSecretKey,
      FAKE_STRIPE_WEBHOOK_SECRET: secrets.stripeWebhookSecret,
      FAKE_STRIPE_WEBHOOK_URL: webhookUrl,
      FAKE_STRIPE_STATE_FILE: join(dataFolder, "payments.json"),
    },
  );
  const mail = await supervision.start("mail fake", ["--import", "tsx", "fake-services/mail/main.ts"], {
    ...process.env,
    FAKE_MAIL_SMTP_PORT: String(ports.smtp),
    FAKE_MAIL_HTTP_PORT: String(ports.mailbox),
    FAKE_MAIL_STATE_FILE: join(dataFolder, "mailbox.json"),
  });
  await Promise.all(
    [stripe, mail].map(({ name, logFile }) => supervision.until(name, () => readyLine(logFile))),
  );
  return {
    stripeOrigin: `http://127.0.0.1:${ports.stripe}`,
    smtpUrl: `smtp://127.0.0.1:${ports.smtp}`,
    mailboxUrl: `http://127.0.0.1:${ports.mailbox}`,
  };
}
