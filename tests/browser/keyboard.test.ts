import type { Page } from "playwright-core";
import { beforeAll, describe, expect, it } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { buildToSearch } from "#shared/catalogue/build-address.ts";
import { marl400 } from "../shared/demo/context.ts";
import { newVisitor, viewports } from "../support/browser.ts";
import { startShop, type TestShop } from "../support/test-server.ts";
import {
  answerTheRestByKeyboard,
  enterGoesOn,
  focusStop,
  pick,
  press,
  tabDown,
  tabTo,
} from "./keyboard-walk.ts";
import { buyer } from "./shop-walk.ts";

let shop: TestShop;

beforeAll(async () => {
  shop = await startShop();
});

/** What was read out last. */
const said = (page: Page) => page.locator('p[role="status"]').innerText();
const isChosen = (page: Page, id: string) => page.locator(`[id="${id}"]`).isChecked();

/** Tab to a field, then the text. */
async function type(page: Page, id: string, text: string): Promise<void> {
  const stop = await focusStop(page);
  if (stop.id !== id) await tabTo(page, new RegExp(`^\\S+ ${id.replaceAll(".", "\\.")}$`));
  await page.keyboard.type(text);
}

describe("by keyboard only", () => {
  it(
    "leads from the front door through the form, the cart and the checkout",
    { timeout: 180_000 },
    async () => {
      const { page, errors } = await newVisitor();
      await page.goto(shop.origin);
      await page.getByRole("heading", { level: 1 }).waitFor();
      expect((await press(page, "Tab")).what).toMatch(/^a Skip/);
      await tabTo(page, /^a Start a build/);
      await enterGoesOn(page, "Duty");

      await pick(page, "duty", "street");
      await pick(page, "induction", "naturallyAspirated");
      await enterGoesOn(page, "Casting");
      await pick(page, "family", "marl");
      await expect.poll(() => said(page)).toMatch(/^Price \$[\d,]+\.\d\d; ships \d{1,2} [A-Z][a-z]+ \d{4}/);
      await answerTheRestByKeyboard(page);
      await enterGoesOn(page, "Bore and deck");

      // On the chart of sizes, digits go to the size, and the space bar chooses it.
      await tabTo(page, /^radio bore-/);
      for (const digit of "4.125") await press(page, digit);
      await press(page, "Space");
      expect(await isChosen(page, "bore-b4125")).toBe(true);
      await answerTheRestByKeyboard(page);
      await enterGoesOn(page, "Bottom end");
      await answerTheRestByKeyboard(page);
      await enterGoesOn(page, "Rotating assembly");

      await pick(page, "strokeClearance", "asCast");
      await closedOptionIsMendedAndUndone(page);

      while (!page.url().includes("/build/review")) {
        await answerTheRestByKeyboard(page);
        await enterGoesOn(page, await nextStep(page));
      }

      await type(page, "specialRequest", "Please call before pouring.");
      await tabTo(page, /^button Put in the cart/);
      await page.keyboard.press("Enter");
      await page.getByRole("link", { name: "Check out" }).waitFor();
      await tabTo(page, /^a Check out/);
      await enterGoesOn(page, "Check out");

      await tabTo(page, /^text contact\.name$/);
      await page.keyboard.type(buyer.name);
      await type(page, "contact.email", buyer.email);
      await type(page, "contact.phone", buyer.phone);
      await type(page, "delivery.address.line1", "12 Mill Lane");
      await type(page, "delivery.address.city", "Ashford");
      await tabTo(page, /^select/);
      await page.keyboard.type("Tenn");
      await type(page, "delivery.address.postalCode", "37203");
      await tabTo(page, /^button Pay \$/);
      await expect
        .poll(() => page.getByRole("button", { name: /^Pay \$/ }).innerText())
        .toMatch(/\$[\d,]+\.\d\d/);
      await page.keyboard.press("Enter");
      await page.getByLabel("Card number").waitFor();
      expect(errors).toEqual([]);
    },
  );
});

/** The heading of the step that the button at the foot leads to. */
async function nextStep(page: Page): Promise<string> {
  const words = await page.getByRole("button", { name: /^Next/ }).last().innerText();
  return words.replace(/^Next: /, "");
}

/** The 3.875 stroke does not clear the case as cast. */
async function closedOptionIsMendedAndUndone(page: Page): Promise<void> {
  const wanted = "rotatingAssembly-s3875r6000steel";
  const closed = page.locator(`[id="${wanted}"]`);
  let stop = await tabTo(page, /^radio rotatingAssembly-/, "Shift+Tab");
  const first = stop.id;
  while (stop.id !== wanted) {
    stop = await press(page, "ArrowDown");
    if (stop.id === first) throw new Error("The arrows never came to the 3.875 stroke");
  }
  expect(await closed.getAttribute("aria-disabled")).toBe("true");
  const described = ((await closed.getAttribute("aria-describedby")) ?? "").split(" ");
  const reason = await Promise.all(described.map((id) => page.locator(`[id="${id}"]`).innerText()));
  expect(reason.join(" ")).toMatch(/rod.*case/i);
  await press(page, "Space");
  expect(await closed.isChecked()).toBe(false);

  expect((await press(page, "Tab")).what).toMatch(/^button Also change stroke clearance/);
  await page.keyboard.press("Enter");
  await expect.poll(() => closed.isChecked()).toBe(true);
  await expect.poll(async () => (await focusStop(page)).id).toMatch(/^strokeClearance-/);
  const changed = await focusStop(page);
  expect(changed.trouble).toBe("");
  expect(await isChosen(page, changed.id)).toBe(true);
  await expect
    .poll(() => said(page))
    .toMatch(/^Stroke clearance changed to .*Price \$[\d,.]+, up \$[\d,.]+;/);

  await page.keyboard.press("Control+z");
  await expect.poll(() => isChosen(page, "strokeClearance-asCast")).toBe(true);
  expect(await closed.isChecked()).toBe(false);
  await expect.poll(() => said(page)).toMatch(/^Undone\. /);
  await page.keyboard.press("Control+Shift+z");
  await expect.poll(() => closed.isChecked()).toBe(true);
  await expect.poll(() => said(page)).toMatch(/^Done again\. /);
}

describe("the focus", () => {
  const query = new URLSearchParams(buildToSearch(demoCatalogue, marl400)).toString();

  it.each(Object.entries(viewports))(
    "is never hidden on the way down and up a step, %s",
    async (_size, viewport) => {
      const { page } = await newVisitor({ viewport });
      for (const step of ["bore-and-deck", "rotating-assembly"]) {
        await page.goto(`${shop.origin}/build/${step}?${query}`);
        await page.getByRole("heading", { level: 1 }).waitFor();
        const stops = await tabDown(page);
        expect(stops).toBeGreaterThan(20);
        for (let stop = 0; stop < stops; stop += 1) await press(page, "Shift+Tab");
      }
    },
  );
});
