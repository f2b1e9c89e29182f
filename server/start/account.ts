import { createInterface } from "node:readline/promises";
import { Writable } from "node:stream";
import { z } from "zod";
import { startSentence } from "#server/start-sentence.ts";
import { newPasswordSchema } from "#shared/contracts/account.ts";
import { emailAddressSchema, personNameSchema, roleSchema } from "#shared/contracts/person.ts";

/**
 * Accounts from the command line: `npm run account -- create office` for the first person of a shop, and
 * `npm run account -- disable name@shop.example` to shut one. Creating asks for what ACCOUNT_NAME, ACCOUNT_EMAIL and
 * ACCOUNT_PASSWORD do not say; a password is never an argument, where every user of the machine could read it.
 */
const wantedSchema = z.object({
  name: personNameSchema,
  email: emailAddressSchema,
  password: newPasswordSchema,
  role: roleSchema,
});

const usage = `Say: npm run account -- create ${roleSchema.options.join("|")}
 or: npm run account -- disable name@shop.example`;

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

async function create(role: string | undefined): Promise<string> {
  const parsedRole = roleSchema.safeParse(role);
  if (!parsedRole.success) throw new Error(usage);
  const answers = {
    role: parsedRole.data,
    name: process.env["ACCOUNT_NAME"] ?? (await ask("Name: ")),
    email: process.env["ACCOUNT_EMAIL"] ?? (await ask("E-mail address: ")),
    password: process.env["ACCOUNT_PASSWORD"] ?? (await ask("Password (not shown): ", true)),
  };
  const wanted = wantedSchema.safeParse(answers);
  if (!wanted.success) throw new Error(wanted.error.issues.map((issue) => issue.message).join(" "));
  // Loaded here: only now is the environment needed.
  const { checkNewPassword } = await import("#server/services/accounts/passwords.ts");
  const { createPerson } = await import("#server/services/accounts/create-person.ts");
  await checkNewPassword(wanted.data.password, wanted.data, "password");
  await createPerson(wanted.data);
  return `${wanted.data.email} may sign in as ${wanted.data.role}.`;
}

async function disable(email: string | undefined): Promise<string> {
  if (email === undefined) throw new Error(usage);
  const { disablePerson } = await import("#server/services/accounts/disable-person.ts");
  const { findPersonByEmail } = await import("#server/services/accounts/find-person.ts");
  const person = await findPersonByEmail(email);
  if (!person) throw new Error(`There is no account with the address ${email}.`);
  await disablePerson(person.id);
  return `The account of ${person.email} is shut; its sessions have ended.`;
}

async function run(): Promise<void> {
  const [verb, argument] = process.argv.slice(2);
  if (verb !== "create" && verb !== "disable") throw new Error(usage);
  const done = verb === "create" ? await create(argument) : await disable(argument);
  const { sequelize } = await import("#server/database/connection.ts");
  await sequelize.close();
  process.stdout.write(`${done}\n`);
}

try {
  await run();
} catch (error) {
  const isOurs = error instanceof Error && ["Error", "Refusal"].includes(error.name) && !("code" in error);
  process.stderr.write(`${isOurs ? error.message : startSentence(error)}\n`);
  process.exit(1);
}
