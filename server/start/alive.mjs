import { readFile, readlink } from "node:fs/promises";

/**
 * What tells this process from a later one with the same id: its start time in clock ticks since boot,
 * with the boot's own id. Undefined when there is no such process.
 */
export async function processBirth(processId) {
  try {
    const [boot, statistics] = await Promise.all([
      readFile("/proc/sys/kernel/random/boot_id", "utf8"),
      readFile(`/proc/${processId}/stat`, "utf8"),
    ]);
    const fields = statistics.slice(statistics.lastIndexOf(")") + 2).split(" ");
    if (fields[0] === "Z") return undefined;
    return `${boot.trim()}/${fields[19]}`;
  } catch (error) {
    if (error.code === "ENOENT" || error.code === "ESRCH") return undefined;
    throw error;
  }
}

/** True when the very process that was recorded as { pid, birth } still runs. */
export async function stillRuns(record) {
  if (!Number.isInteger(record?.pid)) return false;
  return (await processBirth(record.pid)) === record.birth;
}

export async function recordOf(processId) {
  return { pid: processId, birth: await processBirth(processId) };
}

export async function workingFolderOf(processId) {
  try {
    return await readlink(`/proc/${processId}/cwd`);
  } catch (error) {
    if (error.code === "ENOENT" || error.code === "ESRCH" || error.code === "EACCES") return undefined;
    throw error;
  }
}

export const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));
