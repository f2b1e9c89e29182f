import { randomUUID } from "node:crypto";
import { config } from "#server/config.ts";

/** A new Message-ID of the sender's domain. It stays with a message through every try to send it. */
export function newMessageId(): string {
  const domain = /@([^\s@<>]+)>?\s*$/.exec(config.MAIL_FROM)?.[1] ?? new URL(config.PUBLIC_ORIGIN).hostname;
  return `<${randomUUID()}@${domain}>`;
}
