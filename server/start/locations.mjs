import { createHash } from "node:crypto";
import { resolve } from "node:path";
import { fileURLToPath } from "node:url";

/** The folder that holds package.json. */
export const checkout = resolve(fileURLToPath(new URL("../..", import.meta.url)));

/** A short name for this checkout, so that two checkouts on one machine never share data. */
export function checkoutHash(path = checkout) {
  return createHash("sha256").update(path).digest("hex").slice(0, 12);
}
