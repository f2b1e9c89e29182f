import { beforeAll, describe, expect, it } from "vitest";
import { newVisitor } from "../support/browser.ts";
import { startShop, type TestShop } from "../support/test-server.ts";
import { buyer, choose, configureMarl, finishBuild, orderAsGuest, payWith, signIn } from "./shop-walk.ts";

/** Published test cards (references.md 8.4). */
const succeeds = "4242424242424242";
const declined = "4000000000000002";

let shop: TestShop;

beforeAll(async () => {
  shop = await startShop();
});

describe("the main job", () => {
  it("from a choice to the shop's promise: configure, pay, accept, and both e-mails", async () => {
    const { page, errors } = await newVisitor();
    await configureMarl(page, shop.origin);

    // As cast, the case does not clear a 3.875 stroke, and the form says so before it is chosen.
    await choose(page, /How far is the case relieved/, /^As cast/);
    const closed = page.getByRole("radio", { name: /3\.875/ }).first();
    await expect.poll(() => closed.getAttribute("aria-disabled")).toBe("true");
    const descriptions = ((await closed.getAttribute("aria-describedby")) ?? "").split(" ");
    const reason = await Promise.all(descriptions.map((id) => page.locator(`[id="${id}"]`).innerText()));
    expect(reason.join(" ")).toMatch(/rod.*case/i);
    await page
      .getByRole("radio", { name: /3\.750.*6\.000.*steel/i })
      .first()
      .check();
    await finishBuild(page);
    await page.getByText("400.9").first().waitFor();
    await page.getByLabel(/special request/i).fill("Please call before pouring.");
    await orderAsGuest(page);
    await payWith(page, succeeds);

    await page.waitForURL(/\/checkout\/return|\/orders\//);
    const receipt = await shop.mail.waitForMessage(buyer.email, /receipt/);
    const number = /Order (\S+):/.exec(receipt.subject)?.[1] ?? "";
    await page.getByText(number).first().waitFor();

    // Somebody else's browser, with nothing but the mail, sees the order and leaves no token in the address.
    const reader = await newVisitor();
    const link = /http:\/\/\S+\/order-link\/\S+/.exec(receipt.text)?.[0] ?? "";
    await reader.page.goto(link);
    await reader.page.getByRole("heading", { name: new RegExp(number) }).waitFor();
    expect(reader.page.url()).toBe(`${shop.origin}/orders/${number}`);

    const planner = await newVisitor();
    await signIn(planner.page, shop.origin, "planner");
    await planner.page.goto(`${shop.origin}/floor`);
    await planner.page
      .getByRole("link", { name: new RegExp(number) })
      .first()
      .click();
    await planner.page.getByLabel("Answer to the special request").fill("We will call you on Monday.");
    await planner.page.getByRole("button", { name: /^Accept/ }).click();
    await planner.page.getByText("Accepted", { exact: true }).first().waitFor();

    const accepted = await shop.mail.waitForMessage(buyer.email, new RegExp(`${number}: accepted`));
    expect(accepted.text).toMatch(/Promised ship date: \d{1,2} [A-Z][a-z]+ \d{4}/);
    expect(accepted.text).toContain("We will call you on Monday.");
    await reader.page.reload();
    await reader.page.getByText("Accepted", { exact: true }).first().waitFor();
    expect([...errors, ...reader.errors, ...planner.errors]).toEqual([]);
  });

  it("goes on after a declined card", async () => {
    const { page } = await newVisitor();
    await configureMarl(page, shop.origin);
    await finishBuild(page);
    await orderAsGuest(page, "pick-up");
    await payWith(page, declined);
    await page
      .getByText(/declined/i)
      .first()
      .waitFor();
    await payWith(page, succeeds);
    await page.waitForURL(/\/checkout\/return|\/orders\//);
    await page
      .getByText(/[0-9A-Z]{4}-[0-9A-Z]{4}/)
      .first()
      .waitFor();
  });

  it("keeps the build through reload, Back and a shared address", async () => {
    const { page, context } = await newVisitor();
    await configureMarl(page, shop.origin);
    const address = page.url();
    await page.reload();
    expect(page.url()).toBe(address);
    await page.goBack();
    await page.goForward();
    expect(page.url()).toBe(address);
    const other = await context.newPage();
    await other.goto(address);
    await other.getByRole("heading", { level: 1 }).waitFor();
    expect(await other.getByText("Marl").first().isVisible()).toBe(true);
  });
});
