import { access, readdir } from "node:fs/promises";
import { join } from "node:path";
import { StartFailure } from "./failure.mjs";
import { runAsRoot } from "./administrator.mjs";
import { installDebianPackage } from "./debian-package.mjs";

const versionsFolder = "/usr/lib/postgresql";
const clusterSettings = "/etc/postgresql-common/createcluster.conf";
/** Debian's package would otherwise make and start a cluster of its own on port 5432. */
const noClusterByItself =
  `test -e ${clusterSettings} || ` +
  `{ mkdir -p /etc/postgresql-common && echo 'create_main_cluster = false' > ${clusterSettings}; }`;

async function exists(path) {
  return access(path).then(
    () => true,
    () => false,
  );
}

/** Versions whose server is there, newest first. */
async function installedVersions() {
  const names = (await exists(versionsFolder)) ? await readdir(versionsFolder) : [];
  const versions = [];
  for (const name of names.filter((text) => /^\d+$/.test(text))) {
    const programs = ["initdb", "postgres", "pg_ctl", "psql"].map((program) =>
      join(versionsFolder, name, "bin", program),
    );
    if ((await Promise.all(programs.map(exists))).every(Boolean)) versions.push(Number(name));
  }
  return versions.sort((a, b) => b - a);
}

/** The folder of PostgreSQL's programs: of the version asked for, or the newest; undefined when not installed. */
async function findPrograms(version) {
  const versions = await installedVersions();
  const chosen = version === undefined ? versions[0] : versions.find((found) => found === version);
  return chosen === undefined ? undefined : join(versionsFolder, String(chosen), "bin");
}

/** Finds PostgreSQL's programs, installing Debian's package when there are none. */
export async function ensurePostgres(version) {
  const found = await findPrograms(version);
  if (found !== undefined) return found;
  if (version !== undefined) {
    throw new StartFailure(
      `The kept database was made by PostgreSQL ${version}, which is no longer installed: install postgresql-${version}, or move the data folder away to begin anew.`,
    );
  }
  const reason = "PostgreSQL is missing and must be installed (Debian's package postgresql)";
  const byHand = `sh -c "${noClusterByItself}" && apt-get update && apt-get install -y --no-install-recommends postgresql`;
  const prepared = await runAsRoot(reason, byHand, "sh", ["-c", noClusterByItself]);
  if (prepared.code !== 0)
    throw new StartFailure(`${clusterSettings} could not be written: ${prepared.stderr.trim()}.`);
  await installDebianPackage("postgresql", "PostgreSQL");
  const installed = await findPrograms();
  if (installed === undefined) {
    throw new StartFailure(
      `Debian's package postgresql is installed but no server lies under ${versionsFolder}.`,
    );
  }
  return installed;
}
