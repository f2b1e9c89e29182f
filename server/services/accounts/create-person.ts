import { transaction } from "#server/database/transaction.ts";
import { Person } from "#server/models/person.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { Role } from "#shared/contracts/person.ts";
import { findPersonByEmail } from "./find-person.ts";
import { hashPassword } from "./passwords.ts";

/**
 * Makes an account of any role with an address that is taken as confirmed; for the command line and the demo shop.
 * @throws Refusal conflict when the address has an account
 */
export async function createPerson(wanted: {
  name: string;
  email: string;
  password: string;
  role: Role;
}): Promise<Person> {
  const passwordHash = await hashPassword(wanted.password);
  return transaction(async () => {
    if (await findPersonByEmail(wanted.email))
      throw new Refusal("conflict", `There is an account with the address ${wanted.email} already.`);
    const { name, email, role } = wanted;
    return Person.create({ name, email, role, passwordHash, emailVerifiedAt: new Date() });
  });
}
