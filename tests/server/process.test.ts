import { createServer } from "node:net";
import { once } from "node:events";
import { describe, expect, test } from "vitest";
import { Client } from "pg";
import { Person } from "#server/models/person.ts";
import { createTestDatabase } from "#tests/support/database.ts";
import { factoryPassword, makePerson, makeSignedIn } from "#tests/support/factories.ts";
import { freePort } from "#tests/support/free-port.ts";
import { runNode } from "#tests/support/node-program.ts";
import { startServer } from "#tests/support/test-server.ts";
import { Visitor } from "#tests/support/visitor.ts";
import { createApp } from "#server/app.ts";
import { makeShop } from "#tests/support/factories.ts";

const start = (env: Record<string, string | undefined>) =>
  runNode(["--import", "tsx", "server/main.ts"], { ...process.env, MIGRATE_ON_START: "1", ...env });

/** A process that was told in one sentence what to mend. */
async function expectSentence(env: Record<string, string | undefined>, sentence: RegExp): Promise<void> {
  const { code, stderr } = await start(env);
  expect(code).toBe(1);
  expect(stderr.trim().split("\n")).toHaveLength(1);
  expect(stderr).toMatch(sentence);
}

describe("a process that cannot start", () => {
  test("says which setting is missing", async () => {
    await expectSentence({ SESSION_SECRET: "" }, /SESSION_SECRET is not set/);
  });

  test("says that the database cannot be reached", async () => {
    const port = await freePort();
    await expectSentence(
      { DATABASE_URL: `postgres://a:b@127.0.0.1:${port}/c` },
      /database of DATABASE_URL cannot be reached/,
    );
  });

  test("says that the database does not exist", async () => {
    const url = new URL(process.env["DATABASE_URL"] ?? "");
    url.pathname = "/no_such_database";
    await expectSentence({ DATABASE_URL: url.href }, /there is no such database/);
  });

  test("says that the port is in use", async () => {
    const other = createServer().listen(0, "127.0.0.1");
    await once(other, "listening");
    const address = other.address();
    if (address === null || typeof address === "string") throw new Error("No port");
    await expectSentence({ PORT: String(address.port) }, new RegExp(`Port ${address.port} is in use`));
    other.close();
  });

  test("says that the database has to be migrated", async () => {
    const { url } = await createTestDatabase();
    const client = new Client({ connectionString: url });
    await client.connect();
    await client.query("DELETE FROM migrations WHERE name LIKE '0001%'");
    await client.end();
    await expectSentence({ DATABASE_URL: url, MIGRATE_ON_START: "0" }, /npm run migrate/);
  });
});

describe("a running process", () => {
  test("makes the demo once, is ready, and stops when it is asked to", async () => {
    const { url } = await createTestDatabase();
    const server = await startServer({ DATABASE_URL: url, DEMO: "1" });
    const visitor = new Visitor(server.origin);
    const signedIn = await visitor.post("/api/account/sign-in", {
      email: "office@osiercreek.example",
      password: "osier-creek-demo",
    });
    expect(signedIn.status).toBe(200);
    await server.restart();
    expect((await visitor.get("/api/messages")).status).toBe(200);
    await server.stop();
    expect(server.output()).toContain('"msg":"stopping"');
    expect(server.output()).not.toMatch(/osier-creek-demo|argon2id|blockwright-session=/);
    const client = new Client({ connectionString: url });
    await client.connect();
    const people = await client.query("SELECT count(*)::integer AS count FROM people");
    await client.end();
    expect(people.rows).toEqual([{ count: 5 }]);
  });

  test("is not ready without a shop, and says what is missing", async () => {
    const { url } = await createTestDatabase();
    const port = await freePort();
    await expect(
      Promise.race([
        startServer({ DATABASE_URL: url, PORT: String(port) }),
        new Promise((_resolve, reject) => setTimeout(reject, 8000, new Error("not ready"))),
      ]),
    ).rejects.toThrow("not ready");
    expect((await fetch(`http://127.0.0.1:${port}/healthz`)).status).toBe(200);
    const answer = await fetch(`http://127.0.0.1:${port}/readyz`);
    expect(answer.status).toBe(503);
    expect(await answer.json()).toMatchObject({
      missing: ["the shop's settings", "a published catalogue with prices"],
    });
  });
});

describe("the account command", () => {
  const run = (args: string[], env: Record<string, string> = {}) =>
    runNode(["--import", "tsx", "server/start/account.ts", ...args], { ...process.env, ...env });
  const settings = {
    ACCOUNT_NAME: "First Manager",
    ACCOUNT_EMAIL: "first@shop.example",
    ACCOUNT_PASSWORD: "a pattern in white pine",
  };

  test("makes the first person, who can sign in", async () => {
    const { code, stdout } = await run(["create", "office"], settings);
    expect(code).toBe(0);
    expect(stdout).toContain("first@shop.example may sign in as office");
    expect(stdout).not.toContain(settings.ACCOUNT_PASSWORD);
    const person = await Person.findOne({ where: { email: "first@shop.example" }, rejectOnEmpty: true });
    expect(person).toMatchObject({ role: "office", name: "First Manager" });
  });

  test("refuses a second account with the address, a common password and an unknown role", async () => {
    const person = await makePerson();
    const again = await run(["create", "office"], { ...settings, ACCOUNT_EMAIL: person.email });
    expect(again).toMatchObject({ code: 1, stderr: expect.stringContaining("already") as unknown });
    const common = await run(["create", "office"], {
      ...settings,
      ACCOUNT_EMAIL: "c@shop.example",
      ACCOUNT_PASSWORD: "password123",
    });
    expect(common.code).toBe(1);
    const role = await run(["create", "emperor"], settings);
    expect(role.stderr).toContain("npm run account -- create");
    expect(await Person.count({ where: { email: "c@shop.example" } })).toBe(0);
  });

  test("shuts an account, and its sessions end", async () => {
    await makeShop();
    const app = createApp();
    const { browser, person } = await makeSignedIn(app, "planner");
    expect((await run(["disable", person.email])).code).toBe(0);
    expect((await browser.get("/api/account/orders")).status).toBe(401);
    expect((await browser.signIn(person.email, factoryPassword)).status).toBe(422);
    expect((await run(["disable", "nobody@shop.example"])).stderr).toContain("no account");
  });
});
