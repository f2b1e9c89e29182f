import { chmod, mkdir, statfs } from "node:fs/promises";
import { join } from "node:path";
import { StartFailure, say } from "./failure.mjs";
import { runProgram } from "./command.mjs";
import { isRoot } from "./administrator.mjs";
import { checkout, checkoutHash } from "./locations.mjs";

const leastFreeMegabytes = 300;

async function canEnter(user, folder) {
  const { code } = await runProgram("runuser", ["-u", user, "--", "test", "-x", folder], { cwd: "/" });
  return code === 0;
}

async function make(folder) {
  try {
    await mkdir(folder, { recursive: true });
    // Others may pass through to what is theirs, never list: the database's own user needs no more.
    await chmod(folder, 0o711);
  } catch (error) {
    if (error.code === "EACCES" || error.code === "EPERM") {
      throw new StartFailure(
        `The data folder ${folder} cannot be written by this user: start as the user who made it, or give it to this user.`,
      );
    }
    throw error;
  }
}

async function checkSpace(folder) {
  const disk = await statfs(folder);
  const free = Math.floor((disk.bavail * disk.bsize) / 1_000_000);
  if (free >= leastFreeMegabytes) return;
  throw new StartFailure(
    `The disk under ${folder} has ${free} MB free and ${leastFreeMegabytes} MB are needed: free some space and start again.`,
  );
}

const outside = (root) => `/var/lib/blockwright-${checkoutHash(root)}`;

/** Where the data of a use may lie, whether or not they are there. */
export function possibleDataFolders(use, root = checkout) {
  return [join(root, ".data", use), join(outside(root), use)];
}

/**
 * The folder that keeps everything of one use ("shop" or "test"): under .data in the checkout, or, where
 * PostgreSQL's user cannot enter the checkout, under /var/lib.
 */
export async function dataFolderFor(
  use,
  { root = checkout, databaseUser = isRoot() ? "postgres" : undefined } = {},
) {
  const inside = join(root, ".data");
  await make(inside);
  let base = inside;
  if (databaseUser !== undefined && !(await canEnter(databaseUser, inside))) {
    base = outside(root);
    await make(base);
    say(`The database's user cannot enter ${root}: data are kept in ${base}.`);
  }
  const folder = join(base, use);
  await make(folder);
  await checkSpace(folder);
  return folder;
}
