import { randomUUID } from "node:crypto";
import { transaction } from "#server/database/transaction.ts";
import { queueEmail } from "#server/emails/queue-email.ts";
import { inEvenTime } from "./even-time.ts";
import { findPersonByEmail } from "./find-person.ts";

/** Mails a link to set a new password, if the address has an account. It does not say whether it has. */
export async function askForReset(email: string): Promise<void> {
  await inEvenTime(() =>
    transaction(async () => {
      const person = await findPersonByEmail(email);
      if (!person || person.disabledAt !== null) return;
      await queueEmail({
        kind: "reset-password",
        to: { name: person.name, address: person.email },
        personId: person.id,
        data: { name: person.name },
        eventKey: `reset-password:${randomUUID()}`,
      });
    }),
  );
}
