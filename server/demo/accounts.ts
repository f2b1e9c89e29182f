import { readFileSync } from "node:fs";
import { resolve } from "node:path";
import { demoSchema } from "#shared/contracts/session.ts";

/** The demo's accounts, one for each role. The same file is read by the start command, which prints them. */
export const demoAccounts = demoSchema.parse(
  JSON.parse(readFileSync(resolve(import.meta.dirname, "../start/demo-shop.json"), "utf8")),
);
