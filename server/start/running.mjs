import { join } from "node:path";
import { pause, recordOf, stillRuns } from "./alive.mjs";
import { StartFailure } from "./failure.mjs";
import { withLock } from "./lock.mjs";
import { readJsonFile, writePrivateFile } from "./private-file.mjs";

const fileOf = (dataFolder) => join(dataFolder, "running.json");

function signalIfThere(processId, signal) {
  try {
    process.kill(processId, signal);
  } catch (error) {
    if (error.code !== "ESRCH") throw error;
  }
}

async function endLeftOver(child) {
  if (!(await stillRuns(child))) return;
  signalIfThere(child.pid, "SIGTERM");
  const deadline = Date.now() + 10_000;
  while (await stillRuns(child)) {
    if (Date.now() > deadline) signalIfThere(child.pid, "SIGKILL");
    await pause(100);
  }
}

/**
 * Refuses to go on while a first start runs on this data folder; what a killed one left running is ended.
 * The database is not among it: it is found by its own pid file and used.
 */
export async function checkNotRunning(dataFolder) {
  const record = await readJsonFile(fileOf(dataFolder));
  if (record === undefined) return;
  if (await stillRuns(record)) {
    throw new StartFailure(
      `Blockwright is running already at ${record.address} (process ${record.pid}): use that one, or stop it with Ctrl-C where it was started.`,
    );
  }
  for (const child of record.children ?? []) await endLeftOver(child);
}

/** Writes down that this process runs the product here, unless another does. Answers how to note its children. */
export async function claimDataFolder(dataFolder, address) {
  const own = { ...(await recordOf(process.pid)), address, children: [] };
  await withLock(fileOf(dataFolder), async () => {
    await checkNotRunning(dataFolder);
    await writePrivateFile(fileOf(dataFolder), JSON.stringify(own));
  });
  return {
    async addChild(processId) {
      own.children.push(await recordOf(processId));
      await writePrivateFile(fileOf(dataFolder), JSON.stringify(own));
    },
    async release() {
      await writePrivateFile(fileOf(dataFolder), JSON.stringify({ address, children: [] }));
    },
  };
}
