import { beforeAll, expect, test } from "vitest";
import { factoryPassword, makePerson, makeShop } from "#tests/support/factories.ts";
import { startServer, type TestServer } from "#tests/support/test-server.ts";

const publicOrigin = "https://shop.example";
// What a proxy that ends TLS says.
const forwarded = { "X-Forwarded-Proto": "https", "X-Forwarded-For": "203.0.113.7" };
let server: TestServer;

beforeAll(async () => {
  await makeShop();
  server = await startServer({
    DATABASE_URL: process.env["DATABASE_URL"] ?? "",
    PUBLIC_ORIGIN: publicOrigin,
    TRUST_PROXY: "1",
  });
});

// OWASP ASVS 5.0: 3.3.1, 3.3.3, 3.4.1.
test("a shop with an https address holds the browser to it", async () => {
  const first = await fetch(`${server.origin}/api/session`, { headers: forwarded });
  expect(first.headers.get("strict-transport-security")).toMatch(/max-age=31536000/);
  expect(first.headers.get("content-security-policy")).toContain("upgrade-insecure-requests");
  const [csrf = ""] = first.headers.getSetCookie();
  expect(csrf).toMatch(/^__Host-blockwright-csrf=.*Path=\/;.*HttpOnly; Secure; SameSite=Lax$/);
  expect(csrf).not.toContain("Domain");

  const person = await makePerson();
  const { csrfToken } = (await first.json()) as { csrfToken: string };
  const signedIn = await fetch(`${server.origin}/api/account/sign-in`, {
    method: "POST",
    headers: {
      ...forwarded,
      Origin: publicOrigin,
      Cookie: csrf.split(";")[0] ?? "",
      "X-CSRF-Token": csrfToken,
      "Content-Type": "application/json",
    },
    body: JSON.stringify({ email: person.email, password: factoryPassword }),
  });
  expect(signedIn.status).toBe(200);
  const session = signedIn.headers
    .getSetCookie()
    .find((cookie) => cookie.startsWith("__Host-blockwright-session="));
  expect(session).toMatch(/Secure/);
  expect(session).toMatch(/HttpOnly/);
  expect(session).toMatch(/SameSite=Lax/);
});

test("the address of the client is the one that the trusted proxy names", () => {
  expect(server.output()).toContain('"address":"203.0.113.7"');
});
