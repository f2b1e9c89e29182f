import { access, constants } from "node:fs/promises";
import { StartFailure } from "./failure.mjs";
import { installDebianPackage } from "./debian-package.mjs";

const program = "/usr/bin/chromium";

async function runnable() {
  return access(program, constants.X_OK).then(
    () => true,
    () => false,
  );
}

/** Browser tests run in Debian's Chromium; not to have it is a failure, never a reason to skip them. */
export async function ensureChromium() {
  if (await runnable()) return program;
  await installDebianPackage("chromium", "Chromium");
  if (await runnable()) return program;
  throw new StartFailure(`Debian's package chromium is installed but ${program} cannot be run.`);
}
