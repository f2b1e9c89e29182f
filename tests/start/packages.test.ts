import { mkdir, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { beforeEach, describe, expect, it } from "vitest";
import { copyOfStart } from "#tests/support/start-copy.ts";
import { inStart, run } from "./command.ts";

const wanted = { version: "1.2.0", integrity: "sha512-a" };
const lockFile = (packages: object): string =>
  JSON.stringify({ name: "copy", lockfileVersion: 3, packages: { "": { name: "copy" }, ...packages } });

let folder: string;

beforeEach(async () => {
  folder = await copyOfStart({ packages: false });
  await writeFile(join(folder, "package-lock.json"), lockFile({ "node_modules/steel": wanted }));
});

async function install(packages: object): Promise<void> {
  await mkdir(join(folder, "node_modules"), { recursive: true });
  await writeFile(join(folder, "node_modules/.package-lock.json"), lockFile(packages));
}

function state(): Promise<unknown> {
  return inStart(
    folder,
    'const { stateOfPackages } = await import("./server/start/npm-packages.mjs"); answer((await stateOfPackages()).state);',
  );
}

describe("the npm packages", () => {
  it("are missing in a fresh clone, and after an installation that was cut off", async () => {
    expect(await state()).toBe("missing");
    await mkdir(join(folder, "node_modules/steel"), { recursive: true });
    expect(await state()).toBe("missing");
  });

  it("are stale when the lock file asks for another version", async () => {
    await install({ "node_modules/steel": { ...wanted, version: "1.1.0" } });
    expect(await state()).toBe("stale");
  });

  it("are stale when the lock file changed after they were marked fresh", async () => {
    await install({ "node_modules/steel": wanted });
    const ensure =
      'const { ensurePackages } = await import("./server/start/npm-packages.mjs"); answer(await ensurePackages());';
    expect(await inStart(folder, ensure)).toBeNull();
    expect(await state()).toBe("fresh");
    await writeFile(
      join(folder, "package-lock.json"),
      lockFile({ "node_modules/steel": { ...wanted, version: "1.3.0" } }),
    );
    expect(await state()).toBe("stale");
  });

  it("need nothing more when they were installed by hand from this very lock file", async () => {
    await install({ "node_modules/steel": wanted });
    expect(await state()).toBe("fresh-unmarked");
  });

  it("say in one sentence that the registry cannot be reached", async () => {
    const resolved = "http://127.0.0.1:9/steel-1.2.0.tgz";
    await writeFile(
      join(folder, "package.json"),
      JSON.stringify({ name: "copy", private: true, type: "module", dependencies: { steel: "1.2.0" } }),
    );
    await writeFile(
      join(folder, "package-lock.json"),
      JSON.stringify({
        name: "copy",
        lockfileVersion: 3,
        packages: {
          "": { name: "copy", dependencies: { steel: "1.2.0" } },
          "node_modules/steel": { version: "1.2.0", resolved },
        },
      }),
    );
    const env = {
      ...process.env,
      npm_config_registry: "http://127.0.0.1:9/",
      npm_config_fetch_retries: "0",
      npm_config_cache: join(folder, "cache"),
    };
    const result = await run(["server/start/check.mjs"], { folder, env });
    expect(result.code).toBe(1);
    expect(result.stderr).toBe(
      "The npm packages could not be installed: the package registry cannot be reached.\n",
    );
  });
});

describe("Node.js", () => {
  it.each([
    ["18.20.4", false],
    ["20.18.3", false],
    ["20.19.0", true],
    ["22.0.0", true],
  ])("%s is new enough: %s", async (version, enough) => {
    const program = `
      const { checkNodeVersion } = await import("./server/start/node-version.mjs");
      checkNodeVersion("${version}");
      answer("new enough");`;
    const answer = await inStart(folder, program);
    if (enough) expect(answer).toBe("new enough");
    else expect(answer).toEqual({ sentence: expect.stringContaining(`this is ${version}`) as unknown });
  });
});
