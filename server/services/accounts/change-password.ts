import { transaction } from "#server/database/transaction.ts";
import { Person } from "#server/models/person.ts";
import { countTry, forgetTries } from "#server/services/rate-limits.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { ChangePasswordRequest } from "#shared/contracts/account.ts";
import { checkNewPassword, hashPassword, passwordFits } from "./passwords.ts";
import { setPassword } from "./set-password.ts";

/**
 * Changes the password of somebody who knows the present one. All sessions end; the caller signs this one in anew.
 * @throws Refusal validation for a wrong present or an easily guessed new password, too-many-requests
 */
export async function changePassword(personId: string, request: ChangePasswordRequest): Promise<Person> {
  await countTry("password by account", personId);
  const person = await Person.findByPk(personId, { rejectOnEmpty: true });
  if (!(await passwordFits(person.passwordHash, request.currentPassword))) {
    throw new Refusal("validation", "The present password is not right.", {
      errors: [{ path: "currentPassword", message: "This is not your present password." }],
    });
  }
  await forgetTries("password by account", personId);
  await checkNewPassword(request.newPassword, person, "newPassword");
  const passwordHash = await hashPassword(request.newPassword);
  return transaction(async () => {
    const locked = await Person.findByPk(personId, { lock: true, rejectOnEmpty: true });
    await setPassword(locked, passwordHash);
    return locked;
  });
}
