import { Person } from "#server/models/person.ts";

/** The person of a session; null when they are disabled or the session began before their sessions were ended. */
export async function findSignedIn(personId: string, signedInAt: number): Promise<Person | null> {
  const person = await Person.findByPk(personId);
  if (person === null || person.disabledAt !== null) return null;
  return signedInAt < person.sessionsValidFrom.getTime() ? null : person;
}
