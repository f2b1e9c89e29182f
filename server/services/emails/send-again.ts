import { transaction } from "#server/database/transaction.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { Email } from "#server/models/email.ts";
import { Refusal } from "#server/services/refusal.ts";

/**
 * Queues a message once more, with a new link where it has one and the Message-ID it always had; one that still waits
 * is tried at once.
 * @throws Refusal not-found
 */
export async function sendAgain(emailId: string): Promise<Email> {
  return transaction(async () => {
    const email = await Email.findByPk(emailId, { lock: true });
    if (!email) throw new Refusal("not-found", "There is no such message.");
    await email.update({ state: "waiting" });
    await enqueue("send-email", { emailId });
    return email;
  });
}
