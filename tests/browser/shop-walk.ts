import type { Page } from "playwright-core";
import { expect } from "vitest";

/** What people do on the screens, in their words: the steps that several stories share. */

export const buyer = { name: "Ada Farrow", email: "ada@example.com", phone: "(615) 555-0134" };

/** Goes on to the next step of the build. */
async function goOn(page: Page): Promise<void> {
  const heading = await page.getByRole("heading", { level: 1 }).innerText();
  await page.getByRole("button", { name: /^Next/ }).first().click();
  await expect.poll(() => page.getByRole("heading", { level: 1 }).innerText()).not.toBe(heading);
}

/** Chooses an option by its name. */
export async function choose(page: Page, question: RegExp, option: RegExp): Promise<void> {
  await page.getByRole("group", { name: question }).getByRole("radio", { name: option }).first().check();
}

/** Answers every question of this step that has no answer yet with its first open option. */
async function answerTheRest(page: Page): Promise<void> {
  const questions = page.getByRole("group").filter({ has: page.getByRole("radio") });
  for (let index = 0; index < (await questions.count()); index += 1) {
    const question = questions.nth(index);
    if ((await question.getByRole("radio", { checked: true }).count()) > 0) continue;
    await question.locator('input[type="radio"]:not([aria-disabled="true"])').first().check();
  }
}

/** Works out a Marl of 4.125 x 3.750 from the front door to the review. */
export async function configureMarl(page: Page, origin: string): Promise<void> {
  await page.goto(origin);
  await page.getByRole("main").getByRole("link", { name: "Start a build" }).first().click();
  await choose(page, /What will the engine do/, /^Street/);
  await choose(page, /How does the engine breathe/, /^Naturally aspirated/);
  await goOn(page);
  await choose(page, /Which casting/, /^Marl/);
  await answerTheRest(page);
  await goOn(page);
  await choose(page, /finish bore/, /^4\.125/);
  await choose(page, /cylinders delivered/, /^Semi-finished/);
  await answerTheRest(page);
  await goOn(page);
  await answerTheRest(page);
  await goOn(page);
}

/** Answers what is left, step by step, until the review. */
export async function finishBuild(page: Page): Promise<void> {
  for (let steps = 0; steps < 8; steps += 1) {
    if (new URL(page.url()).pathname === "/build/review") return;
    await answerTheRest(page);
    await goOn(page);
  }
  throw new Error(`The review was never reached: ${page.url()}`);
}

/** From the review to the payment page, as a guest who picks the block up. */
export async function orderAsGuest(page: Page, delivery: "freight" | "pick-up" = "freight"): Promise<void> {
  await page.getByRole("button", { name: "Put in the cart" }).click();
  await page.getByRole("link", { name: "Check out" }).click();
  await page.getByLabel("Name", { exact: true }).fill(buyer.name);
  await page.getByLabel("E-mail").fill(buyer.email);
  await page.getByLabel("Telephone").fill(buyer.phone);
  if (delivery === "pick-up") {
    await page.getByRole("radio", { name: /Picked up/ }).check();
  } else {
    await page.getByLabel("Street and number").fill("12 Mill Lane");
    await page.getByLabel("City").fill("Ashford");
    await page.getByLabel("State", { exact: true }).selectOption("TN");
    await page.getByLabel("ZIP code").fill("37203");
  }
  await page.getByRole("button", { name: /^Pay \$/ }).click();
  await page.getByLabel("Card number").waitFor();
}

/** Fills the payment page. */
export async function payWith(page: Page, card: string): Promise<void> {
  await page.getByLabel("Card number").fill(card);
  await page.getByLabel("Expiry").fill("12 / 34");
  await page.getByLabel("CVC").fill("123");
  await page.getByLabel("Name on card").fill(buyer.name);
  await page.getByRole("button", { name: /^Pay/ }).click();
}

/** Signs in with a demo account. */
export async function signIn(page: Page, origin: string, role: string): Promise<void> {
  await page.goto(`${origin}/account/sign-in`);
  await fillSignIn(page, `${role}@osiercreek.example`, "osier-creek-demo");
  await page.waitForURL((url) => url.pathname !== "/account/sign-in");
}

/** On the sign-in page. */
export async function fillSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
}
