import { randomBytes } from "node:crypto";
import { readFile, rename, writeFile } from "node:fs/promises";

/** Writes whole or not at all, readable by the owner only. */
export async function writePrivateFile(path, text) {
  const temporary = `${path}.${randomBytes(4).toString("hex")}`;
  await writeFile(temporary, text, { mode: 0o600 });
  await rename(temporary, path);
}

/** The parsed JSON file, or undefined where there is none or it is not JSON. */
export async function readJsonFile(path) {
  let text;
  try {
    text = await readFile(path, "utf8");
  } catch (error) {
    if (error.code === "ENOENT") return undefined;
    throw error;
  }
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    throw error;
  }
}
