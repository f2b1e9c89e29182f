import { access } from "node:fs/promises";
import { StartFailure, say } from "./failure.mjs";
import { runAsRoot } from "./administrator.mjs";

const aptOptions = ["-o", "DPkg::Lock::Timeout=300", "-o", "Acquire::Retries=2"];
const installOptions = ["-o", "Dpkg::Options::=--force-confold", "--no-install-recommends"];

const causes = [
  [/No space left on device|not enough free space/i, "the disk is full"],
  [/Could not get lock|Unable to acquire the dpkg/i, "another installation holds the package lock"],
  [
    /Could not resolve|Temporary failure resolving|Could not connect|Connection (refused|timed out|failed)|Unable to connect|Network is unreachable/i,
    "Debian's package servers cannot be reached",
  ],
  [/Unable to locate package|has no installation candidate/i, "this system's package sources do not have it"],
];

function causeOf(output) {
  const known = causes.find(([pattern]) => pattern.test(output));
  if (known !== undefined) return known[1];
  const line = output.split("\n").find((text) => /^(E:|dpkg:)/.test(text));
  return line?.replace(/^E: |\.$/g, "") ?? "apt-get gave no reason";
}

/** Installs one of Debian's packages, without questions and without waiting for input. */
export async function installDebianPackage(name, purpose, before = "") {
  const hasApt = await access("/usr/bin/apt-get").then(
    () => true,
    () => false,
  );
  if (!hasApt) {
    throw new StartFailure(
      `${purpose} is missing and this system has no apt-get: install ${name} with the system's own tools and start again.`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const reason = `${purpose} is missing and must be installed (Debian's package ${name})`;
  const byHand = `${before}apt-get update && apt-get install -y --no-install-recommends ${name}`;
  say(`${purpose} is missing: installing Debian's package ${name} ...`);
  const update = await runAsRoot(reason, byHand, "apt-get", [...aptOptions, "update"], { env });
  const install = await runAsRoot(
    reason,
    byHand,
    "apt-get",
    [...aptOptions, ...installOptions, "install", "-y", name],
    { env },
  );
  if (install.code !== 0) {
    const output = `${install.stderr}\n${update.code === 0 ? "" : update.stderr}\n${update.stderr}`;
    throw new StartFailure(
      `${purpose} could not be installed (Debian's package ${name}): ${causeOf(output)}.`,
    );
  }
}
