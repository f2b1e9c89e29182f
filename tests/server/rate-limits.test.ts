import { beforeAll, describe, expect, test } from "vitest";
import { createApp } from "#server/app.ts";
import { sequelize } from "#server/database/connection.ts";
import { countTry, forgetTries } from "#server/services/rate-limits.ts";
import { Browser, problemOf } from "#tests/support/api.ts";
import { factoryPassword, makePerson, makeShop } from "#tests/support/factories.ts";
import { startServer } from "#tests/support/test-server.ts";
import { Visitor } from "#tests/support/visitor.ts";

const app = createApp();
beforeAll(makeShop);

describe("tries at signing in", () => {
  test("run out for an account after ten, for the right password too, and say how long to wait", async () => {
    const person = await makePerson();
    const browser = new Browser(app);
    for (let round = 0; round < 10; round += 1)
      expect((await browser.signIn(person.email, "wrong password")).status).toBe(422);
    const answer = await browser.signIn(person.email, factoryPassword);
    expect(answer.status).toBe(429);
    expect(problemOf(answer).kind).toBe("too-many-requests");
    expect(Number(answer.headers["retry-after"])).toBeGreaterThan(800);
    const other = await makePerson();
    expect((await browser.signIn(other.email, factoryPassword)).status).toBe(200);
  });

  test("are counted together by two processes on one database", async () => {
    const servers = await Promise.all([1, 2].map(() => startServer({ DATABASE_URL: databaseUrl() })));
    const person = await makePerson();
    const statuses: number[] = [];
    for (let round = 0; round < 6; round += 1) {
      for (const server of servers) {
        const visitor = new Visitor(server.origin);
        const answer = await visitor.post("/api/account/sign-in", {
          email: person.email,
          password: "wrong password",
        });
        statuses.push(answer.status);
      }
    }
    expect(statuses).toEqual([...Array<number>(10).fill(422), 429, 429]);
  });

  test("that turned out well are forgotten", async () => {
    const person = await makePerson();
    const browser = new Browser(app);
    for (let round = 0; round < 14; round += 1) {
      const right = round % 7 === 6;
      const answer = await browser.signIn(person.email, right ? factoryPassword : "wrong password");
      expect(answer.status).toBe(right ? 200 : 422);
    }
  });
});

test("asking for a new password runs out for an address after five", async () => {
  const browser = new Browser(app);
  for (let round = 0; round < 5; round += 1)
    expect((await browser.post("/api/account/forgot", { email: "often@shop.example" })).status).toBe(202);
  expect((await browser.post("/api/account/forgot", { email: "OFTEN@shop.example" })).status).toBe(429);
});

test("what is counted names nobody", async () => {
  await countTry("confirmation by account", "ada@shop.example");
  const [rows] = await sequelize.query("SELECT key FROM rate_limits");
  expect(JSON.stringify(rows)).not.toContain("ada@");
  await forgetTries("confirmation by account", "ada@shop.example");
});

function databaseUrl(): string {
  const url = process.env["DATABASE_URL"];
  if (url === undefined) throw new Error("The test file has no database");
  return url;
}
