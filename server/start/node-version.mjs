import { StartFailure } from "./failure.mjs";

const oldest = { major: 20, minor: 19 };

/** Refuses a Node.js older than the packages need. */
export function checkNodeVersion(version = process.versions.node) {
  const [major, minor] = version.split(".").map(Number);
  if (major > oldest.major || (major === oldest.major && minor >= oldest.minor)) return;
  throw new StartFailure(
    `Node.js ${oldest.major}.${oldest.minor} or later is needed; this is ${version}: install a newer Node.js and start again.`,
  );
}
