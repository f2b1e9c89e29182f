import { spawn } from "node:child_process";
import { resolve } from "node:path";

export const checkout = resolve(import.meta.dirname, "../..");

export interface ProgramResult {
  code: number | null;
  stdout: string;
  stderr: string;
}

/** Runs Node.js with these arguments in the checkout until it ends. */
export function runNode(args: string[], env: NodeJS.ProcessEnv = process.env): Promise<ProgramResult> {
  return new Promise((settle, reject) => {
    const child = spawn(process.execPath, args, { cwd: checkout, env, stdio: ["ignore", "pipe", "pipe"] });
    let stdout = "";
    let stderr = "";
    child.stdout.setEncoding("utf8").on("data", (text: string) => (stdout += text));
    child.stderr.setEncoding("utf8").on("data", (text: string) => (stderr += text));
    child.on("error", reject);
    child.on("close", (code) => {
      settle({ code, stdout, stderr });
    });
  });
}

/** As `runNode`, but anything else than success throws with what the program wrote. */
export async function runNodeWell(args: string[], env?: NodeJS.ProcessEnv): Promise<string> {
  const { code, stdout, stderr } = await runNode(args, env);
  if (code !== 0) throw new Error(`node ${args.join(" ")} ended with ${String(code)}:\n${stderr}${stdout}`);
  return stdout;
}
