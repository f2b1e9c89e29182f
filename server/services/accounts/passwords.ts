import { readFile } from "node:fs/promises";
import { resolve } from "node:path";
import argon2 from "argon2";
import { Refusal } from "#server/services/refusal.ts";
import { ShopSettings } from "#server/models/shop-settings.ts";

/** OWASP Password Storage Cheat Sheet, argon2id: 19 MiB, two passes, one lane. */
const strength = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** PHC string of argon2id. */
export function hashPassword(password: string): Promise<string> {
  return argon2.hash(password.normalize("NFC"), strength);
}

let nobodys: Promise<string> | undefined;

/**
 * Whether the password fits. For nobody (null) it takes as long and says no, so that the time tells nothing about
 * which addresses have an account.
 */
export async function passwordFits(hash: string | null, password: string): Promise<boolean> {
  nobodys ??= hashPassword("no account has this password");
  const fits = await argon2.verify(hash ?? (await nobodys), password.normalize("NFC"));
  return fits && hash !== null;
}

let commonPasswords: Promise<ReadonlySet<string>> | undefined;

async function readCommonPasswords(): Promise<ReadonlySet<string>> {
  const text = await readFile(resolve(import.meta.dirname, "common-passwords.txt"), "utf8");
  return new Set(text.split("\n").filter((line) => line !== "" && !line.startsWith("#")));
}

/**
 * Refuses a new password that a guesser tries first: a common one, the shop's name, or the person's own name or address
 * (OWASP ASVS 5.0: 6.2.4, 6.2.11, 6.2.12). It asks for no kinds of characters.
 * @throws Refusal validation at `field`
 */
export async function checkNewPassword(
  password: string,
  owner: { name: string; email: string },
  field: string,
): Promise<void> {
  commonPasswords ??= readCommonPasswords();
  const plain = password.toLowerCase().replace(/\s/g, "");
  const settings = await ShopSettings.findOne();
  const own = [
    owner.email,
    owner.email.split("@")[0] ?? "",
    owner.name,
    settings?.name ?? "",
    settings?.email ?? "",
  ]
    .map((text) => text.toLowerCase().replace(/\s/g, ""))
    .filter((text) => text.length >= 3);
  const withoutEnd = plain.replace(/[\d!.?#*$@_-]+$/, "");
  if ((await commonPasswords).has(plain) || /^(.)\1*$/.test(plain))
    throw refusedPassword(field, "This password is one of the first that anybody would try. Choose another.");
  if (own.some((text) => plain === text || withoutEnd === text))
    throw refusedPassword(
      field,
      "A password made of your own name or address is easily guessed. Choose another.",
    );
}

function refusedPassword(path: string, message: string): Refusal {
  return new Refusal("validation", "Choose another password.", { errors: [{ path, message }] });
}
