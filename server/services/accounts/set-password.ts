import { randomUUID } from "node:crypto";
import { queueEmail } from "#server/emails/queue-email.ts";
import type { Person } from "#server/models/person.ts";
import { Session } from "#server/models/session.ts";
import { revokeTokens } from "#server/services/tokens/revoke-tokens.ts";

/**
 * Sets a person's password within the caller's transaction: every session and every reset link of theirs ends, and
 * they are told by e-mail.
 */
export async function setPassword(
  person: Person,
  passwordHash: string,
  values: { emailVerifiedAt?: Date } = {},
): Promise<void> {
  await person.update({ ...values, passwordHash, sessionsValidFrom: new Date() });
  await Session.destroy({ where: { personId: person.id } });
  await revokeTokens("reset-password", { personId: person.id });
  await queueEmail({
    kind: "password-changed",
    to: { name: person.name, address: person.email },
    personId: person.id,
    data: { name: person.name },
    eventKey: `password-changed:${randomUUID()}`,
  });
}
