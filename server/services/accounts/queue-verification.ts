import { randomUUID } from "node:crypto";
import { queueEmail } from "#server/emails/queue-email.ts";
import type { Person } from "#server/models/person.ts";

/** Mails a link to confirm a person's address, within the caller's transaction. Nothing for one that is confirmed. */
export async function queueVerification(person: Person): Promise<void> {
  if (person.emailVerifiedAt !== null) return;
  await queueEmail({
    kind: "verify-address",
    to: { name: person.name, address: person.email },
    personId: person.id,
    data: { name: person.name },
    eventKey: `verify-address:${randomUUID()}`,
  });
}
