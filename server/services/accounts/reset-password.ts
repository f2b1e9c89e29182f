import { transaction } from "#server/database/transaction.ts";
import { Person } from "#server/models/person.ts";
import { findToken } from "#server/services/tokens/find-token.ts";
import type { ResetRequest } from "#shared/contracts/account.ts";
import { checkNewPassword, hashPassword } from "./passwords.ts";
import { setPassword } from "./set-password.ts";
import { endedLink } from "./verify-email.ts";

/**
 * Sets a new password with a mailed link, which is used up by it. Whoever has the link has the mailbox, so the address
 * counts as confirmed.
 * @throws Refusal validation for a link that is no longer good, or a password that is easily guessed
 */
export async function resetPassword({ token, password }: ResetRequest): Promise<void> {
  const passwordHash = await hashPassword(password);
  await transaction(async () => {
    const access = await findToken("reset-password", token);
    if (!access?.personId) throw endedLink("Ask for a new one on the page “Forgot password”.");
    const person = await Person.findByPk(access.personId, { lock: true, rejectOnEmpty: true });
    if (person.disabledAt !== null) throw endedLink("Ask the shop.");
    await checkNewPassword(password, person, "password");
    const now = new Date();
    await access.update({ usedAt: now });
    await setPassword(person, passwordHash, { emailVerifiedAt: person.emailVerifiedAt ?? now });
  });
}
