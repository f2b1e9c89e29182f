import { checkNodeVersion } from "./node-version.mjs";
import { ensurePackages } from "./npm-packages.mjs";
import { ensurePostgres } from "./postgres-package.mjs";

/** What every use of the program needs before anything else: Node.js, the npm packages, PostgreSQL. */
export async function prepareMachine() {
  checkNodeVersion();
  await ensurePackages();
  await ensurePostgres();
}
