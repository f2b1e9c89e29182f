import { createInterface } from "node:readline/promises";
import { Writable } from "node:stream";
import { z } from "zod";
import { startSentence } from "#server/start-sentence.ts";
import { newPasswordSchema } from "#shared/contracts/account.ts";
import { emailAddressSchema, personNameSchema, roleSchema } from "#shared/contracts/person.ts";

/**
 * Makes an account from the command line, for the first person of a shop: npm run account -- create office
 * It asks for what ACCOUNT_NAME, ACCOUNT_EMAIL and ACCOUNT_PASSWORD do not say. A password is never an argument,
 * where every user of the machine could read it.
 */
const wantedSchema = z.object({
  name: personNameSchema,
  email: emailAddressSchema,
  password: newPasswordSchema,
  role: roleSchema,
});

const usage = `Say: npm run account -- create ${roleSchema.options.join("|")}`;

async function ask(question: string, hidden = false): Promise<string> {
  let muted = false;
  const output = new Writable({
    write: (chunk: Buffer, _encoding, done) => {
      if (!muted) process.stdout.write(chunk);
      done();
    },
  });
  const lines = createInterface({ input: process.stdin, output, terminal: process.stdin.isTTY });
  try {
    const answer = lines.question(question);
    muted = hidden;
    return await answer;
  } finally {
    lines.close();
    if (hidden) process.stdout.write("\n");
  }
}

async function run(): Promise<void> {
  const [verb, role] = process.argv.slice(2);
  const parsedRole = roleSchema.safeParse(role);
  if (verb !== "create" || !parsedRole.success) throw new Error(usage);
  const answers = {
    role: parsedRole.data,
    name: process.env["ACCOUNT_NAME"] ?? (await ask("Name: ")),
    email: process.env["ACCOUNT_EMAIL"] ?? (await ask("E-mail address: ")),
    password: process.env["ACCOUNT_PASSWORD"] ?? (await ask("Password (not shown): ", true)),
  };
  const wanted = wantedSchema.safeParse(answers);
  if (!wanted.success) throw new Error(wanted.error.issues.map((issue) => issue.message).join(" "));

  const { checkNewPassword } = await import("#server/services/accounts/passwords.ts");
  const { createPerson } = await import("#server/services/accounts/create-person.ts");
  const { sequelize } = await import("#server/database/connection.ts");
  try {
    await checkNewPassword(wanted.data.password, wanted.data, "password");
    await createPerson(wanted.data);
  } finally {
    await sequelize.close();
  }
  process.stdout.write(`${wanted.data.email} may sign in as ${wanted.data.role}.\n`);
}

try {
  await run();
} catch (error) {
  const isOurs = error instanceof Error && (error.name === "Error" || error.name === "Refusal");
  process.stderr.write(`${isOurs ? error.message : startSentence(error)}\n`);
  process.exitCode = 1;
}
