import { z } from "zod";
import { messageSchema, type ControlMode, type StoredMessage } from "#fake-services/mail/message.ts";
import { startChild, type RunningChild } from "./child-process.ts";
import { parseReadyLine } from "./fake-stripe.ts";
import { freePort } from "./free-port.ts";

export interface FakeMail extends RunningChild {
  /** Of the page that lists the messages. */
  origin: string;
  smtpUrl: string;
  /** The settings that point a server at this fake. */
  serverEnvironment: Record<string, string>;
  /** Messages that came in, oldest first, all or those to one address. */
  messages: (to?: string) => Promise<StoredMessage[]>;
  /** Waits until a message to this address whose subject matches has come, and answers the latest. */
  waitForMessage: (to: string, subject?: RegExp, milliseconds?: number) => Promise<StoredMessage>;
  clear: () => Promise<void>;
  control: (mode: ControlMode) => Promise<void>;
}

const readyLine = z.object({ ready: z.literal(true), smtpPort: z.number(), httpPort: z.number() });
const listSchema = z.array(messageSchema);

async function call(url: string, init?: RequestInit): Promise<Response> {
  const response = await fetch(url, init);
  if (!response.ok) throw new Error(`${url} answered ${String(response.status)}: ${await response.text()}`);
  return response;
}

/** Starts the mail fake; in server tests it listens where the file's own environment points. */
export async function startFakeMail(
  options: { stateFile?: string; smtpPort?: number } = {},
): Promise<FakeMail> {
  const named = process.env["SMTP_URL"];
  const smtpPort = options.smtpPort ?? (named === undefined ? await freePort() : Number(new URL(named).port));
  const httpPort = await freePort();
  const child = await startChild({
    name: "mail fake",
    file: "fake-services/mail/main.ts",
    env: {
      FAKE_MAIL_SMTP_PORT: String(smtpPort),
      FAKE_MAIL_HTTP_PORT: String(httpPort),
      ...(options.stateFile === undefined ? {} : { FAKE_MAIL_STATE_FILE: options.stateFile }),
    },
    isReady: (output) => parseReadyLine(readyLine, output) !== undefined,
  });
  const origin = `http://127.0.0.1:${String(httpPort)}`;
  const smtpUrl = `smtp://127.0.0.1:${String(smtpPort)}`;
  const messages = async (to?: string): Promise<StoredMessage[]> => {
    const query = to === undefined ? "" : `?to=${encodeURIComponent(to)}`;
    const response = await call(`${origin}/messages${query}`, { headers: { accept: "application/json" } });
    return listSchema.parse(await response.json());
  };
  return {
    ...child,
    origin,
    smtpUrl,
    serverEnvironment: { SMTP_URL: smtpUrl, MAILBOX_URL: origin },
    messages,
    waitForMessage: async (to, subject = /./, milliseconds = 20_000) => {
      const deadline = Date.now() + milliseconds;
      for (;;) {
        const found = (await messages(to)).filter((message) => subject.test(message.subject)).at(-1);
        if (found !== undefined) return found;
        if (Date.now() > deadline)
          throw new Error(`No message to ${to} with a subject like ${String(subject)} came`);
        await new Promise((resolve) => setTimeout(resolve, 100));
      }
    },
    clear: async () => {
      await call(`${origin}/messages`, { method: "DELETE" });
    },
    control: async (mode) => {
      await call(`${origin}/control`, {
        method: "POST",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ mode }),
      });
    },
  };
}
