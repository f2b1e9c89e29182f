import { spawn } from "node:child_process";

/**
 * Runs a program to its end with standard input closed.
 * Answers { code, stdout, stderr }; code is null when a signal ended it, 127 when it is not there.
 */
export function runProgram(program, args, { cwd, env, input, show = false, uid, gid } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      cwd,
      env: env ?? process.env,
      uid,
      gid,
      stdio: [input === undefined ? "ignore" : "pipe", show ? "inherit" : "pipe", show ? "inherit" : "pipe"],
    });
    let stdout = "";
    let stderr = "";
    child.stdout?.setEncoding("utf8").on("data", (text) => (stdout += text));
    child.stderr?.setEncoding("utf8").on("data", (text) => (stderr += text));
    child.on("error", (error) => {
      if (error.code === "ENOENT") resolve({ code: 127, stdout, stderr: `${program} is not there` });
      else reject(error);
    });
    child.on("close", (code) => resolve({ code, stdout, stderr }));
    if (input !== undefined) child.stdin.end(input);
  });
}
