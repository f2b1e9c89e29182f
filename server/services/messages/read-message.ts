import { Email } from "#server/models/email.ts";
import { Refusal } from "#server/services/refusal.ts";
import { type MessageRecord, withOrderNumbers } from "./list-messages.ts";

/** @throws Refusal not-found */
export async function readMessage(id: string): Promise<MessageRecord> {
  const email = await Email.findByPk(id);
  const [record] = email ? await withOrderNumbers([email]) : [];
  if (!record) throw new Refusal("not-found", "There is no such message.");
  return record;
}
