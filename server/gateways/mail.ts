import { createTransport } from "nodemailer";
import { config } from "#server/config.ts";

export interface OutgoingMail {
  messageId: string;
  to: { name: string; address: string };
  subject: string;
  text: string;
  html: string;
}

const transport = createTransport({
  url: config.SMTP_URL,
  connectionTimeout: 10_000,
  greetingTimeout: 10_000,
  socketTimeout: 20_000,
  disableFileAccess: true,
  disableUrlAccess: true,
});

/**
 * Hands one message to the mail server.
 * @throws Error when it could not be reached or did not take the message
 */
export async function sendMail(mail: OutgoingMail): Promise<void> {
  await transport.sendMail({
    from: config.MAIL_FROM,
    to: mail.to,
    subject: mail.subject,
    text: mail.text,
    html: mail.html,
    messageId: mail.messageId,
    headers: { "Auto-Submitted": "auto-generated" },
  });
}
