import { spawn, type ChildProcess } from "node:child_process";
import { atEndOfFile } from "./end-of-file.ts";
import { checkout } from "./node-program.ts";

export interface ChildProgram {
  /** For messages, as "server". */
  name: string;
  /** Its file, run by tsx, as "server/main.ts". */
  file: string;
  env: Record<string, string>;
  /** Answers true as soon as it can be used; asked again and again until then. */
  isReady: (output: string) => boolean | Promise<boolean>;
}

export interface RunningChild {
  /** What it wrote since the last start, both streams. */
  output: () => string;
  /** Asks it to end (SIGTERM) and waits; throws when it had to be killed. */
  stop: () => Promise<void>;
  /** Ends it as a power cut would. */
  kill9: () => Promise<void>;
  /** Starts it again with the same settings; one that still runs is stopped first. */
  restart: () => Promise<void>;
}

const readyWithin = 40_000;
const stopWithin = 15_000;
const keptCharacters = 200_000;
const pause = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));

const living = new Set<ChildProcess>();
process.on("exit", () => {
  for (const child of living) child.kill("SIGKILL");
});

/** Only what every program needs: the settings of the test run itself stay out. */
function plainEnvironment(): Record<string, string> {
  const names = ["PATH", "HOME", "LANG", "TMPDIR"];
  return Object.fromEntries(names.flatMap((name) => (process.env[name] ? [[name, process.env[name]]] : [])));
}

/** Starts a program of ours as a process of its own, waits until it is ready, and ends it with the test file. */
export async function startChild(program: ChildProgram): Promise<RunningChild> {
  let child: ChildProcess | undefined;
  let ended: Promise<void> = Promise.resolve();
  let output = "";

  const start = async (): Promise<void> => {
    output = "";
    const started = spawn(process.execPath, ["--import", "tsx", program.file], {
      cwd: checkout,
      env: { ...plainEnvironment(), ...program.env },
      stdio: ["ignore", "pipe", "pipe"],
    });
    child = started;
    living.add(started);
    for (const stream of [started.stdout, started.stderr]) {
      stream
        .setEncoding("utf8")
        .on("data", (text: string) => (output = (output + text).slice(-keptCharacters)));
    }
    ended = new Promise((resolve) => {
      started.once("close", () => {
        living.delete(started);
        child = undefined;
        resolve();
      });
    });
    const deadline = Date.now() + readyWithin;
    while (!(await program.isReady(output))) {
      if (!living.has(started)) throw new Error(`The ${program.name} ended before it was ready:\n${output}`);
      if (Date.now() > deadline) {
        started.kill("SIGKILL");
        throw new Error(`The ${program.name} was not ready in time:\n${output}`);
      }
      await pause(50);
    }
  };
  const end = async (signal: "SIGTERM" | "SIGKILL"): Promise<void> => {
    const ending = child;
    if (ending === undefined) return;
    ending.kill(signal);
    const timer = setTimeout(() => ending.kill("SIGKILL"), stopWithin);
    await ended;
    clearTimeout(timer);
    if (signal === "SIGTERM" && ending.signalCode === "SIGKILL") {
      throw new Error(`The ${program.name} did not end when asked to:\n${output}`);
    }
  };

  atEndOfFile(() => end("SIGTERM"));
  await start();
  return {
    output: () => output,
    stop: () => end("SIGTERM"),
    kill9: () => end("SIGKILL"),
    restart: async () => {
      await end("SIGTERM");
      await start();
    },
  };
}
