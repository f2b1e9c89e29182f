import { randomBytes } from "node:crypto";
import { join } from "node:path";
import { readJsonFile, writePrivateFile } from "./private-file.mjs";

const makers = {
  databasePassword: () => randomBytes(24).toString("hex"),
  sessionSecret: () => randomBytes(48).toString("base64url"),
  stripeSecretKey: () => `sk_test_${randomBytes(24).toString("hex")}`,
  stripeWebhookSecret: () => `whsec_${randomBytes(24).toString("hex")}`,
};

/** The secrets of a data folder: made once, kept in a file that only its owner reads. */
export async function secretsOf(dataFolder) {
  const path = join(dataFolder, "secrets.json");
  const kept = (await readJsonFile(path)) ?? {};
  const missing = Object.keys(makers).filter((name) => typeof kept[name] !== "string");
  if (missing.length === 0) return kept;
  const secrets = { ...kept, ...Object.fromEntries(missing.map((name) => [name, makers[name]()])) };
  await writePrivateFile(path, `${JSON.stringify(secrets, null, 2)}\n`);
  return secrets;
}
