import { spawn, type ChildProcess } from "node:child_process";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import type { ProgramResult } from "#tests/support/node-program.ts";

interface RunOptions {
  folder: string;
  env?: NodeJS.ProcessEnv;
}

export interface Running {
  child: ChildProcess;
  output: () => string;
  /** Waits until what it wrote matches. */
  waitFor: (pattern: RegExp) => Promise<void>;
  ended: Promise<ProgramResult>;
}

/** Starts Node.js in a folder; ended with the test file when it still runs. */
export function start(args: string[], { folder, env = process.env }: RunOptions): Running {
  const child = spawn(process.execPath, args, { cwd: folder, env, stdio: ["ignore", "pipe", "pipe"] });
  let stdout = "";
  let stderr = "";
  child.stdout.setEncoding("utf8").on("data", (text: string) => (stdout += text));
  child.stderr.setEncoding("utf8").on("data", (text: string) => (stderr += text));
  const ended = new Promise<ProgramResult>((resolve) => {
    child.once("close", (code) => {
      resolve({ code, stdout, stderr });
    });
  });
  atEndOfFile(async () => {
    child.kill("SIGTERM");
    await ended;
  });
  const waitFor = async (pattern: RegExp): Promise<void> => {
    const deadline = Date.now() + 45_000;
    while (!pattern.test(stdout)) {
      if (child.exitCode !== null)
        throw new Error(`It ended before it wrote ${String(pattern)}:\n${stdout}${stderr}`);
      if (Date.now() > deadline) throw new Error(`It never wrote ${String(pattern)}:\n${stdout}${stderr}`);
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
  };
  return { child, output: () => stdout + stderr, waitFor, ended };
}

export function run(args: string[], options: RunOptions): Promise<ProgramResult> {
  return start(args, options).ended;
}

/**
 * Runs statements that may import from ./server/start, and answers what they hand to `answer(...)`; a failure
 * is answered as the sentence that a person would read.
 */
export async function inStart(folder: string, statements: string, env?: NodeJS.ProcessEnv): Promise<unknown> {
  const program = `
    import { sentenceOf } from "./server/start/failure.mjs";
    const answer = (value) => process.stdout.write("\\nanswer:" + JSON.stringify(value ?? null) + "\\n");
    try { ${statements} } catch (error) { answer({ sentence: sentenceOf(error) }); }`;
  const options = env === undefined ? { folder } : { folder, env };
  const { stdout, stderr } = await run(["--input-type=module", "-e", program], options);
  const line = stdout.split("\n").find((text) => text.startsWith("answer:"));
  if (line === undefined) throw new Error(`No answer:\n${stdout}${stderr}`);
  return JSON.parse(line.slice("answer:".length));
}
