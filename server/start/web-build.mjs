import { mkdir, readFile, writeFile } from "node:fs/promises";
import { dirname, join } from "node:path";
import { hashOfFiles } from "./file-hash.mjs";
import { isEntry } from "./entry.mjs";
import { runCommand, say, StartFailure } from "./failure.mjs";
import { runProgram } from "./command.mjs";
import { withLock } from "./lock.mjs";
import { checkout } from "./locations.mjs";

const inputs = [
  "web",
  "shared",
  "index.html",
  "vite.config.ts",
  "tailwind.config.ts",
  "tsconfig.json",
  "package-lock.json",
];
const mark = join(checkout, "dist", ".inputs-hash");

async function builtHash() {
  return readFile(mark, "utf8").catch((error) => {
    if (error.code === "ENOENT" || error.code === "ENOTDIR") return undefined;
    throw error;
  });
}

/** The first line that names a fault, below the lines that only say that there is one. */
function causeOf(report) {
  const lines = report.split("\n").map((line) => line.trim());
  const told = lines.slice(lines.findIndex((line) => /error during build/i.test(line)) + 1);
  return told.find((line) => line !== "" && !/^Build failed with/.test(line)) ?? "Vite gave no reason";
}

/** Builds the client into dist/ when anything that it is made of changed since the last build. */
export async function ensureWebBuild() {
  await withLock(`web build ${checkout}`, async () => {
    const hash = await hashOfFiles(checkout, inputs);
    if ((await builtHash()) === hash) return;
    say("Building the client ...");
    const program = join(checkout, "node_modules", "vite", "bin", "vite.js");
    const env = { ...process.env, NODE_ENV: "production", NO_COLOR: "1" };
    const { code, stdout, stderr } = await runProgram(process.execPath, [program, "build"], {
      cwd: checkout,
      env,
    });
    if (code !== 0) {
      const report = join(checkout, ".data", "web-build.log");
      await mkdir(dirname(report), { recursive: true });
      await writeFile(report, `${stdout}\n${stderr}`);
      throw new StartFailure(
        `The client could not be built: ${causeOf(stderr)} (the whole report is in ${report})`,
      );
    }
    await writeFile(mark, hash);
  });
}

if (isEntry(import.meta.filename)) await runCommand(ensureWebBuild);
