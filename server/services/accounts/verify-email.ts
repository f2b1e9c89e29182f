import { transaction } from "#server/database/transaction.ts";
import { Person } from "#server/models/person.ts";
import { Refusal } from "#server/services/refusal.ts";
import { findToken } from "#server/services/tokens/find-token.ts";
import { revokeTokens } from "#server/services/tokens/revoke-tokens.ts";

/**
 * Confirms the address that a mailed link was sent to.
 * @throws Refusal validation for a link that was used or has run out
 */
export async function verifyEmail(token: string): Promise<void> {
  await transaction(async () => {
    const access = await findToken("verify-email", token);
    if (!access?.personId) throw endedLink("Sign in to have a new one sent.");
    const now = new Date();
    await access.update({ usedAt: now });
    await revokeTokens("verify-email", { personId: access.personId });
    await Person.update({ emailVerifiedAt: now }, { where: { id: access.personId, emailVerifiedAt: null } });
  });
}

/** What the page of a mailed link says when the link is no longer good. */
export function endedLink(next: string): Refusal {
  const message = `This link was used already or is too old. ${next}`;
  return new Refusal("validation", message, { errors: [{ path: "token", message }] });
}
