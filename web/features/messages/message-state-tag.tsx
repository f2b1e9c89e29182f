import { StatusTag } from "#web/components/status-tag.tsx";
import type { MessageSummary } from "#shared/contracts/messages.ts";

/** Sent, waiting, or held up by an error and tried again. */
export function MessageStateTag({ message }: { message: MessageSummary }) {
  if (message.state === "sent") return <StatusTag kind="pass">Sent</StatusTag>;
  if (message.lastError !== null) return <StatusTag kind="caution">Held up</StatusTag>;
  return <StatusTag kind="waiting">Waiting</StatusTag>;
}
