import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createApp } from "#server/app.ts";
import { config } from "#server/config.ts";
import { transaction } from "#server/database/transaction.ts";
import { queueEmail } from "#server/emails/queue-email.ts";
import { writeLetter } from "#server/emails/letter.ts";
import { type RunningWorkers, startWorkers } from "#server/jobs/workers.ts";
import { log } from "#server/log.ts";
import { AccessToken } from "#server/models/access-token.ts";
import { Email } from "#server/models/email.ts";
import type { Person } from "#server/models/person.ts";
import { messageListSchema, messageSchema } from "#shared/contracts/messages.ts";
import { Browser } from "#tests/support/api.ts";
import { makePerson, makeShop, makeSignedIn } from "#tests/support/factories.ts";
import { type FakeMail, startFakeMail } from "#tests/support/fake-mail.ts";

const app = createApp();
let mail: FakeMail;
let workers: RunningWorkers;

beforeAll(async () => {
  await makeShop();
  mail = await startFakeMail();
  workers = await startWorkers(log);
});
afterAll(() => workers.stop());

async function queueReset(person: Person, eventKey: string = randomUUID()): Promise<void> {
  await queueEmail({
    kind: "reset-password",
    to: { name: person.name, address: person.email },
    personId: person.id,
    data: { name: person.name },
    eventKey,
  });
}

async function until(what: () => Promise<boolean>): Promise<void> {
  const deadline = Date.now() + 15_000;
  while (!(await what())) {
    if (Date.now() > deadline) throw new Error("It did not come about in time");
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

const emailTo = (person: Person): Promise<Email> =>
  Email.findOne({ where: { personId: person.id }, rejectOnEmpty: true });

describe("a message", () => {
  test("is written with the change that causes it, or not at all", async () => {
    const person = await makePerson();
    await expect(
      transaction(async () => {
        await queueReset(person);
        throw new Error("the change failed");
      }),
    ).rejects.toThrow("the change failed");
    expect(await Email.count({ where: { personId: person.id } })).toBe(0);
  });

  test("goes out as text and HTML with the shop's letterhead, its fixed id, and a link that works", async () => {
    const person = await makePerson({ name: "Ada <b> Moss & Sons" });
    await queueReset(person);
    const message = await mail.waitForMessage(person.email);
    const email = await emailTo(person);
    expect(message.messageId).toBe(email.messageId);
    expect(message.subject).toBe("Set a new password");
    expect(message.headers["auto-submitted"]).toBe("auto-generated");
    for (const part of [message.text, message.html]) {
      expect(part).toContain("Test Foundry");
      expect(part).toContain("1 Pattern Yard");
      expect(part).toContain(`${config.PUBLIC_ORIGIN}/account/reset?token=`);
    }
    expect(message.html).toContain("Ada &lt;b&gt; Moss &amp; Sons");
    const token = /token=([\w-]{43})/.exec(message.text)?.[1] ?? "";
    const answer = await new Browser(app).post("/api/account/reset", {
      token,
      password: "forty tons of grey iron",
    });
    expect(answer.status).toBe(200);
  });

  test("is written once for one event, however often it is asked for", async () => {
    const person = await makePerson();
    await Promise.all([1, 2, 3].map(() => queueReset(person, `once:${person.id}`)));
    await mail.waitForMessage(person.email);
    expect(await Email.count({ where: { personId: person.id } })).toBe(1);
  });

  test("keeps no token, and the Office sees its link masked", async () => {
    const person = await makePerson();
    await queueReset(person);
    const sent = await mail.waitForMessage(person.email);
    const token = /token=([\w-]{43})/.exec(sent.text)?.[1] ?? "";
    const email = await emailTo(person);
    expect(JSON.stringify(email)).not.toContain(token);
    const { browser } = await makeSignedIn(app, "office");
    const shown = messageSchema.parse((await browser.get(`/api/messages/${email.id}`)).body);
    expect(shown.text).toContain("token=…");
    expect(shown.text).not.toContain(token);
  });

  test("cannot carry a second header in a name or an address", async () => {
    const person = await makePerson();
    const queue = (to: { name: string; address: string }): Promise<void> =>
      queueEmail({
        kind: "password-changed",
        to,
        data: { name: "x" },
        eventKey: randomUUID(),
        personId: person.id,
      });
    await expect(queue({ name: "Ada\r\nBcc: all@shop.example", address: person.email })).rejects.toThrow();
    await expect(queue({ name: "Ada", address: "a@shop.example\nBcc: b@shop.example" })).rejects.toThrow();
  });
});

describe("a mail server", () => {
  test("that is down delays a message and loses none", async () => {
    const person = await makePerson();
    await mail.stop();
    await queueReset(person);
    await until(async () => (await emailTo(person)).lastError !== null);
    expect(await emailTo(person)).toMatchObject({ state: "waiting" });
    await mail.restart();
    await mail.waitForMessage(person.email);
    await until(async () => (await emailTo(person)).state === "sent");
    expect(await emailTo(person)).toMatchObject({ lastError: null });
  });

  test("that refuses for now gets it again", async () => {
    const person = await makePerson();
    await mail.control("refuse");
    await queueReset(person);
    await until(async () => (await emailTo(person)).attempts >= 2);
    expect((await emailTo(person)).lastError).toContain("451");
    await mail.control("accept");
    await mail.waitForMessage(person.email);
    await until(async () => (await emailTo(person)).state === "sent");
  });

  test("that takes a message and goes silent may get it twice, under one id and with a link that works", async () => {
    const person = await makePerson();
    await mail.control("drop-after-data");
    await queueReset(person);
    await until(async () => (await mail.messages(person.email)).length > 0);
    await mail.control("accept");
    await until(async () => (await emailTo(person)).state === "sent");
    const messages = await mail.messages(person.email);
    expect(messages).toHaveLength(1);
    expect(messages[0]?.copies).toBe(2);
    const first = /token=([\w-]{43})/.exec(messages[0]?.text ?? "")?.[1] ?? "";
    const answer = await new Browser(app).post("/api/account/reset", {
      token: first,
      password: "a hoist rated for it",
    });
    expect(answer.status).toBe(200);
  });
});

describe("the Office", () => {
  test("lists messages by state and search, newest first", async () => {
    const person = await makePerson({ email: `find-me-${randomUUID()}@shop.example` });
    await queueReset(person);
    await queueReset(person);
    await until(async () => (await Email.count({ where: { personId: person.id, state: "sent" } })) === 2);
    const { browser } = await makeSignedIn(app, "office");
    const answer = await browser
      .get("/api/messages")
      .query({ search: person.email.slice(0, 20), state: "sent" });
    const list = messageListSchema.parse(answer.body);
    expect(list).toMatchObject({ total: 2, page: 1, pages: 1 });
    expect(list.messages[0]).toMatchObject({ subject: "Set a new password", state: "sent" });
    expect(list.messages[0]?.to).toContain(person.email);
    const none = messageListSchema.parse(
      (await browser.get("/api/messages").query({ search: "100%_nobody" })).body,
    );
    expect(none.total).toBe(0);
  });

  test("sends a message again with a new link, under an id that no mail program hides", async () => {
    const person = await makePerson();
    await queueReset(person);
    await mail.waitForMessage(person.email);
    await until(async () => (await emailTo(person)).state === "sent");
    const email = await emailTo(person);
    const { browser } = await makeSignedIn(app, "office");
    expect((await browser.post(`/api/messages/${email.id}/send-again`)).status).toBe(202);
    await until(async () => (await mail.messages(person.email)).length === 2);
    const [first, second] = await mail.messages(person.email);
    expect(second?.messageId).not.toBe(first?.messageId);
    expect(second?.text).not.toBe(first?.text);
    expect(await AccessToken.count({ where: { personId: person.id } })).toBe(2);
    expect((await browser.post(`/api/messages/${randomUUID()}/send-again`)).status).toBe(404);
  });
});

test("a letter says the same in text and in HTML", () => {
  const letter = writeLetter(
    {
      subject: "All parts",
      parts: [
        { part: "paragraph", text: "First line\nsecond line" },
        { part: "rows", rows: [["Block", "$2,900.00"]] },
        { part: "list", items: ["hone", "wash"] },
        { part: "action", label: "See the order", url: "http://shop.example/x?a=1&b=2" },
        { part: "caution", text: "Use a hoist." },
      ],
    },
    {
      name: "Shop",
      email: "s@shop.example",
      phone: "+16155550100",
      addressLines: ["1 Yard"],
      timeZone: "UTC",
    },
  );
  for (const words of [
    "second line",
    "$2,900.00",
    "hone",
    "See the order",
    "Use a hoist.",
    "615-555-0100",
    "1 Yard",
  ]) {
    expect(letter.text).toContain(words);
    expect(letter.html).toContain(words);
  }
  expect(letter.html).toContain("http://shop.example/x?a=1&amp;b=2");
  expect(letter.html).not.toMatch(/<script|<img|http-equiv/);
});
