import { transaction } from "#server/database/transaction.ts";
import { Person } from "#server/models/person.ts";
import { Session } from "#server/models/session.ts";

/** Shuts an account: all its sessions end at once and it can no longer sign in. */
export async function disablePerson(personId: string): Promise<void> {
  await transaction(async () => {
    const now = new Date();
    await Person.update({ disabledAt: now, sessionsValidFrom: now }, { where: { id: personId } });
    await Session.destroy({ where: { personId } });
  });
}
