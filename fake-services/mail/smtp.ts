import type { Socket } from "node:net";
import { simpleParser, type ParsedMail } from "mailparser";
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from "smtp-server";
import type { Mailbox } from "./mailbox.ts";

const largestMessage = 10 * 1024 * 1024;

class TryAgainLater extends Error {
  readonly responseCode = 451;
}

function headersOf(mail: ParsedMail): Record<string, string> {
  const headers: Record<string, string> = {};
  for (const { key, line } of mail.headerLines) headers[key] = line.slice(line.indexOf(":") + 1).trim();
  return headers;
}

async function receive(
  mailbox: Mailbox,
  stream: SMTPServerDataStream,
  session: SMTPServerSession,
): Promise<void> {
  const mail = await simpleParser(stream, { skipTextToHtml: true, skipImageLinks: true });
  if (mail.messageId === undefined) throw new Error("The message has no Message-ID");
  mailbox.add({
    messageId: mail.messageId,
    from: mail.from?.text ?? "",
    to: session.envelope.rcptTo.map((recipient) => recipient.address),
    subject: mail.subject ?? "",
    text: mail.text ?? "",
    html: typeof mail.html === "string" ? mail.html : null,
    headers: headersOf(mail),
  });
}

/** A mail server without encryption or sign-in, for this machine only. */
export function createSmtpServer(mailbox: Mailbox): SMTPServer {
  const sockets = new Map<number, Socket>();
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    disableReverseLookup: true,
    size: largestMessage,
    closeTimeout: 500,
    onData(stream, session, callback) {
      const mode = mailbox.takeMode();
      if (mode === "refuse") {
        stream.resume();
        stream.once("end", () => {
          callback(new TryAgainLater("Not now, try again later"));
        });
        return;
      }
      receive(mailbox, stream, session).then(
        () => {
          if (mode === "drop-after-data") sockets.get(session.remotePort)?.destroy();
          else callback();
        },
        (error: unknown) => {
          callback(error instanceof Error ? error : new Error(String(error)));
        },
      );
    },
  });
  server.server.on("connection", (socket: Socket) => {
    const port = socket.remotePort;
    if (port === undefined) return;
    sockets.set(port, socket);
    socket.once("close", () => sockets.delete(port));
  });
  return server;
}
