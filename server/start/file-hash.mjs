import { createHash } from "node:crypto";
import { readdir, readFile, stat } from "node:fs/promises";
import { join, relative } from "node:path";

async function filesUnder(path) {
  const info = await stat(path).catch((error) => {
    if (error.code === "ENOENT") return undefined;
    throw error;
  });
  if (info === undefined) return [];
  if (info.isFile()) return [path];
  const entries = await readdir(path, { withFileTypes: true });
  const lists = await Promise.all(
    entries
      .filter((entry) => entry.isFile() || entry.isDirectory())
      .map((entry) => (entry.isDirectory() ? filesUnder(join(path, entry.name)) : [join(path, entry.name)])),
  );
  return lists.flat();
}

/** One hash over the names and contents of files and of all files under folders; what is missing counts as empty. */
export async function hashOfFiles(root, names) {
  const files = (await Promise.all(names.map((name) => filesUnder(join(root, name))))).flat().sort();
  const hash = createHash("sha256");
  for (const file of files) {
    const content = await readFile(file);
    hash.update(`${relative(root, file)}\0${content.length}\0`).update(content);
  }
  return hash.digest("hex");
}
