import { StartFailure } from "./failure.mjs";
import { runProgram } from "./command.mjs";

export const isRoot = () => process.getuid?.() === 0;

/**
 * Runs a program as root: directly when this is root, else through sudo without asking for a password.
 * Where neither is possible, throws with the exact line for a person to run.
 */
export async function runAsRoot(reason, byHand, program, args, options = {}) {
  if (isRoot()) return runProgram(program, args, options);
  const allowed = await runProgram("sudo", ["-n", "true"]);
  if (allowed.code !== 0) {
    throw new StartFailure(
      `${reason}, which needs root and this user has no sudo: run this line as root, then start again:\n  ${byHand}`,
    );
  }
  const settings = Object.entries(options.env ?? {})
    .filter(([name, value]) => value !== process.env[name])
    .map(([name, value]) => `${name}=${value}`);
  return runProgram("sudo", ["-n", "env", ...settings, program, ...args], { ...options, env: process.env });
}
