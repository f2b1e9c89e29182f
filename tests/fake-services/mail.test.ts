import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { createTransport } from "nodemailer";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { atEndOfFile } from "#tests/support/end-of-file.ts";
import { startFakeMail, type FakeMail } from "#tests/support/fake-mail.ts";

let mail: FakeMail;

beforeAll(async () => {
  const folder = await mkdtemp(join(tmpdir(), "mailbox-"));
  atEndOfFile(() => rm(folder, { recursive: true, force: true }));
  mail = await startFakeMail({ stateFile: join(folder, "mailbox.json") });
});

beforeEach(async () => {
  await mail.clear();
  await mail.control("accept");
});

async function send(
  to: string,
  subject: string,
  messageId: string,
  html = "<p>Your <b>block</b></p>",
): Promise<void> {
  const transport = createTransport(mail.smtpUrl);
  try {
    await transport.sendMail({
      from: "Shop <orders@shop.example>",
      to,
      subject,
      messageId,
      text: "Your block: http://127.0.0.1:4700/orders/1?a=1&b=2",
      html,
      headers: { "Auto-Submitted": "auto-generated" },
    });
  } finally {
    transport.close();
  }
}

describe("mailbox", () => {
  it("keeps a message with both parts, its headers and its recipient", async () => {
    await send("builder@racers.example", "Order placed", "<one@shop.example>");
    const [message, ...others] = await mail.messages("Builder@racers.example");
    expect(others).toEqual([]);
    expect(message).toMatchObject({
      messageId: "<one@shop.example>",
      to: ["builder@racers.example"],
      subject: "Order placed",
      html: "<p>Your <b>block</b></p>",
      copies: 1,
    });
    expect(message?.text).toContain("http://127.0.0.1:4700/orders/1?a=1&b=2");
    expect(message?.headers["auto-submitted"]).toBe("auto-generated");
    expect(await mail.messages("other@racers.example")).toEqual([]);
    const single = await fetch(`${mail.origin}/messages/${message?.id ?? ""}`);
    expect(await single.json()).toEqual(message);
  });

  it("lists one entry for a Message-ID that comes twice, and counts it", async () => {
    await send("builder@racers.example", "Accepted", "<two@shop.example>");
    await send("builder@racers.example", "Accepted", "<two@shop.example>");
    expect((await mail.messages()).map(({ messageId, copies }) => ({ messageId, copies }))).toEqual([
      { messageId: "<two@shop.example>", copies: 2 },
    ]);
  });

  it("refuses for now with 451 and keeps nothing", async () => {
    await mail.control("refuse");
    await expect(send("builder@racers.example", "Later", "<three@shop.example>")).rejects.toMatchObject({
      responseCode: 451,
    });
    expect(await mail.messages()).toEqual([]);
  });

  it("can take a message and cut the line before its answer", async () => {
    await mail.control("drop-after-data");
    await expect(send("builder@racers.example", "Cut", "<four@shop.example>")).rejects.toThrow();
    expect((await mail.messages()).map((message) => message.messageId)).toEqual(["<four@shop.example>"]);
  });

  it("goes back to accepting after the number of messages that was asked for", async () => {
    await fetch(`${mail.origin}/control`, {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: JSON.stringify({ mode: "refuse", times: 1 }),
    });
    await expect(send("builder@racers.example", "Once", "<five@shop.example>")).rejects.toThrow();
    await send("builder@racers.example", "Once", "<five@shop.example>");
    expect(await mail.messages()).toHaveLength(1);
  });

  it("refuses a control that it does not know", async () => {
    const response = await fetch(`${mail.origin}/control`, {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: JSON.stringify({ mode: "burn" }),
    });
    expect(response.status).toBe(400);
  });

  it("shows messages to people without running what is in them", async () => {
    const html = "<script>document.title = 'ran'</script><a href='http://127.0.0.1:4700/x'>open</a>";
    await send("builder@racers.example", "<i>Shown</i>", "<six@shop.example>", html);
    const [message] = await mail.messages();
    const list = await (await fetch(mail.origin)).text();
    expect(list).toContain("builder@racers.example");
    expect(list).not.toContain("<i>Shown</i>");
    const shown = await (await fetch(`${mail.origin}/read/${message?.id ?? ""}`)).text();
    expect(shown).toContain('sandbox="allow-popups allow-popups-to-escape-sandbox"');
    expect(shown).toContain('href="http://127.0.0.1:4700/orders/1?a=1&#38;b=2"');
    const framed = await fetch(`${mail.origin}/read/${message?.id ?? ""}/html`);
    expect(framed.headers.get("content-security-policy")).toContain("sandbox");
    expect(framed.headers.get("content-security-policy")).toContain("default-src 'none'");
    expect(await framed.text()).toContain("open</a>");
    expect((await fetch(`${mail.origin}/read/none`)).status).toBe(404);
  });

  it("keeps its messages over a kill", async () => {
    await send("builder@racers.example", "Kept", "<seven@shop.example>");
    await mail.kill9();
    await mail.restart();
    expect((await mail.messages()).map((message) => message.subject)).toEqual(["Kept"]);
  });
});
