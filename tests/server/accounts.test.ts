import { beforeAll, describe, expect, test } from "vitest";
import { createApp } from "#server/app.ts";
import { Email } from "#server/models/email.ts";
import { Person } from "#server/models/person.ts";
import { Session } from "#server/models/session.ts";
import { disablePerson } from "#server/services/accounts/disable-person.ts";
import { issueToken } from "#server/services/tokens/issue-token.ts";
import { AccessToken } from "#server/models/access-token.ts";
import { personSchema } from "#shared/contracts/person.ts";
import { sessionSchema } from "#shared/contracts/session.ts";
import { Browser, problemOf } from "#tests/support/api.ts";
import { factoryPassword, makePerson, makeShop, makeSignedIn } from "#tests/support/factories.ts";

const app = createApp();
const goodPassword = "nine iron barrels in a row";

beforeAll(makeShop);

async function personOf(browser: Browser): Promise<string | null> {
  return sessionSchema.parse((await browser.get("/api/session")).body).person?.email ?? null;
}

describe("registering", () => {
  test("makes a customer whose address is not confirmed, and mails a link", async () => {
    const browser = new Browser(app);
    const answer = await browser.post("/api/account/register", {
      name: "Ada Moss",
      email: "Ada.Moss@shop.example",
      password: goodPassword,
    });
    expect(answer.status).toBe(202);
    const person = await Person.findOne({ where: { email: "Ada.Moss@shop.example" }, rejectOnEmpty: true });
    expect(person).toMatchObject({ role: "customer", emailVerifiedAt: null });
    expect(
      await Email.count({ where: { personId: person.id, kind: "verify-address", state: "waiting" } }),
    ).toBe(1);
    expect(await personOf(browser)).toBeNull();
  });

  test("answers the same for an address that has an account, tells its owner, and changes nothing", async () => {
    const known = await makePerson();
    const unknown = await new Browser(app).post("/api/account/register", {
      name: "New",
      email: "quite-new@shop.example",
      password: goodPassword,
    });
    const answer = await new Browser(app).post("/api/account/register", {
      name: "Somebody",
      email: known.email.toUpperCase(),
      password: goodPassword,
    });
    expect(answer.status).toBe(unknown.status);
    expect(answer.body).toEqual(unknown.body);
    expect(await Email.count({ where: { personId: known.id, kind: "account-exists" } })).toBe(1);
    expect((await known.reload()).name).toBe("Rowan Hale");
  });

  test("takes no role, and no other field, from the request", async () => {
    await new Browser(app).post("/api/account/register", {
      name: "Mallory",
      email: "mallory@shop.example",
      password: goodPassword,
      role: "office",
      emailVerifiedAt: "2026-01-01T00:00:00Z",
    });
    const person = await Person.findOne({ where: { email: "mallory@shop.example" }, rejectOnEmpty: true });
    expect(person).toMatchObject({ role: "customer", emailVerifiedAt: null });
  });

  // OWASP ASVS 5.0: 6.2.1, 6.2.4, 6.2.5, 6.2.9, 6.2.12; the shop's and the person's own words from 6.2.11.
  test.each([
    ["short", "7 chars"],
    ["common", "password123"],
    ["common, written in capitals", "QWERTYUIOP"],
    ["the shop's name", "Test Foundry 1"],
    ["one's own address", "brock@shop.example"],
    ["one's own name", "brock1234567"],
    ["one character", "zzzzzzzzzzzz"],
  ])("refuses a password that is %s", async (_why, password) => {
    const answer = await new Browser(app).post("/api/account/register", {
      name: "Brock",
      email: "brock@shop.example",
      password,
    });
    expect(answer.status).toBe(422);
    expect(problemOf(answer)).toMatchObject({ kind: "validation", paths: ["password"] });
    expect(await Person.count({ where: { email: "brock@shop.example" } })).toBe(0);
  });

  test("takes 200 characters of any kind, none of them cut off", async () => {
    const password = `${"pâté 鉄 ".repeat(28)}abcd`;
    expect(password.length).toBe(200);
    const browser = new Browser(app);
    await browser.post("/api/account/register", { name: "Long", email: "long@shop.example", password });
    expect((await browser.signIn("long@shop.example", password.slice(0, -1))).status).toBe(422);
    expect((await browser.signIn("long@shop.example", password)).status).toBe(200);
  });

  test("keeps the hash as argon2id of OWASP's least strength or more", async () => {
    // OWASP Password Storage Cheat Sheet: m = 19456 KiB, t = 2, p = 1 (references 10.3).
    await new Browser(app).post("/api/account/register", {
      name: "H",
      email: "hash@shop.example",
      password: goodPassword,
    });
    const { passwordHash } = await Person.findOne({
      where: { email: "hash@shop.example" },
      rejectOnEmpty: true,
    });
    expect(passwordHash).toMatch(/^\$argon2id\$v=19\$/);
    const parameter = (name: string): number =>
      Number(new RegExp(`[$,]${name}=(\\d+)`).exec(passwordHash)?.[1]);
    expect(parameter("m")).toBeGreaterThanOrEqual(19_456);
    expect(parameter("t")).toBeGreaterThanOrEqual(2);
    expect(parameter("p")).toBe(1);
  });
});

describe("confirming an address", () => {
  test("takes the token once, and a GET of its page changes nothing", async () => {
    const person = await makePerson({ emailVerifiedAt: null });
    const token = await issueToken("verify-email", { personId: person.id });
    const browser = new Browser(app);
    await browser.get(`/account/verify?token=${token}`);
    expect((await person.reload()).emailVerifiedAt).toBeNull();
    expect((await browser.post("/api/account/verify", { token })).status).toBe(200);
    expect((await person.reload()).emailVerifiedAt).toBeInstanceOf(Date);
    const again = await browser.post("/api/account/verify", { token });
    expect(problemOf(again)).toMatchObject({ kind: "validation", paths: ["token"] });
  });

  test("does not take a token of another purpose, or one that has run out", async () => {
    const person = await makePerson({ emailVerifiedAt: null });
    const browser = new Browser(app);
    const reset = await issueToken("reset-password", { personId: person.id });
    expect((await browser.post("/api/account/verify", { token: reset })).status).toBe(422);
    const late = await issueToken("verify-email", { personId: person.id });
    await AccessToken.update(
      { expiresAt: new Date(Date.now() - 1000) },
      { where: { personId: person.id, purpose: "verify-email" } },
    );
    expect((await browser.post("/api/account/verify", { token: late })).status).toBe(422);
    expect((await person.reload()).emailVerifiedAt).toBeNull();
  });

  test("keeps no token, only its hash", async () => {
    const person = await makePerson();
    const token = await issueToken("reset-password", { personId: person.id });
    expect(Buffer.from(token, "base64url")).toHaveLength(32);
    const rows = await AccessToken.findAll({ where: { personId: person.id } });
    expect(JSON.stringify(rows)).not.toContain(token);
  });
});

describe("signing in", () => {
  test("gives the session a new id and says who it is", async () => {
    const person = await makePerson();
    const browser = new Browser(app);
    const answer = await browser.signIn(person.email.toUpperCase(), factoryPassword);
    expect(answer.status).toBe(200);
    expect(personSchema.parse(sessionSchema.parse(answer.body).person)).toMatchObject({ id: person.id });
    expect(await personOf(browser)).toBe(person.email);
    expect(answer.text).not.toContain("argon2");
  });

  test("answers an unknown address, a wrong password and a disabled account alike", async () => {
    const person = await makePerson();
    const disabled = await makePerson({ disabledAt: new Date() });
    const browser = new Browser(app);
    const answers = [
      await browser.signIn("nobody@shop.example", "wrong-password"),
      await browser.signIn(person.email, "wrong-password"),
      await browser.signIn(disabled.email, factoryPassword),
    ];
    for (const answer of answers) expect(answer.status).toBe(422);
    expect(new Set(answers.map((answer) => JSON.stringify(problemOf(answer)))).size).toBe(1);
  });

  test("takes as long for an unknown address as for a wrong password", async () => {
    await new Browser(app).post("/api/account/register", {
      name: "T",
      email: "time@shop.example",
      password: goodPassword,
    });
    const timed = async (email: string): Promise<number> => {
      const browser = new Browser(app);
      const times: number[] = [];
      for (let round = 0; round < 5; round += 1) {
        const start = performance.now();
        await browser.signIn(email, `wrong password ${round}`);
        times.push(performance.now() - start);
      }
      return times.sort((a, b) => a - b)[2] ?? Number.NaN;
    };
    const unknown = await timed("time-unknown@shop.example");
    const known = await timed("time@shop.example");
    expect(unknown / known).toBeGreaterThan(0.5);
    expect(unknown / known).toBeLessThan(2);
  });

  test("ends with sign-out, also for a copy of the cookie", async () => {
    const { browser, person } = await makeSignedIn(app, "customer");
    expect(await Session.count({ where: { personId: person.id } })).toBe(1);
    expect((await browser.post("/api/account/sign-out")).status).toBe(200);
    expect(await Session.count({ where: { personId: person.id } })).toBe(0);
    expect(await personOf(browser)).toBeNull();
    expect((await browser.get("/api/account/orders")).status).toBe(401);
  });

  test("is over at once for a person who is disabled", async () => {
    const { browser, person } = await makeSignedIn(app, "office");
    expect((await browser.get("/api/messages")).status).toBe(200);
    await disablePerson(person.id);
    expect((await browser.get("/api/messages")).status).toBe(401);
    expect((await browser.signIn(person.email, factoryPassword)).status).toBe(422);
  });
});

describe("a forgotten password", () => {
  test("answers the same for known and unknown addresses, and mails the known one only", async () => {
    const person = await makePerson();
    const browser = new Browser(app);
    const known = await browser.post("/api/account/forgot", { email: person.email });
    const unknown = await browser.post("/api/account/forgot", { email: "not-here@shop.example" });
    expect(known.status).toBe(202);
    expect(unknown.status).toBe(202);
    expect(unknown.body).toEqual(known.body);
    expect(await Email.count({ where: { personId: person.id, kind: "reset-password" } })).toBe(1);
    expect(await Email.count({ where: { toAddress: "not-here@shop.example" } })).toBe(0);
  });

  test("is replaced once with the link; every session ends, and the old password is worth nothing", async () => {
    const { browser: elsewhere, person } = await makeSignedIn(app, "customer");
    const token = await issueToken("reset-password", { personId: person.id });
    const other = await issueToken("reset-password", { personId: person.id });
    const browser = new Browser(app);
    expect((await browser.post("/api/account/reset", { token, password: goodPassword })).status).toBe(200);
    expect(await personOf(elsewhere)).toBeNull();
    expect((await browser.signIn(person.email, factoryPassword)).status).toBe(422);
    expect((await browser.signIn(person.email, goodPassword)).status).toBe(200);
    for (const used of [token, other]) {
      const again = await browser.post("/api/account/reset", {
        token: used,
        password: "another iron password",
      });
      expect(problemOf(again)).toMatchObject({ kind: "validation", paths: ["token"] });
    }
    expect(await Email.count({ where: { personId: person.id, kind: "password-changed" } })).toBe(1);
  });

  test("keeps its link when the new password is refused", async () => {
    const person = await makePerson();
    const token = await issueToken("reset-password", { personId: person.id });
    const browser = new Browser(app);
    expect(
      problemOf(await browser.post("/api/account/reset", { token, password: "password1" })).paths,
    ).toEqual(["password"]);
    expect((await browser.post("/api/account/reset", { token, password: goodPassword })).status).toBe(200);
  });

  test("has a link for 30 minutes", async () => {
    const person = await makePerson();
    const before = Date.now();
    await issueToken("reset-password", { personId: person.id });
    const { expiresAt } = await AccessToken.findOne({ where: { personId: person.id }, rejectOnEmpty: true });
    expect((expiresAt?.getTime() ?? 0) - before).toBeGreaterThan(29.9 * 60_000);
    expect((expiresAt?.getTime() ?? 0) - before).toBeLessThan(30.1 * 60_000);
  });
});

describe("changing one's password", () => {
  test("asks for the present one, ends the other sessions and keeps this one", async () => {
    const { browser, person } = await makeSignedIn(app, "planner");
    const other = new Browser(app);
    await other.signIn(person.email, factoryPassword);
    const wrong = await browser.post("/api/account/change-password", {
      currentPassword: "not it",
      newPassword: goodPassword,
    });
    expect(problemOf(wrong)).toMatchObject({ kind: "validation", paths: ["currentPassword"] });
    const right = await browser.post("/api/account/change-password", {
      currentPassword: factoryPassword,
      newPassword: goodPassword,
    });
    expect(right.status).toBe(200);
    expect(await personOf(browser)).toBe(person.email);
    expect(await personOf(other)).toBeNull();
  });
});
