import { createServer } from "node:net";
import { stat } from "node:fs/promises";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import { copyOfStart } from "#tests/support/start-copy.ts";
import { inStart, run } from "./command.ts";

let folder: string;
let occupied: number;

beforeAll(async () => {
  folder = await copyOfStart({ packages: false });
  const server = createServer();
  occupied = await new Promise((resolve, reject) => {
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      if (address === null || typeof address === "string") reject(new Error("No port was given"));
      else resolve(address.port);
    });
  });
  atEndOfFile(
    () =>
      new Promise((resolve) => {
        server.close(() => {
          resolve();
        });
      }),
  );
});

describe("the product's port", () => {
  it("is said to be in use in one sentence, before anything is installed", async () => {
    const result = await run(["server/start/start.mjs"], {
      folder,
      env: { ...process.env, PORT: String(occupied) },
    });
    expect(result.code).toBe(1);
    expect(result.stdout).toBe("");
    expect(result.stderr).toBe(
      `Port ${String(occupied)} is in use by another program: stop it, or choose another port with PORT=${String(occupied + 1)} npm start.\n`,
    );
  });

  it.each([
    ["47a", 'PORT must be a whole number from 1 to 65535; it is "47a".'],
    ["70000", 'PORT must be a whole number from 1 to 65535; it is "70000".'],
    ["0", 'PORT must be a whole number from 1 to 65535; it is "0".'],
  ])("refuses PORT=%s", async (port, sentence) => {
    const result = await run(["server/start/start.mjs"], { folder, env: { ...process.env, PORT: port } });
    expect(result).toMatchObject({ code: 1, stderr: `${sentence}\n` });
  });

  it("is 4700 unless PORT says otherwise", async () => {
    const program = `
      const { productPort } = await import("./server/start/ports.mjs");
      answer([productPort(""), productPort("8080")]);`;
    expect(await inStart(folder, program)).toEqual([4700, 8080]);
  });
});

describe("remembered ports", () => {
  it("stay the same while they are free and change when one is taken", async () => {
    const program = (names: string): string => `
      const { rememberedPorts } = await import("./server/start/ports.mjs");
      answer(await rememberedPorts(".", ${names}));`;
    const first = await inStart(folder, program('["database", "mailbox"]'));
    expect(await inStart(folder, program('["database", "mailbox"]'))).toEqual(first);
    const withTaken = `
      const { writePrivateFile } = await import("./server/start/private-file.mjs");
      await writePrivateFile("ports.json", JSON.stringify({ ...${JSON.stringify(first)}, database: ${String(occupied)} }));`;
    const later = await inStart(folder, withTaken + program('["database", "mailbox"]'));
    expect(later).toMatchObject({ mailbox: (first as { mailbox: number }).mailbox });
    expect((later as { database: number }).database).not.toBe(occupied);
    expect((await stat(join(folder, "ports.json"))).mode & 0o777).toBe(0o600);
  });
});
