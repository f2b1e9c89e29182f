import { spawn } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { readFile, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import { freePort } from "#tests/support/free-port.ts";
import { copyOfStart } from "#tests/support/start-copy.ts";
import { inStart, run, start } from "./command.ts";

const runningSchema = z.object({ children: z.array(z.object({ pid: z.number() })) });

async function childrenOf(folder: string): Promise<number[]> {
  const text = await readFile(join(folder, ".data/shop/running.json"), "utf8");
  return runningSchema.parse(JSON.parse(text)).children.map((child) => child.pid);
}

async function databaseProcess(folder: string): Promise<number> {
  return Number((await readFile(join(folder, ".data/shop/postgres/postmaster.pid"), "utf8")).split("\n")[0]);
}

/** A process that ended but was not yet collected by its parent (state Z) no longer lives. */
function lives(processId: number): boolean {
  const path = `/proc/${String(processId)}/stat`;
  return existsSync(path) && !/\) Z /.test(readFileSync(path, "utf8"));
}

describe("npm start", () => {
  it("prints its address first, tells a second start of itself, and stops everything when asked", async () => {
    const folder = await copyOfStart();
    const port = await freePort();
    const env = { ...process.env, PORT: String(port), NODE_ENV: "production" };
    const first = start(["server/start/start.mjs"], { folder, env });
    await first.waitFor(/Ctrl-C stops everything/);
    expect(/https?:\/\/[^\s]+/.exec(first.output())?.[0]).toBe(`http://127.0.0.1:${String(port)}`);
    for (const role of ["customer", "dealer", "planner", "floor", "office"]) {
      expect(first.output()).toMatch(new RegExp(`  ${role} +${role}@`));
    }
    expect(await (await fetch(`http://127.0.0.1:${String(port)}/readyz`)).text()).toBe("ok");
    const environment: unknown = JSON.parse(
      await readFile(join(folder, ".data/server-environment.json"), "utf8"),
    );
    expect(environment).toMatchObject({
      NODE_ENV: "development",
      DEMO: "1",
      MIGRATE_ON_START: "1",
      SERVE_WEB: "dist",
    });

    const second = await run(["server/start/start.mjs"], {
      folder,
      env: { ...env, PORT: String(await freePort()) },
    });
    expect(second.code).toBe(1);
    expect(second.stderr).toBe(
      `Blockwright is running already at http://127.0.0.1:${String(port)} (process ${String(first.child.pid)}): use that one, or stop it with Ctrl-C where it was started.\n`,
    );

    const processes = [...(await childrenOf(folder)), await databaseProcess(folder)];
    expect(processes).toHaveLength(4);
    expect(processes.every(lives)).toBe(true);
    first.child.kill("SIGINT");
    expect(await first.ended).toMatchObject({ code: 0, stderr: "" });
    expect(processes.filter(lives)).toEqual([]);
  });

  it("stops everything and says why in one sentence when the server falls over", async () => {
    const folder = await copyOfStart();
    const port = await freePort();
    const shop = start(["server/start/start.mjs"], { folder, env: { ...process.env, PORT: String(port) } });
    await shop.waitFor(/Ctrl-C stops everything/);
    const processes = [...(await childrenOf(folder)), await databaseProcess(folder)];
    await expect(fetch(`http://127.0.0.1:${String(port)}/fall`)).rejects.toThrow();
    const { code, stderr } = await shop.ended;
    expect(code).toBe(1);
    expect(stderr).toBe(
      `The server stopped by itself (exit code 3): Error: the floor gave way. Its log is ${join(folder, ".data/shop/server.log")}\n`,
    );
    expect(processes.filter(lives)).toEqual([]);
  });

  it("in development serves the client as it stands and starts the server anew when it changes", async () => {
    const folder = await copyOfStart();
    const port = String(await freePort());
    const origin = `http://127.0.0.1:${port}`;
    const shop = start(["server/start/dev.mjs"], { folder, env: { ...process.env, PORT: port } });
    await shop.waitFor(/Ctrl-C stops everything/);
    expect(shop.output()).toContain(`Blockwright is ready: ${origin}\n`);
    const processes = [...(await childrenOf(folder)), await databaseProcess(folder)];
    expect(await (await fetch(`${origin}/api/session`)).text()).toBe("ok");
    expect(await (await fetch(`${origin}/web/main.ts`)).text()).toContain('document.title = "Copy"');

    await writeFile(join(folder, "web/main.ts"), 'document.title = "Changed";');
    await expect
      .poll(async () => (await fetch(`${origin}/web/main.ts`)).text(), { timeout: 10_000 })
      .toContain('document.title = "Changed"');
    const server = join(folder, "server/main.ts");
    await writeFile(server, (await readFile(server, "utf8")).replace('end("ok")', 'end("changed")'));
    await expect
      .poll(async () => (await fetch(`${origin}/api/session`)).text(), { timeout: 20_000, interval: 200 })
      .toBe("changed");

    shop.child.kill("SIGTERM");
    expect(await shop.ended).toMatchObject({ code: 0, stderr: "" });
    expect(processes.filter(lives)).toEqual([]);
    await expect(fetch(origin)).rejects.toThrow();
  });

  it("ends what a killed start left running", async () => {
    const folder = await copyOfStart({ packages: false });
    const leftOver = spawn("sleep", ["600"], { detached: true, stdio: "ignore" });
    const gone = new Promise((resolve) =>
      leftOver.once("exit", (_code, signal) => {
        resolve(signal);
      }),
    );
    atEndOfFile(async () => {
      leftOver.kill("SIGKILL");
      await gone;
    });
    const program = `
      const { recordOf } = await import("./server/start/alive.mjs");
      const { checkNotRunning } = await import("./server/start/running.mjs");
      const { writePrivateFile } = await import("./server/start/private-file.mjs");
      const child = await recordOf(${String(leftOver.pid)});
      const dead = { pid: ${String(leftOver.pid)}, birth: "another boot/1", address: "http://127.0.0.1:1" };
      await writePrivateFile("running.json", JSON.stringify({ ...dead, children: [child] }));
      answer(await checkNotRunning("."));`;
    expect(await inStart(folder, program)).toBeNull();
    expect(await gone).toBe("SIGTERM");
  });

  it("builds the client only when what it is made of changed", async () => {
    const folder = await copyOfStart();
    const first = await run(["server/start/web-build.mjs"], { folder });
    expect(first).toMatchObject({ code: 0, stdout: "Building the client ...\n" });
    expect(await run(["server/start/web-build.mjs"], { folder })).toMatchObject({ code: 0, stdout: "" });
    await writeFile(join(folder, "web/main.ts"), 'document.title = "Changed";');
    expect((await run(["server/start/web-build.mjs"], { folder })).stdout).toBe("Building the client ...\n");
    await writeFile(join(folder, "web/main.ts"), 'import "./missing.ts";');
    const broken = await run(["server/start/web-build.mjs"], { folder });
    expect(broken.code).toBe(1);
    expect(broken.stderr.trim().split("\n")).toHaveLength(1);
    expect(broken.stderr).toContain("Could not resolve './missing.ts' in web/main.ts");
  });
});
