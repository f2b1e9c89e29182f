import { log } from "#server/log.ts";
import type { Person } from "#server/models/person.ts";
import { countTry, forgetTries, forgiveTry } from "#server/services/rate-limits.ts";
import { findPersonByEmail } from "./find-person.ts";
import { passwordFits } from "./passwords.ts";

/**
 * The person whose address and password these are; null when they are nobody's, or the account is disabled. Every try
 * is counted before it is looked at, by account and network address and by network address alone.
 * @throws Refusal too-many-requests
 */
export async function checkSignIn(email: string, password: string, address: string): Promise<Person | null> {
  const account = `${email} from ${address}`;
  await countTry("sign-in by address", address);
  await countTry("sign-in by account and address", account);
  const person = await findPersonByEmail(email);
  const fits = await passwordFits(person?.passwordHash ?? null, password);
  const isWelcome = person !== null && fits && person.disabledAt === null;
  log.info({ personId: person?.id ?? null, address, success: isWelcome }, "sign-in");
  if (!isWelcome) return null;
  await forgetTries("sign-in by account and address", account);
  await forgiveTry("sign-in by address", address);
  return person;
}
