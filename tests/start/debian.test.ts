import { spawnSync } from "node:child_process";
import { chmod, mkdir, readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { copyOfStart } from "#tests/support/start-copy.ts";
import { checkout } from "#tests/support/node-program.ts";
import { inStart } from "./command.ts";

let folder: string;

async function stub(name: string, lines: string[]): Promise<void> {
  await writeFile(join(folder, "bin", name), `#!/bin/sh\n${lines.join("\n")}\n`);
  await chmod(join(folder, "bin", name), 0o755);
}

beforeAll(async () => {
  folder = await copyOfStart({ packages: false });
  await mkdir(join(folder, "bin"));
  await chmod(join(folder, "bin"), 0o755);
  await stub("sudo", ['[ "$1" = "-n" ] && shift', 'exec "$@"']);
});

const install = `
  const { installDebianPackage } = await import("./server/start/debian-package.mjs");
  answer(await installDebianPackage("chromium", "Chromium"));`;
const withStubs = (): NodeJS.ProcessEnv => ({
  ...process.env,
  PATH: `${join(folder, "bin")}:${process.env["PATH"] ?? ""}`,
});

describe("a missing Debian package", () => {
  it("is installed after an update, without questions, with standard input closed", async () => {
    await writeFile(join(folder, "calls"), "");
    await chmod(join(folder, "calls"), 0o666);
    await stub("apt-get", [`echo "$DEBIAN_FRONTEND $* input:$(cat | wc -c)" >> ${join(folder, "calls")}`]);
    expect(await inStart(folder, install, withStubs())).toBeNull();
    const [update, installation] = (await readFile(join(folder, "calls"), "utf8")).trim().split("\n");
    expect(update).toBe("noninteractive -o DPkg::Lock::Timeout=300 -o Acquire::Retries=2 update input:0");
    expect(installation).toBe(
      "noninteractive -o DPkg::Lock::Timeout=300 -o Acquire::Retries=2 -o Dpkg::Options::=--force-confold --no-install-recommends install -y chromium input:0",
    );
  });

  it.each([
    ["E: Unable to locate package chromium", "this system's package sources do not have it"],
    ["E: Failed to fetch x  Could not resolve 'y'", "Debian's package servers cannot be reached"],
    [
      "E: You don't have enough free space in /var/cache/apt/archives/.",
      "You don't have enough free space in /var/cache/apt/archives/",
    ],
    ["dpkg: error: No space left on device", "the disk is full"],
  ])("that cannot be installed is told in one sentence: %s", async (output, cause) => {
    await stub("apt-get", [`echo "${output}" >&2`, "exit 100"]);
    expect(await inStart(folder, install, withStubs())).toEqual({
      sentence: `Chromium could not be installed (Debian's package chromium): ${cause}.`,
    });
  });

  it("gives the line to run to a user who may not become root", async () => {
    await stub("sudo", ["exit 1"]);
    const program = `process.getuid = () => 1000; ${install}`;
    expect(await inStart(folder, program, withStubs())).toEqual({
      sentence:
        "Chromium is missing and must be installed (Debian's package chromium), which needs root and this user has no sudo: run this line as root, then start again:\n  apt-get update && apt-get install -y --no-install-recommends chromium",
    });
  });
});

describe("the whole check of a commit", () => {
  const runCheck = async (
    check: number,
    tests: number,
    lastLine: string,
  ): Promise<{ code: number | null; last: string | undefined }> => {
    await stub("npm", [
      `case "$*" in *check*) exit ${String(check)};; *) echo "${lastLine}"; exit ${String(tests)};; esac`,
    ]);
    const { status, stdout } = spawnSync("bash", [join(checkout, ".ci/run")], {
      env: withStubs(),
      encoding: "utf8",
    });
    return { code: status, last: stdout.trim().split("\n").at(-1) };
  };

  it.each([
    [0, 0, "12 passed, 0 failed", 0, "12 passed, 0 failed"],
    [1, 0, "12 passed, 0 failed", 1, "12 passed, 1 failed"],
    [0, 1, "11 passed, 2 failed", 1, "11 passed, 2 failed"],
    [2, 1, "11 passed, 2 failed", 1, "11 passed, 3 failed"],
    [0, 1, "The database did not start.", 1, "0 passed, 1 failed"],
  ])("check %i, tests %i saying '%s': code %i, '%s'", async (check, tests, says, code, last) => {
    expect(await runCheck(check, tests, says)).toEqual({ code, last });
  });
});

describe("the count of tests", () => {
  it.each([
    ["all well", { numPassedTests: 3, numFailedTests: 0, testResults: [] }, 0, { passed: 3, failed: 0 }],
    ["failed tests", { numPassedTests: 3, numFailedTests: 2, testResults: [] }, 1, { passed: 3, failed: 2 }],
    [
      "a file that could not be loaded",
      { numPassedTests: 3, numFailedTests: 0, testResults: [{ status: "failed", assertionResults: [] }] },
      1,
      { passed: 3, failed: 1 },
    ],
    [
      "an error outside of tests",
      { numPassedTests: 3, numFailedTests: 0, testResults: [] },
      1,
      { passed: 3, failed: 1 },
    ],
    ["no report at all", undefined, 1, { passed: 0, failed: 0 }],
  ])("%s", async (_name, report, exitCode, counts) => {
    const program = `
      const { countTests } = await import("./server/start/test-count.mjs");
      answer(countTests(${report === undefined ? "undefined" : JSON.stringify(report)}, ${String(exitCode)}));`;
    expect(await inStart(folder, program)).toEqual(counts);
  });
});
