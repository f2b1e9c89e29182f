import { join } from "node:path";
import { hashOfFiles } from "./file-hash.mjs";
import { checkout } from "./locations.mjs";
import { isEntry } from "./entry.mjs";
import { runCommand, StartFailure } from "./failure.mjs";
import { recordOf, stillRuns } from "./alive.mjs";
import { clusterVersion, startCluster, stopCluster } from "./cluster.mjs";
import { dataFolderFor } from "./data-folder.mjs";
import { withLock } from "./lock.mjs";
import { rememberedPorts } from "./ports.mjs";
import { ensurePostgres } from "./postgres-package.mjs";
import { readJsonFile, writePrivateFile } from "./private-file.mjs";
import { secretsOf } from "./secrets.mjs";

/** The tests' data may be lost with the machine, so nothing waits for the disk. */
const forSpeed = { fsync: "off", synchronous_commit: "off", full_page_writes: "off" };

async function open() {
  // The package comes first: it brings the user that must be able to enter the data folder.
  await ensurePostgres();
  const data = await dataFolderFor("test");
  const folder = join(data, "postgres");
  const programs = await ensurePostgres(await clusterVersion(folder));
  return { data, folder, programs, usersFile: join(data, "users.json") };
}

/** The migrated database that tests copy: its name changes with what makes it. */
async function templateName() {
  return `template_${(await hashOfFiles(checkout, ["server/migrations", "server/database"])).slice(0, 16)}`;
}

async function livingUsers(usersFile) {
  const kept = (await readJsonFile(usersFile)) ?? [];
  const living = await Promise.all(kept.map(stillRuns));
  return kept.filter((_, index) => living[index]);
}

async function dropLeftOvers(cluster, template) {
  const names = await cluster.run(
    `select datname from pg_database where datname ~ '^(test|template)_' and datname <> '${template}'`,
  );
  for (const name of names.split("\n").filter(Boolean)) {
    await cluster.run(`drop database if exists "${name}" with (force)`);
  }
}

/** Starts the tests' cluster for one more process; the first that comes clears what earlier ones left. */
export async function acquireTestCluster(processId) {
  const { data, folder, programs, usersFile } = await open();
  return withLock(`test cluster ${folder}`, async () => {
    const users = await livingUsers(usersFile);
    const { database: port } = await rememberedPorts(data, users.length === 0 ? ["database"] : []);
    const { databasePassword: password } = await secretsOf(data);
    const template = await templateName();
    const cluster = await startCluster({ programs, folder, port, password, extraSettings: forSpeed });
    if (users.length === 0) await dropLeftOvers(cluster, template);
    await writePrivateFile(usersFile, JSON.stringify([...users, await recordOf(processId)]));
    return { url: cluster.url("postgres"), template };
  });
}

/** Gives up one process's use; the last one to go stops the cluster. */
export async function releaseTestCluster(processId) {
  const { folder, programs, usersFile } = await open();
  await withLock(`test cluster ${folder}`, async () => {
    const users = await livingUsers(usersFile);
    const own = users.findIndex((user) => user.pid === processId);
    const left = users.filter((_, index) => index !== own);
    await writePrivateFile(usersFile, JSON.stringify(left));
    if (left.length === 0) await stopCluster({ programs, folder });
  });
}

if (isEntry(import.meta.filename)) {
  await runCommand(async () => {
    const processId = Number(process.argv[3]);
    if (process.argv[2] === "acquire")
      process.stdout.write(`${JSON.stringify(await acquireTestCluster(processId))}\n`);
    else if (process.argv[2] === "release") await releaseTestCluster(processId);
    else throw new StartFailure("Say acquire or release, and a process id.");
  });
}
