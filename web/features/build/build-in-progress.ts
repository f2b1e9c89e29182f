import { readVisit, writeVisit } from "./visit-store.ts";

const key = "build-in-progress";

/** The address of the build that was last worked on in this tab, path and query; null if there was none. */
export function buildInProgress(): string | null {
  const address = readVisit(key);
  return address?.startsWith("/build/") === true ? address : null;
}

/** Notes the build as it stands, so that the front door can lead back to it. */
export function noteBuildInProgress(address: string): void {
  writeVisit(key, address);
}
