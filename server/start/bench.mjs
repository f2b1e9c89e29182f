import { readdir } from "node:fs/promises";
import { join } from "node:path";
import { runCommand, StartFailure } from "./failure.mjs";
import { runProgram } from "./command.mjs";
import { checkout } from "./locations.mjs";
import { prepareMachine } from "./preparation.mjs";

const folder = join(checkout, "tests", "bench");

async function benchmarkFiles() {
  const names = await readdir(folder).catch((error) => {
    if (error.code === "ENOENT") return [];
    throw error;
  });
  return names.filter((name) => /^[a-z]+[a-z-]*\.ts$/.test(name)).sort();
}

async function main() {
  const group = process.argv[2];
  const files = await benchmarkFiles();
  const groups = [...new Set(files.map((name) => name.match(/^[a-z]+/)?.[0]))].join(", ");
  if (files.length === 0) throw new StartFailure("There are no benchmarks in this version.");
  const chosen = files.filter((name) => group !== undefined && new RegExp(`^${group}\\b`).test(name));
  if (!/^[a-z]+$/.test(group ?? "") || chosen.length === 0) {
    throw new StartFailure(`Name a group of benchmarks, as npm run bench -- GROUP; there are: ${groups}.`);
  }
  await prepareMachine();
  let worst = 0;
  for (const name of chosen) {
    const { code } = await runProgram(process.execPath, ["--import", "tsx", join(folder, name)], {
      cwd: checkout,
      show: true,
    });
    if (code !== 0) worst = code ?? 1;
  }
  return worst;
}

await runCommand(main);
