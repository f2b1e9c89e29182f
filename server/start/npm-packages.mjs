import { createHash } from "node:crypto";
import { readFile, writeFile } from "node:fs/promises";
import { delimiter, dirname, join } from "node:path";
import { StartFailure, say } from "./failure.mjs";
import { runProgram } from "./command.mjs";
import { readJsonFile } from "./private-file.mjs";
import { withLock } from "./lock.mjs";
import { checkout } from "./locations.mjs";

const markName = ".blockwright-lock-hash";

async function textOf(path) {
  return readFile(path, "utf8").catch((error) => {
    if (error.code === "ENOENT" || error.code === "ENOTDIR") return undefined;
    throw error;
  });
}

/** True when npm's own record of what it installed holds every package that the lock file asks for. */
function holdsAll(lock, installed) {
  if (installed?.packages === undefined) return false;
  return Object.entries(lock.packages ?? {}).every(([path, wanted]) => {
    if (path === "" || wanted.optional || wanted.devOptional || wanted.peer || wanted.link) return true;
    const there = installed.packages[path];
    return there?.version === wanted.version && there?.integrity === wanted.integrity;
  });
}

/**
 * Whether the packages under `folder` are those of its lock file: "fresh", or "missing" or "stale".
 * Nodes own version counts too, since compiled packages are made for one.
 */
export async function stateOfPackages(folder = checkout) {
  const lockText = await textOf(join(folder, "package-lock.json"));
  if (lockText === undefined)
    throw new StartFailure(`package-lock.json is missing in ${folder}: the checkout is not whole.`);
  const hash = createHash("sha256").update(`${process.versions.modules}\n${lockText}`).digest("hex");
  const modules = join(folder, "node_modules");
  const installed = await readJsonFile(join(modules, ".package-lock.json"));
  if (installed === undefined) return { state: "missing", hash };
  if ((await textOf(join(modules, markName)))?.trim() === hash) return { state: "fresh", hash };
  return { state: holdsAll(JSON.parse(lockText), installed) ? "fresh-unmarked" : "stale", hash };
}

const causes = [
  [/ENOSPC/, "the disk is full"],
  [
    /ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ECONNRESET|ETIMEDOUT|ENETUNREACH|ERR_SOCKET_TIMEOUT/i,
    "the package registry cannot be reached",
  ],
  [/EACCES|EPERM/, "this user may not write the checkout"],
  [/in sync/, "package.json and package-lock.json do not agree"],
];

function causeOf(output) {
  const known = causes.find(([pattern]) => pattern.test(output));
  if (known !== undefined) return known[1];
  const line = output.split("\n").find((text) => text.startsWith("npm error "));
  return line?.slice("npm error ".length) ?? "npm gave no reason";
}

/**
 * Installs what the lock file asks for when it is missing or stale; NODE_ENV=production leaves nothing out. No
 * package runs a script: those that have one bring their programs ready made, and a bare machine has no compiler.
 */
export async function ensurePackages() {
  await withLock(`packages ${checkout}`, async () => {
    const { state, hash } = await stateOfPackages();
    if (state === "fresh") return;
    if (state !== "fresh-unmarked") {
      say(`The npm packages are ${state}: installing them, which takes about a minute ...`);
      const env = {
        ...process.env,
        PATH: `${dirname(process.execPath)}${delimiter}${process.env.PATH ?? ""}`,
      };
      const args = ["ci", "--include=dev", "--ignore-scripts", "--no-audit", "--no-fund", "--loglevel=error"];
      const { code, stderr } = await runProgram("npm", args, { cwd: checkout, env });
      if (code !== 0) throw new StartFailure(`The npm packages could not be installed: ${causeOf(stderr)}.`);
    }
    await writeFile(join(checkout, "node_modules", markName), `${hash}\n`);
  });
}
