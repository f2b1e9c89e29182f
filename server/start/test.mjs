import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { ensureChromium } from "./chromium-package.mjs";
import { runCommand, say } from "./failure.mjs";
import { checkout } from "./locations.mjs";
import { prepareMachine } from "./preparation.mjs";
import { readJsonFile } from "./private-file.mjs";
import { countTests } from "./test-count.mjs";
import { acquireTestCluster, releaseTestCluster } from "./test-cluster.mjs";
import { ensureWebBuild } from "./web-build.mjs";

const withoutBrowser = /^(\.\/)?tests\/(shared|reference|web|server|faults|fake-services|start)\b/;

/** Paths that name only tests without a browser need neither Chromium nor the built client. */
function needsBrowser(args) {
  const paths = args.filter((arg) => existsSync(join(checkout, arg)));
  return paths.length === 0 || !paths.every((path) => withoutBrowser.test(path));
}

/** Runs vitest to its end; Ctrl-C reaches it by itself, and it is waited for. */
function runVitest(args) {
  const program = join(checkout, "node_modules", "vitest", "vitest.mjs");
  const child = spawn(process.execPath, [program, "run", ...args], {
    cwd: checkout,
    stdio: ["ignore", "inherit", "inherit"],
  });
  const passOn = (signal) => child.kill(signal);
  process.on("SIGINT", () => {});
  for (const signal of ["SIGTERM", "SIGHUP"]) process.on(signal, passOn);
  return new Promise((resolve, reject) => {
    child.once("error", reject);
    child.once("close", (code) => resolve(code ?? 1));
  });
}

async function main() {
  const args = process.argv.slice(2);
  await prepareMachine();
  if (needsBrowser(args)) {
    await ensureChromium();
    await ensureWebBuild();
  }
  const folder = await mkdtemp(join(tmpdir(), "test-report-"));
  const reportFile = join(folder, "report.json");
  try {
    // Held until the end, so that the cluster stops even after a run that was killed.
    await acquireTestCluster(process.pid);
    const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${reportFile}`];
    const exitCode = await runVitest([...reporters, ...args]);
    const { passed, failed } = countTests(await readJsonFile(reportFile), exitCode);
    say(`${passed} passed, ${failed} failed`);
    return exitCode === 0 && failed === 0 && passed > 0 ? 0 : 1;
  } finally {
    await releaseTestCluster(process.pid);
    await rm(folder, { recursive: true, force: true });
  }
}

await runCommand(main);
