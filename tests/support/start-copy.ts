import { chmod, cp, mkdir, mkdtemp, readdir, rm, symlink, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import { atEndOfFile } from "./end-of-file.ts";
import { checkout } from "./node-program.ts";

/** A program of a few lines that stands for a part of the product where only its coming and going matters. */
const parts: Record<string, string> = {
  "index.html": '<!doctype html><title>Copy</title><script type="module" src="/web/main.ts"></script>',
  "web/main.ts": 'document.title = "Copy";',
  "fake-services/stripe/main.ts":
    'setInterval(() => {}, 1000); process.stdout.write(JSON.stringify({ ready: true, port: Number(process.env["FAKE_STRIPE_PORT"]) }) + "\\n");',
  "fake-services/mail/main.ts":
    'setInterval(() => {}, 1000); process.stdout.write(JSON.stringify({ ready: true, smtpPort: 1, httpPort: 2 }) + "\\n");',
  "server/main.ts": [
    'import { createServer } from "node:http";',
    'import { writeFileSync } from "node:fs";',
    'writeFileSync(".data/server-environment.json", JSON.stringify(process.env));',
    "createServer((request, response) => {",
    '  if (request.url === "/fall") { process.stderr.write("Error: the floor gave way\\n"); process.exit(3); }',
    '  response.end("ok");',
    '}).listen(Number(process.env["PORT"]), "127.0.0.1");',
  ].join("\n"),
};

/** Links to the real packages under a lock file that asks for none, so that nothing is ever installed over them. */
async function borrowPackages(folder: string): Promise<void> {
  const lock = JSON.stringify({ name: "copy", lockfileVersion: 3, packages: {} });
  await mkdir(join(folder, "node_modules"));
  await writeFile(join(folder, "package-lock.json"), lock);
  await writeFile(join(folder, "node_modules/.package-lock.json"), lock);
  for (const name of await readdir(join(checkout, "node_modules"))) {
    if (name.startsWith(".")) continue;
    await symlink(join(checkout, "node_modules", name), join(folder, "node_modules", name));
  }
}

/**
 * A checkout of its own with the real start programs and small stand-ins for all other parts, so that tests
 * never meet a shop that runs in this one. The packages are the real ones, unless `packages` is false.
 */
export async function copyOfStart({ packages = true }: { packages?: boolean } = {}): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), "start-copy-"));
  atEndOfFile(() => rm(folder, { recursive: true, force: true }));
  // PostgreSQL's user must be able to enter.
  await chmod(folder, 0o755);
  await cp(join(checkout, "server/start"), join(folder, "server/start"), { recursive: true });
  for (const [name, text] of Object.entries(parts)) {
    await mkdir(dirname(join(folder, name)), { recursive: true });
    await writeFile(join(folder, name), text);
  }
  await cp(join(checkout, "vite.config.ts"), join(folder, "vite.config.ts"));
  await writeFile(
    join(folder, "package.json"),
    JSON.stringify({ name: "copy", private: true, type: "module" }),
  );
  if (packages) await borrowPackages(folder);
  return folder;
}
