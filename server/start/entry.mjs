import { realpathSync } from "node:fs";

/** True for the module that Node.js was started with, by whatever link its path was given. */
export function isEntry(filename) {
  return process.argv[1] !== undefined && realpathSync(process.argv[1]) === filename;
}
