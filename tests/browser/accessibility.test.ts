import type { BrowserContext, Page } from "playwright-core";
import { beforeAll, describe, expect, it } from "vitest";
import { axeViolations, newVisitor, viewports } from "../support/browser.ts";
import { startShop, type TestShop } from "../support/test-server.ts";
import { prepareShop, shopPages, type PreparedShop, type ShopPage } from "./pages.ts";
import { become } from "./shop-state.ts";

/** The narrowest phone that is still common. */
const narrowest = { width: 360, height: 740 };

let shop: TestShop;
let prepared: PreparedShop;
let context: BrowserContext;
/** What pages wrote to the console as errors since it was last emptied. */
let consoleErrors: string[] = [];

beforeAll(async () => {
  shop = await startShop();
  prepared = await prepareShop(shop);
  const visitor = await newVisitor();
  context = visitor.context;
  await visitor.page.close();
  // As the device says on the Floor too, so that both themes can be looked at.
  await context.addInitScript(() => {
    // A page begins blank, and has no storage then.
    if (location.protocol.startsWith("http")) localStorage.setItem("theme", "system");
  });
  context.on("weberror", (error) => consoleErrors.push(error.error().message));
  context.on("console", (message) => {
    // The browser itself notes every refusal of the server, and the pages say it in words.
    const refusal = /^Failed to load resource: the server responded with a status of 4\d\d/;
    if (message.type() === "error" && !refusal.test(message.text())) consoleErrors.push(message.text());
  });
});

/** Opens a page as its reader and waits until nothing is on its way any more. */
async function open(shopPage: ShopPage): Promise<Page> {
  const page = await context.newPage();
  await become(context, prepared.readers[shopPage.reader]);
  const path = typeof shopPage.path === "string" ? shopPage.path : shopPage.path(prepared);
  await page.goto(`${shop.origin}${path}`);
  await page.getByRole("heading", { level: 1, name: shopPage.shows }).first().waitFor();
  await expect.poll(() => page.locator(".animate-pulse").count()).toBe(0);
  await shopPage.then?.(page);
  await page.evaluate(() => document.fonts.ready);
  return page;
}

/** How many pixels the page is wider than the window. */
const overflow = (page: Page) =>
  page.evaluate(() => (document.scrollingElement?.scrollWidth ?? 0) - window.innerWidth);

describe("every page, at desk and phone, by day and by night", () => {
  it.each(shopPages)("$name", async (shopPage) => {
    consoleErrors = [];
    const page = await open(shopPage);
    try {
      const found: string[] = [];
      for (const [size, viewport] of Object.entries(viewports)) {
        await page.setViewportSize(viewport);
        for (const colorScheme of ["light", "dark"] as const) {
          await page.emulateMedia({ colorScheme });
          // By night only the colours differ.
          const rules = colorScheme === "light" ? undefined : ["color-contrast"];
          for (const violation of await axeViolations(page, rules)) {
            found.push(`${size}, ${colorScheme}: ${violation}`);
          }
        }
      }
      expect(found).toEqual([]);
      expect(await overflow(page), "overflow at 390 px").toBeLessThanOrEqual(0);
      await page.setViewportSize(narrowest);
      expect(await overflow(page), "overflow at 360 px").toBeLessThanOrEqual(0);
      expect(consoleErrors).toEqual([]);
    } finally {
      await page.close();
    }
  });
});
