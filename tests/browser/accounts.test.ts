import type { Page } from "playwright-core";
import { beforeAll, describe, expect, it } from "vitest";
import { newVisitor } from "../support/browser.ts";
import { startShop, type TestShop } from "../support/test-server.ts";
import { contact, Visitor } from "../support/visitor.ts";
import { paidOrder } from "./shop-state.ts";
import { fillSignIn, signIn } from "./shop-walk.ts";

const password = "tall-iron-in-the-yard";

let shop: TestShop;

beforeAll(async () => {
  shop = await startShop();
});

/** The address in a message that leads to this page. */
async function linkTo(path: string, to: string, subject: RegExp): Promise<string> {
  const { text } = await shop.mail.waitForMessage(to, subject);
  const link = /http:\/\/\S+token=[\w-]+/.exec(text)?.[0] ?? "";
  expect(link).toContain(`${shop.origin}${path}?token=`);
  return link;
}

/** The list of what has to be mended, which must hold the focus. */
async function focusedSummary(page: Page): Promise<string> {
  const summary = page.getByRole("group", { name: /things? to mend|Not signed in/ });
  await summary.waitFor();
  expect(await summary.evaluate((element) => element === document.activeElement)).toBe(true);
  return summary.innerText();
}

const heading = (page: Page) => page.getByRole("heading", { level: 1 });

describe("an account", () => {
  it("is made, confirmed by the mailed link alone, and then holds what was bought as a guest", async () => {
    const { number } = await paidOrder(shop);
    const { page, errors } = await newVisitor();
    await page.goto(`${shop.origin}/account/register`);

    await page.getByLabel("Name").fill(contact.name);
    await page.getByLabel("E-mail").fill("ada@example");
    await page.getByLabel("Password").fill("short");
    await page.getByRole("button", { name: "Make an account" }).click();
    const toMend = await focusedSummary(page);
    expect(toMend).toMatch(/2 things to mend/);
    expect(await page.getByLabel("Name").inputValue()).toBe(contact.name);
    expect(await page.getByLabel("E-mail").inputValue()).toBe("ada@example");
    expect(await page.getByLabel("Password").inputValue()).toBe("short");
    expect(await page.getByLabel("E-mail").getAttribute("aria-invalid")).toBe("true");

    await page.getByLabel("E-mail").fill(contact.email);
    await page.getByLabel("Password").fill(password);
    await page.getByRole("button", { name: "Make an account" }).click();
    await page.getByRole("heading", { name: "Look in your mail" }).waitFor();
    await page.getByRole("main").getByRole("link", { name: "Sign in" }).click();
    await fillSignIn(page, contact.email, password);
    await page.getByRole("heading", { name: "There is no order yet" }).waitFor();

    // Opening the link, as a mail scanner does, confirms nothing; the token leaves the address bar.
    const link = await linkTo("/account/verify", contact.email, /Confirm/);
    expect((await fetch(link)).status).toBe(200);
    await page.goto(link);
    await page.getByRole("heading", { name: "Confirm your e-mail address" }).waitFor();
    await expect.poll(() => page.url()).toBe(`${shop.origin}/account/verify`);
    await page.goto(`${shop.origin}/account`);
    await page.getByText("Not confirmed", { exact: true }).waitFor();

    await page.goto(link);
    await page.getByRole("button", { name: "Confirm the address" }).click();
    await page.getByRole("heading", { name: "Your e-mail address is confirmed" }).waitFor();
    await page.getByRole("main").getByRole("link", { name: "My orders" }).last().click();
    await page
      .getByRole("link", { name: new RegExp(number) })
      .first()
      .click();
    await page.getByRole("heading", { level: 1, name: `Order ${number}` }).waitFor();

    await page.goto(link);
    await page.getByRole("button", { name: "Confirm the address" }).click();
    await page.getByRole("heading", { name: "This link cannot confirm an address" }).waitFor();

    await page.getByRole("button", { name: contact.name }).click();
    await page.getByRole("button", { name: "Sign out" }).click();
    await page.getByRole("banner").getByRole("link", { name: "Sign in" }).waitFor();
    await page.goto(`${shop.origin}/orders/${number}`);
    await page.getByRole("heading", { name: "This order cannot be shown here" }).waitFor();
    expect(errors).toEqual([]);
  });

  it("gets a new password by the mailed link, which ends every other session", async () => {
    const email = "bran@example.com";
    const registered = await new Visitor(shop.origin).post("/api/account/register", {
      name: "Bran Moss",
      email,
      password,
    });
    expect(registered.status).toBe(202);
    const elsewhere = await newVisitor();
    await elsewhere.page.goto(`${shop.origin}/account/sign-in?next=/account`);
    await fillSignIn(elsewhere.page, email, password);
    await elsewhere.page.getByRole("heading", { name: "My account" }).waitFor();

    const { page, errors } = await newVisitor();
    await page.goto(`${shop.origin}/account/sign-in`);
    await page.getByRole("link", { name: "Forgot the password" }).click();
    await page.getByRole("heading", { name: "Forgot the password" }).waitFor();
    await page.getByLabel("E-mail").fill("bran");
    await page.getByRole("button", { name: "Send a link" }).click();
    await focusedSummary(page);
    expect(await page.getByLabel("E-mail").inputValue()).toBe("bran");
    await page.getByLabel("E-mail").fill(email);
    await page.getByRole("button", { name: "Send a link" }).click();
    await page.getByText(/a link to set a new password is on its way/).waitFor();

    const link = await linkTo("/account/reset", email, /new password/);
    await page.goto(link);
    await page.getByRole("heading", { name: "Set a new password" }).waitFor();
    await expect.poll(() => page.url()).toBe(`${shop.origin}/account/reset`);
    await page.getByLabel("New password").fill("short");
    await page.getByRole("button", { name: "Set the new password" }).click();
    await focusedSummary(page);
    await page.getByLabel("New password").fill("slow-river-under-the-mill");
    await page.getByRole("button", { name: "Set the new password" }).click();
    await page.getByRole("heading", { name: "The new password is set" }).waitFor();

    await elsewhere.page.reload();
    await elsewhere.page.waitForURL(/\/account\/sign-in/);

    await page.getByRole("main").getByRole("link", { name: "Sign in" }).click();
    await fillSignIn(page, email, password);
    expect(await focusedSummary(page)).toMatch(/do not fit together/);
    expect(await page.getByLabel("E-mail").inputValue()).toBe(email);
    await fillSignIn(page, email, "slow-river-under-the-mill");
    await page.getByRole("heading", { name: "My orders" }).waitFor();

    // The link works once.
    await page.goto(link);
    await page.getByLabel("New password").fill("a-third-one-by-the-gate");
    await page.getByRole("button", { name: "Set the new password" }).click();
    expect(await focusedSummary(page)).toMatch(/link/);
    expect([...errors, ...elsewhere.errors]).toEqual([]);
  });
});

describe("a door that is closed", () => {
  it("shows no order to another customer, and offers a way on", async () => {
    const { number } = await paidOrder(shop);
    const { page, errors } = await newVisitor();
    await signIn(page, shop.origin, "customer");
    await page.goto(`${shop.origin}/orders/${number}`);
    await page.getByRole("heading", { name: "This order cannot be shown here" }).waitFor();
    const main = page.getByRole("main");
    expect(await main.innerText()).not.toMatch(/Marl|12 Mill Lane|Ada/);
    expect(await main.getByLabel("Order number").inputValue()).toBe(number);
    await main.getByRole("link", { name: "My orders" }).click();
    await page.getByRole("heading", { level: 1, name: "My orders" }).waitFor();
    expect(errors).toEqual([]);
  });

  it.each([
    { role: "customer", place: "/floor" },
    { role: "dealer", place: "/floor/orders/K7Q4-M2XD" },
    { role: "customer", place: "/office" },
    { role: "floor", place: "/office/messages" },
    { role: "planner", place: "/office" },
  ])("keeps $role out of $place", async ({ role, place }) => {
    const { page, errors } = await newVisitor();
    await signIn(page, shop.origin, role);
    await page.goto(`${shop.origin}${place}`);
    await page.getByText(/^The (Floor|Office) is for the shop's/).waitFor();
    expect(await page.getByRole("table").count()).toBe(0);
    expect(errors).toEqual([]);
  });

  it("sends a stranger to sign in, and back to the page that was asked for", async () => {
    const { page, errors } = await newVisitor();
    await page.goto(`${shop.origin}/floor?q=Farrow`);
    await heading(page).getByText("Sign in").waitFor();
    expect(new URL(page.url()).searchParams.get("next")).toBe("/floor?q=Farrow");
    await fillSignIn(page, "floor@osiercreek.example", "osier-creek-demo");
    await page.waitForURL(`${shop.origin}/floor?q=Farrow`);
    await page
      .getByRole("table")
      .or(page.getByRole("heading", { level: 2 }))
      .first()
      .waitFor();
    expect(errors).toEqual([]);
  });

  it("does not lead to another site after signing in", async () => {
    const { page } = await newVisitor();
    await page.goto(`${shop.origin}/account/sign-in?next=${encodeURIComponent("//elsewhere.example/")}`);
    await fillSignIn(page, "floor@osiercreek.example", "osier-creek-demo");
    await page.waitForURL(`${shop.origin}/floor`);
  });

  it("loses nothing when the session ends while a planner writes", async () => {
    const { number } = await paidOrder(shop, { specialRequest: "Please call before pouring." });
    const { page, context } = await newVisitor();
    await signIn(page, shop.origin, "planner");
    const held = page.waitForResponse(/\/open$/);
    await page.goto(`${shop.origin}/floor/orders/${number}`);
    const answer = page.getByLabel("Answer to the special request");
    await answer.fill("We will call you on Monday.");
    await held;
    await context.clearCookies();
    await page.getByRole("button", { name: /^Accept/ }).click();
    const main = page.getByRole("main");
    await main.getByText("You are signed out").waitFor();
    expect(await answer.inputValue()).toBe("We will call you on Monday.");
    await main.getByRole("link", { name: "Sign in" }).click();
    await fillSignIn(page, "planner@osiercreek.example", "osier-creek-demo");
    await page.waitForURL(`${shop.origin}/floor/orders/${number}`);
    await expect.poll(() => answer.inputValue()).toBe("We will call you on Monday.");
  });
});
