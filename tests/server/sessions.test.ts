import { beforeAll, describe, expect, test } from "vitest";
import supertest from "supertest";
import { createApp } from "#server/app.ts";
import { config } from "#server/config.ts";
import { Session } from "#server/models/session.ts";
import { sessionSchema } from "#shared/contracts/session.ts";
import { Browser, problemOf } from "#tests/support/api.ts";
import { factoryPassword, makePerson, makeShop, makeSignedIn } from "#tests/support/factories.ts";

const app = createApp();
beforeAll(makeShop);

const HOUR = 3_600_000;

/** Makes a stored session older, as if time had passed. */
async function age(personId: string, milliseconds: number, what: "startedAt" | "seenAt"): Promise<void> {
  const row = await Session.findOne({ where: { personId }, rejectOnEmpty: true });
  const data: unknown = JSON.parse(row.data);
  if (typeof data !== "object" || data === null) throw new Error("The session is no object");
  await row.update({ data: JSON.stringify({ ...data, [what]: Date.now() - milliseconds }) });
}

async function isSignedIn(browser: Browser): Promise<boolean> {
  return sessionSchema.parse((await browser.get("/api/session")).body).person !== null;
}

function cookiesOf(answer: supertest.Response): string[] {
  const header: unknown = answer.headers["set-cookie"];
  return Array.isArray(header) ? header.map(String) : [];
}

describe("a session", () => {
  test("is not begun for whoever only looks around", async () => {
    const before = await Session.count();
    const answer = await supertest(app).get("/api/catalogue").expect(200);
    expect(cookiesOf(answer)).toEqual([]);
    expect(await Session.count()).toBe(before);
  });

  test("has a cookie that scripts and other sites cannot use", async () => {
    const person = await makePerson();
    const answer = await new Browser(app).signIn(person.email, factoryPassword);
    const cookie = cookiesOf(answer).find((line) => line.startsWith("blockwright-session="));
    expect(cookie).toMatch(/HttpOnly/);
    expect(cookie).toMatch(/SameSite=Lax/);
    expect(cookie).toMatch(/Path=\//);
  });

  test("is each person's own when many sign in at the same moment", async () => {
    const people = await Promise.all(Array.from({ length: 8 }, () => makePerson()));
    const answers = await Promise.all(
      people.map(async (person, index) => {
        const password = index % 2 === 0 ? factoryPassword : "not-their-password";
        const browser = new Browser(app);
        const answer = await browser.signIn(person.email, password);
        const { person: seen } = sessionSchema.parse((await browser.get("/api/session")).body);
        return { status: answer.status, seen: seen?.email ?? null };
      }),
    );
    expect(answers).toEqual(
      people.map(({ email }, index) =>
        index % 2 === 0 ? { status: 200, seen: email } : { status: 422, seen: null },
      ),
    );
  });

  test("gets a new id at sign-in, and the old one is worth nothing", async () => {
    const first = await makePerson();
    const second = await makePerson();
    const browser = new Browser(app);
    const one = await browser.signIn(first.email, factoryPassword);
    const two = await browser.signIn(second.email, factoryPassword);
    const [before, after] = [one, two].map((answer) =>
      cookiesOf(answer).find((line) => line.startsWith("blockwright-session=")),
    );
    expect(before?.split(";")[0]).not.toBe(after?.split(";")[0]);
    const stolen = await supertest(app)
      .get("/api/session")
      .set("Cookie", before?.split(";")[0] ?? "");
    expect(sessionSchema.parse(stolen.body).person).toBeNull();
  });

  test("of staff ends after an hour without use and after twelve hours of use", async () => {
    const idle = await makeSignedIn(app, "floor");
    await age(idle.person.id, 0.95 * HOUR, "seenAt");
    expect(await isSignedIn(idle.browser)).toBe(true);
    await age(idle.person.id, 1.05 * HOUR, "seenAt");
    expect(await isSignedIn(idle.browser)).toBe(false);
    const long = await makeSignedIn(app, "office");
    await age(long.person.id, 11.9 * HOUR, "startedAt");
    expect(await isSignedIn(long.browser)).toBe(true);
    await age(long.person.id, 12.1 * HOUR, "startedAt");
    expect(await isSignedIn(long.browser)).toBe(false);
    expect(await Session.count({ where: { personId: long.person.id } })).toBe(0);
  });

  test("of a buyer ends after two hours without use and after fourteen days", async () => {
    const idle = await makeSignedIn(app, "customer");
    await age(idle.person.id, 1.9 * HOUR, "seenAt");
    expect(await isSignedIn(idle.browser)).toBe(true);
    await age(idle.person.id, 2.1 * HOUR, "seenAt");
    expect(await isSignedIn(idle.browser)).toBe(false);
    const long = await makeSignedIn(app, "dealer");
    await age(long.person.id, 14.1 * 24 * HOUR, "startedAt");
    expect(await isSignedIn(long.browser)).toBe(false);
  });

  test("cannot be made up: a cookie with a wrong signature is nobody's", async () => {
    const { person } = await makeSignedIn(app, "office");
    const { sid } = await Session.findOne({ where: { personId: person.id }, rejectOnEmpty: true });
    const answer = await supertest(app)
      .get("/api/messages")
      .set("Cookie", `blockwright-session=s%3A${sid}.AAAA`);
    expect(answer.status).toBe(401);
  });
});

describe("a changing request", () => {
  const body = { email: "nobody@shop.example" };

  test("is taken with our origin and the token", async () => {
    expect((await new Browser(app).post("/api/account/forgot", body)).status).toBe(202);
  });

  test.each([
    ["another site's", "https://evil.example"],
    ["the same host's on another port", "http://127.0.0.1:4999"],
    ["a sandboxed page's", "null"],
  ])("is refused with %s origin, whatever token it has", async (_whose, origin) => {
    const browser = new Browser(app);
    const token = await browser.csrfToken();
    const answer = await browser.agent
      .post("/api/account/forgot")
      .set("Origin", origin)
      .set("X-CSRF-Token", token)
      .send(body);
    expect(answer.status).toBe(403);
    expect(problemOf(answer).kind).toBe("csrf");
  });

  test("is refused without an origin, without a token, and with another browser's token", async () => {
    const browser = new Browser(app);
    const token = await browser.csrfToken();
    const others = await new Browser(app).csrfToken();
    const post = () => browser.agent.post("/api/account/forgot").send(body);
    for (const request of [
      post().set("X-CSRF-Token", token),
      post().set("Origin", config.PUBLIC_ORIGIN),
      post().set("Origin", config.PUBLIC_ORIGIN).set("X-CSRF-Token", others),
    ]) {
      const answer = await request;
      expect(answer.status).toBe(403);
      expect(problemOf(answer).kind).toBe("csrf");
    }
  });

  test("of a signed-in person needs the token of that very session", async () => {
    const browser = new Browser(app);
    const visitors = await browser.csrfToken();
    const person = await makePerson();
    await browser.signIn(person.email, factoryPassword);
    const answer = await browser.agent
      .post("/api/account/sign-out")
      .set("Origin", config.PUBLIC_ORIGIN)
      .set("X-CSRF-Token", visitors);
    expect(problemOf(answer).kind).toBe("csrf");
    expect(await isSignedIn(browser)).toBe(true);
  });
});
