import { transaction } from "#server/database/transaction.ts";
import { Person } from "#server/models/person.ts";
import { queueVerification } from "./queue-verification.ts";

/** Mails the link once more that confirms the person's address. */
export async function resendVerification(personId: string): Promise<void> {
  await transaction(async () => {
    await queueVerification(await Person.findByPk(personId, { rejectOnEmpty: true }));
  });
}
