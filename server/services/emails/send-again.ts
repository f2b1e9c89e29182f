import { transaction } from "#server/database/transaction.ts";
import { newMessageId } from "#server/emails/message-id.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { Email } from "#server/models/email.ts";
import { Refusal } from "#server/services/refusal.ts";

/**
 * Queues a message once more, with a new link where it has one. One that still waits is tried at once and keeps its
 * Message-ID; one that was sent gets a new one, for mail programs hide what they have seen.
 * @throws Refusal not-found
 */
export async function sendAgain(emailId: string): Promise<Email> {
  return transaction(async () => {
    const email = await Email.findByPk(emailId, { lock: true });
    if (!email) throw new Refusal("not-found", "There is no such message.");
    if (email.state === "sent") await email.update({ state: "waiting", messageId: newMessageId() });
    await enqueue("send-email", { emailId });
    return email;
  });
}
