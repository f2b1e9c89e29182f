import { beforeAll, describe, expect, it } from "vitest";
import { type FakeStripe, startFakeStripe } from "#tests/support/fake-stripe.ts";
import { sdk, sessionParameters } from "./stripe-calls.ts";

let fake: FakeStripe;

beforeAll(async () => {
  fake = await startFakeStripe();
});

async function newPage(): Promise<{ id: string; url: string }> {
  const session = await sdk(fake).checkout.sessions.create(
    sessionParameters({
      line_items: [
        {
          quantity: 2,
          price_data: {
            currency: "usd",
            unit_amount: 123_456,
            product_data: { name: "Marl <script>alert(1)</script>", description: `4.125" bore & more` },
          },
        },
      ],
    }),
  );
  if (session.url === null) throw new Error("the session has no page");
  return { id: session.id, url: session.url };
}

function submit(url: string, fields: Record<string, string>): Promise<Response> {
  return fetch(url, { method: "POST", body: new URLSearchParams(fields), redirect: "manual" });
}

function card(number: string, changes: Record<string, string> = {}): Record<string, string> {
  return { number, expiry: "12 / 40", cvc: "123", name: "Ann Buyer", ...changes };
}

describe("the payment page", () => {
  it("says that it is a test and shows merchant, lines, total and e-mail, all escaped", async () => {
    const { url } = await newPage();
    const response = await fetch(url);
    const page = await response.text();
    expect(response.status).toBe(200);
    expect(page).toContain("Test payment page: no real card is charged");
    expect(page).toContain("Osier Creek Iron");
    expect(page).toContain("Marl &lt;script&gt;");
    expect(page).not.toContain("<script");
    expect(page).toContain("4.125&quot; bore &amp; more");
    expect(page).toContain("$2,469.12");
    expect(page).toContain("buyer@example.com");
    expect(page).toContain('href="http://127.0.0.1:9/cart"');
    for (const label of ["Card number", "Expiry", "CVC", "Name on card"]) {
      expect(page).toMatch(new RegExp(`<label for="\\w+">${label}</label>`));
    }
    expect(response.headers.get("content-security-policy")).toContain("default-src 'none'");
  });

  it("takes the buyer back to the shop after paying, and is closed from then on", async () => {
    const { id, url } = await newPage();
    const paid = await submit(url, card("4242 4242 4242 4242"));
    expect(paid.status).toBe(303);
    expect(paid.headers.get("location")).toBe(`http://127.0.0.1:9/paid?session=${id}`);
    expect(await (await fetch(url)).text()).toContain("This order is already paid");
    expect(await (await submit(url, card("4242 4242 4242 4242"))).text()).toContain(
      "This order is already paid",
    );
  });

  it("tells why a card was declined and keeps the name, not the number", async () => {
    const { url } = await newPage();
    const page = await (await submit(url, card("4000000000009995"))).text();
    expect(page).toMatch(/role="alert">\s*This card has too little money/);
    expect(page).toContain('value="Ann Buyer"');
    expect(page).not.toContain("4000000000009995");
  });

  it("shows what is wrong above each field", async () => {
    const { url } = await newPage();
    const page = await (
      await submit(url, card("4242424242424241", { expiry: "01 / 20", cvc: "1", name: "" }))
    ).text();
    for (const field of ["number", "expiry", "cvc", "name"]) {
      const problem = page.indexOf(`id="${field}-problem"`);
      expect(problem).toBeGreaterThan(0);
      expect(page.indexOf(`<label for="${field}">`)).toBeGreaterThan(problem);
    }
    expect(page.match(/aria-invalid="true"/g)).toHaveLength(4);
  });

  it("asks on a second page when the bank wants it, and takes no for an answer", async () => {
    const { id, url } = await newPage();
    const sent = await submit(url, card("4000002760003184"));
    expect(sent.headers.get("location")).toBe(`/pay/${id}/confirm`);
    expect(await (await fetch(`${url}/confirm`)).text()).toContain("Your bank asks you to confirm");
    const failed = await (await submit(`${url}/confirm`, { decision: "fail" })).text();
    expect(failed).toContain("Your bank could not confirm");
    const nothingToConfirm = await submit(`${url}/confirm`, { decision: "complete" });
    expect(nothingToConfirm.headers.get("location")).toBe(`/pay/${id}`);
    await submit(url, card("4000002760003184"));
    const paid = await submit(`${url}/confirm`, { decision: "complete" });
    expect(paid.headers.get("location")).toBe(`http://127.0.0.1:9/paid?session=${id}`);
  });

  it("says that an expired session takes no money", async () => {
    const { id, url } = await newPage();
    await sdk(fake).checkout.sessions.expire(id);
    const page = await (await submit(url, card("4242424242424242"))).text();
    expect(page).toContain("This payment page has expired");
    expect((await sdk(fake).checkout.sessions.retrieve(id)).payment_intent).toBeNull();
  });

  it("says so when there is no such session", async () => {
    const response = await fetch(`${fake.origin}/pay/cs_test_none`);
    expect(response.status).toBe(404);
    expect(await response.text()).toContain("There is no such payment page");
  });
});
