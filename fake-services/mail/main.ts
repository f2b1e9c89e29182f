import { once } from "node:events";
import { createServer, type Server } from "node:http";
import type { Server as PlainServer } from "node:net";
import { z } from "zod";
import { Mailbox } from "./mailbox.ts";
import { createSmtpServer } from "./smtp.ts";
import { createMailboxApp } from "./web.ts";

const port = z.coerce.number().int().min(0).max(65535).default(0);
const settings = z
  .object({
    FAKE_MAIL_SMTP_PORT: port,
    FAKE_MAIL_HTTP_PORT: port,
    FAKE_MAIL_STATE_FILE: z.string().min(1).optional(),
  })
  .parse(process.env);

function portOf(server: Server | PlainServer): number {
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("The server listens on no port");
  return address.port;
}

const mailbox = new Mailbox(settings.FAKE_MAIL_STATE_FILE);
const smtp = createSmtpServer(mailbox);
smtp.on("error", (error: Error) => {
  // A sender that hangs up is no reason to end; a port that cannot be had is.
  if (smtp.server.listening) return;
  process.stderr.write(`The mail fake cannot listen: ${error.message}\n`);
  process.exit(1);
});
const web = createServer(createMailboxApp(mailbox));

smtp.listen(settings.FAKE_MAIL_SMTP_PORT, "127.0.0.1");
web.listen(settings.FAKE_MAIL_HTTP_PORT, "127.0.0.1");
await Promise.all([once(smtp.server, "listening"), once(web, "listening")]);
process.stdout.write(
  `${JSON.stringify({ ready: true, smtpPort: portOf(smtp.server), httpPort: portOf(web) })}\n`,
);

function stop(): void {
  web.close();
  web.closeAllConnections();
  smtp.close(() => process.exit(0));
}
process.on("SIGTERM", stop);
process.on("SIGINT", stop);
