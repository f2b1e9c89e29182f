import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { ShopSettings } from "#server/models/shop-settings.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { runNode } from "#tests/support/node-program.ts";
import { demoContext } from "../shared/demo/context.ts";

const folder = await mkdtemp(join(tmpdir(), "blockwright-shop-"));
afterAll(() => rm(folder, { recursive: true }));

const shop = (...args: string[]) => runNode(["--import", "tsx", "server/start/shop.ts", ...args]);

async function file(name: string, text: string): Promise<string> {
  const path = join(folder, name);
  await writeFile(path, text);
  return path;
}

describe("the shop command", () => {
  it("opens a shop with a document, and never changes a published version", async () => {
    const example = await shop("example");
    expect(example.code).toBe(0);
    const path = await file("shop.json", example.stdout.replaceAll("Osier Creek Iron", "Fenwick Castings"));
    const opened = await shop("open", path);
    expect(opened).toMatchObject({ code: 0, stderr: "" });
    expect((await ShopSettings.findOne())?.name).toBe("Fenwick Castings");
    expect((await currentContext()).catalogue).toEqual(demoContext.catalogue);
    const again = await shop("open", path);
    expect(again.code).toBe(1);
    expect(again.stderr).toContain("published already");
  });

  it("says where a document does not fit, and writes nothing of it", async () => {
    const { stdout } = await shop("example");
    const path = await file(
      "wrong.json",
      stdout.replace('"+16155550110"', '"12"').replaceAll("Osier Creek Iron", "Wrong"),
    );
    const { code, stderr } = await shop("open", path);
    expect(code).toBe(1);
    expect(stderr).toContain("shop.phone");
    expect((await ShopSettings.findOne())?.name).not.toBe("Wrong");
  });

  it("says how it is used", async () => {
    const { code, stderr } = await shop();
    expect(code).toBe(1);
    expect(stderr).toContain("npm run shop -- open shop.json");
  });
});
