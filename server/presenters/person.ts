import type { Person } from "#server/models/person.ts";
import type { PersonView } from "#shared/contracts/person.ts";

/** What a person is shown of themselves. */
export function presentPerson(person: Person): PersonView {
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    role: person.role,
    emailVerified: person.emailVerifiedAt !== null,
  };
}
