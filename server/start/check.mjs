import { join } from "node:path";
import { runCommand, say } from "./failure.mjs";
import { runProgram } from "./command.mjs";
import { checkout } from "./locations.mjs";
import { checkNodeVersion } from "./node-version.mjs";
import { ensurePackages } from "./npm-packages.mjs";

const steps = [
  { name: "types", program: "typescript/bin/tsc", args: ["--noEmit", "-p", "."] },
  { name: "lint", program: "eslint/bin/eslint.js", args: [".", "--max-warnings", "0"] },
  {
    name: "import boundaries",
    program: "dependency-cruiser/bin/dependency-cruise.mjs",
    args: ["--config", ".dependency-cruiser.cjs", "web", "server", "shared", "fake-services", "tests"],
  },
  { name: "dead code", program: "knip/bin/knip.js", args: ["--no-progress"] },
  { name: "formatting", program: "prettier/bin/prettier.cjs", args: ["--check", ".", "--log-level", "warn"] },
];

async function main() {
  checkNodeVersion();
  await ensurePackages();
  const failed = [];
  for (const { name, program, args } of steps) {
    say(`-- ${name}`);
    const path = join(checkout, "node_modules", program);
    const { code } = await runProgram(process.execPath, [path, ...args], { cwd: checkout, show: true });
    if (code !== 0) failed.push(name);
  }
  say(failed.length === 0 ? "The check is clean." : `The check failed: ${failed.join(", ")}.`);
  return failed.length === 0 ? 0 : 1;
}

await runCommand(main);
