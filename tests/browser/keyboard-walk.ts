import type { Page } from "playwright-core";
import { expect } from "vitest";

/** Most presses of Tab between any two things on a page. */
const mostStops = 150;

interface FocusStop {
  /** "radio duty-street", "button Next: Casting", "a Cart". */
  what: string;
  id: string;
  /** Empty when the stop can be seen; else what is wrong with it. */
  trouble: string;
}

/** What holds the focus, and whether whoever looks at the screen can see that. */
export function focusStop(page: Page): Promise<FocusStop> {
  return page.evaluate(() => {
    const active = document.activeElement;
    if (!(active instanceof HTMLElement) || active === document.body)
      return { what: "nothing", id: "", trouble: "" };
    const kind = active instanceof HTMLInputElement ? active.type : active.tagName.toLowerCase();
    const words = active.getAttribute("aria-label") ?? active.textContent.trim();
    const name = active.matches("input, select, textarea")
      ? active.id
      : words.replaceAll(/\s+/g, " ").slice(0, 80);
    const what = `${kind} ${name}`;
    // A radio of a size chart lies unseen over its cell: the cell shows the focus.
    const unseen = getComputedStyle(active).opacity === "0";
    const seen = unseen ? (active.closest("label") ?? active) : active;
    const box = seen.getBoundingClientRect();
    const at = { x: box.left + box.width / 2, y: box.top + Math.min(box.height, innerHeight) / 2 };
    const over = document.elementFromPoint(at.x, at.y);
    const outline = getComputedStyle(seen);
    const troubles = [
      box.width === 0 || box.height === 0 ? "has no size" : null,
      at.y < 0 || at.y > innerHeight || at.x < 0 || at.x > innerWidth
        ? "lies outside of the window"
        : over === null || !(seen.contains(over) || over.contains(active))
          ? `is hidden under ${over?.outerHTML.slice(0, 80) ?? "nothing"}`
          : null,
      active.tabIndex >= 0 && (outline.outlineStyle === "none" || Number.parseFloat(outline.outlineWidth) < 2)
        ? "shows no outline"
        : null,
    ].filter((trouble) => trouble !== null);
    return { what, id: active.id, trouble: troubles.join(", ") };
  });
}

/** Presses a key and sees to it that what has the focus then can be seen. */
export async function press(page: Page, key: string): Promise<FocusStop> {
  await page.keyboard.press(key);
  const stop = await focusStop(page);
  expect(stop.trouble, stop.what).toBe("");
  return stop;
}

/** Presses Tab until this has the focus. */
export async function tabTo(
  page: Page,
  wanted: RegExp,
  key: "Tab" | "Shift+Tab" = "Tab",
): Promise<FocusStop> {
  const passed: string[] = [];
  for (let stops = 0; stops < mostStops; stops += 1) {
    const stop = await press(page, key);
    if (wanted.test(stop.what)) return stop;
    passed.push(stop.what);
  }
  throw new Error(`Tab never came to ${String(wanted)}; it passed ${passed.join("; ")}`);
}

/** Presses Tab until it leaves the page; how often it stopped on the way. */
export async function tabDown(page: Page): Promise<number> {
  for (let stops = 0; stops < mostStops; stops += 1) {
    if ((await press(page, "Tab")).what === "nothing") return stops;
  }
  throw new Error("Tab never leaves the page");
}

const checkedIn = (page: Page, choice: string) => page.locator(`input[name="${choice}"]:checked`);

/** Chooses an option with Tab, the arrows and the space bar. */
export async function pick(page: Page, choice: string, option: string): Promise<void> {
  let stop = await tabTo(page, new RegExp(`^radio ${choice}-`));
  const first = stop.id;
  while (stop.id !== `${choice}-${option}`) {
    stop = await press(page, "ArrowDown");
    if (stop.id === first) throw new Error(`The arrows never came to ${option}`);
  }
  await press(page, "Space");
  await expect.poll(() => checkedIn(page, choice).getAttribute("value")).toBe(option);
}

/** Goes down the step and takes the first open option wherever nothing is chosen, as far as the last question. */
export async function answerTheRestByKeyboard(page: Page): Promise<void> {
  const questions = await page
    .getByRole("main")
    .locator("fieldset")
    .evaluateAll((sets) => sets.map((set) => set.querySelector<HTMLInputElement>("input[type=radio]")?.name));
  for (const choice of questions) {
    if (choice === undefined) continue;
    await tabTo(page, new RegExp(`^radio ${choice}-`));
    for (let options = 0; options < 60 && (await checkedIn(page, choice).count()) === 0; options += 1) {
      await press(page, options === 0 ? "Space" : "ArrowDown");
    }
    await expect.poll(() => checkedIn(page, choice).count()).toBe(1);
  }
}

/** Enter on what has the focus leads to the next step, whose heading takes the focus. */
export async function enterGoesOn(page: Page, heading: string | RegExp): Promise<void> {
  await page.keyboard.press("Enter");
  await page.getByRole("heading", { level: 1, name: heading }).waitFor();
  await expect.poll(() => page.evaluate(() => document.activeElement?.tagName)).toBe("H1");
}
