import { randomUUID } from "node:crypto";
import { UniqueConstraintError } from "sequelize";
import { transaction } from "#server/database/transaction.ts";
import { queueEmail } from "#server/emails/queue-email.ts";
import { Person } from "#server/models/person.ts";
import type { RegisterRequest } from "#shared/contracts/account.ts";
import { inEvenTime } from "./even-time.ts";
import { findPersonByEmail } from "./find-person.ts";
import { checkNewPassword, hashPassword } from "./passwords.ts";
import { queueVerification } from "./queue-verification.ts";

/**
 * Makes a customer's account and mails a link to confirm its address. An address that has an account gets a message
 * that says so instead, and whoever asks learns nothing of it.
 * @throws Refusal validation for a password that is easily guessed
 */
export async function register(request: RegisterRequest): Promise<void> {
  await checkNewPassword(request.password, request, "password");
  await inEvenTime(async () => {
    const passwordHash = await hashPassword(request.password);
    try {
      await transaction(() => write(request, passwordHash));
    } catch (error) {
      // Two at once with one address: the other was quicker, and this one now finds the account.
      if (!(error instanceof UniqueConstraintError)) throw error;
      await transaction(() => write(request, passwordHash));
    }
  });
}

async function write(request: RegisterRequest, passwordHash: string): Promise<void> {
  const existing = await findPersonByEmail(request.email);
  if (existing) {
    await queueEmail({
      kind: "account-exists",
      to: { name: existing.name, address: existing.email },
      personId: existing.id,
      data: { name: existing.name },
      eventKey: `account-exists:${randomUUID()}`,
    });
    return;
  }
  const person = await Person.create({
    name: request.name,
    email: request.email,
    role: "customer",
    passwordHash,
  });
  await queueVerification(person);
}
