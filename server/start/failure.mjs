import { once } from "node:events";

/** A failure that is told to the person who started the program, in one sentence and without a stack. */
export class StartFailure extends Error {}

const systemSentences = {
  ENOSPC: "The disk is full: free some space and start again.",
  EROFS: "The disk cannot be written: it is mounted read-only.",
  EDQUOT: "The disk quota of this user is used up: free some space and start again.",
};

/** The one sentence for any error, known or not. */
export function sentenceOf(error) {
  if (error instanceof StartFailure) return error.message;
  if (error?.code in systemSentences) return systemSentences[error.code];
  if (error?.code === "EACCES" || error?.code === "EPERM") {
    return `This user may not write ${error.path ?? "a file that is needed"}: start as the user who owns it.`;
  }
  const message = String(error?.message ?? error).split("\n")[0];
  return `Start failed: ${message}`;
}

/** A reader that went away (a closed terminal, `npm start | head`) must not keep the rest from being stopped. */
let heard = true;
for (const stream of [process.stdout, process.stderr]) stream.on("error", () => (heard = false));

export function say(sentence) {
  if (heard) process.stdout.write(`${sentence}\n`);
}

/** Runs a command's main function; a failure becomes one sentence on stderr and exit code 1. */
export async function runCommand(main) {
  let code = 1;
  try {
    code = (await main()) ?? 0;
  } catch (error) {
    if (heard) process.stderr.write(`${sentenceOf(error)}\n`);
  }
  process.exitCode = code;
  if (heard && process.stdout.writableNeedDrain) await once(process.stdout, "drain");
  process.exit(code);
}
