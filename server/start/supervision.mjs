import { spawn } from "node:child_process";
import { open, readFile } from "node:fs/promises";
import { join } from "node:path";
import { pause, recordOf, stillRuns } from "./alive.mjs";
import { StartFailure } from "./failure.mjs";
import { checkout } from "./locations.mjs";

const stopWithin = 10_000;

/** The last thing a program wrote, in words: a log line's message where it is one. */
async function lastWords(logFile) {
  const lines = (await readFile(logFile, "utf8"))
    .split("\n")
    .filter((line) => line.trim() !== "" && !line.startsWith('{"ready":'));
  // A stack ends with frames, and with Node's version: the error itself stands above them.
  const told = lines.filter((line) => !/^\s+at |^Node\.js v|^\s*[{}^]/.test(line) || line.startsWith('{"'));
  const error = told.findLast((line) => /error/i.test(line)) ?? told.at(-1);
  if (error === undefined) return "it wrote nothing";
  try {
    const { msg, err } = JSON.parse(error);
    return err?.message ?? msg ?? error;
  } catch (problem) {
    if (problem instanceof SyntaxError) return error.trim();
    throw problem;
  }
}

/**
 * Keeps a set of programs running together: each in a process group of its own, so that Ctrl-C reaches this
 * process alone; the end of any of them is the end of all.
 */
export class Supervision {
  #children = [];
  #watches = [];
  #stopping = false;
  #fail;
  /** Resolves with a StartFailure when a program ends by itself. */
  failed = new Promise((resolve) => (this.#fail = resolve));

  constructor({ dataFolder, onStarted }) {
    this.dataFolder = dataFolder;
    this.onStarted = onStarted;
  }

  /** Starts a Node.js program, what it writes going to `<name>.log`. Answers its child and log file. */
  async start(name, args, env) {
    const logFile = join(this.dataFolder, `${name.replaceAll(" ", "-")}.log`);
    const log = await open(logFile, "w", 0o600);
    if (this.#stopping) throw new StartFailure(`The ${name} was not started: everything is stopping.`);
    const child = spawn(process.execPath, args, {
      cwd: checkout,
      env,
      detached: true,
      stdio: ["ignore", log.fd, log.fd],
    });
    const program = { name, child, logFile, ended: false };
    program.end = new Promise((resolve) => {
      child.once("error", resolve);
      child.once("exit", (code, signal) => {
        program.ended = true;
        resolve();
        if (!this.#stopping) void this.#report(program, code, signal);
      });
    });
    await log.close();
    this.#children.push(program);
    if (child.pid !== undefined) await this.onStarted(child.pid);
    return program;
  }

  async #report({ name, logFile }, code, signal) {
    const how = signal === null ? `exit code ${code}` : `signal ${signal}`;
    const words = (await lastWords(logFile)).replace(/\.$/, "");
    this.#fail(new StartFailure(`The ${name} stopped by itself (${how}): ${words}. Its log is ${logFile}`));
  }

  /** Watches a program that is not a child of this process. */
  async watch(name, processId, logFile) {
    const record = await recordOf(processId);
    const timer = setInterval(async () => {
      if ((await stillRuns(record)) || this.#stopping) return;
      this.#fail(new StartFailure(`The ${name} stopped by itself: its log is ${logFile}`));
    }, 1000);
    this.#watches.push(timer);
  }

  /** Waits until `check` answers something, asking often; a program that ends meanwhile is the failure. */
  async until(name, check, seconds = 90) {
    const deadline = Date.now() + seconds * 1000;
    const failure = this.failed.then((error) => {
      throw error;
    });
    failure.catch(() => undefined);
    for (;;) {
      const answer = await Promise.race([check(), failure]);
      if (answer !== undefined && answer !== false) return answer;
      if (this.#stopping) throw new StartFailure(`The ${name} was stopped before it was ready.`);
      if (Date.now() > deadline) {
        const log = this.#children.find((program) => program.name === name)?.logFile;
        throw new StartFailure(`The ${name} was not ready within ${seconds} seconds: its log is ${log}`);
      }
      await Promise.race([pause(50), failure]);
    }
  }

  /** Stops all, the last started first, each within some seconds. */
  async stop() {
    this.#stopping = true;
    for (const timer of this.#watches) clearInterval(timer);
    for (const { child, end, ended } of this.#children.reverse()) {
      if (ended || child.pid === undefined) continue;
      child.kill("SIGTERM");
      const timer = setTimeout(() => process.kill(-child.pid, "SIGKILL"), stopWithin);
      await end;
      clearTimeout(timer);
    }
  }
}
