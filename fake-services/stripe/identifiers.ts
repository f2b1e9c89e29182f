import { randomBytes } from "node:crypto";

const LETTERS = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789";

/** A random identifier with the prefix of its kind, such as `pi_3kT...`. */
export function newId(prefix: string, length = 24): string {
  const letters = [...randomBytes(length)].map((byte) => LETTERS[byte % LETTERS.length] ?? "0");
  return `${prefix}_${letters.join("")}`;
}
