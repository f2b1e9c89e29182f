import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import type { AxeResults, RunOptions } from "axe-core";
import { type Browser, type BrowserContext, chromium, type Page } from "playwright-core";
import { atEndOfFile } from "./end-of-file.ts";

/** Widths that people meet: a desk and a phone, in CSS pixels. */
export const viewports = { wide: { width: 1280, height: 900 }, phone: { width: 390, height: 844 } } as const;

const flags = [
  "--no-sandbox",
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

let running: Promise<Browser> | undefined;

/** Debian's Chromium, one for a test file. */
function browser(): Promise<Browser> {
  running ??= chromium.launch({ executablePath: "/usr/bin/chromium", args: flags }).then((started) => {
    atEndOfFile(() => started.close());
    return started;
  });
  return running;
}

/**
 * A fresh visitor: no cookies, nothing kept. Every error that a page throws fails the test that looks at `errors`.
 */
export async function newVisitor(
  options: { viewport?: { width: number; height: number }; colorScheme?: "light" | "dark" } = {},
): Promise<{ page: Page; context: BrowserContext; errors: string[] }> {
  const context = await (
    await browser()
  ).newContext({ viewport: viewports.wide, reducedMotion: "reduce", ...options });
  context.setDefaultTimeout(15_000);
  const errors: string[] = [];
  context.on("weberror", (error) => errors.push(error.error().message));
  const page = await context.newPage();
  return { page, context, errors };
}

const axeSource = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

/** What axe-core finds wrong on the page as it stands, by all its rules or those named: one line for each rule and element. */
export async function axeViolations(page: Page, rules?: string[]): Promise<string[]> {
  if (!(await page.evaluate(() => "axe" in globalThis))) await page.evaluate(axeSource);
  const results = await page.evaluate(async (only) => {
    const { axe } = globalThis as typeof globalThis & {
      axe: { run: (options: RunOptions) => Promise<AxeResults> };
    };
    return axe.run({ resultTypes: ["violations"], ...(only === undefined ? {} : { runOnly: only }) });
  }, rules);
  return results.violations.flatMap((violation) =>
    violation.nodes.map(
      (node) =>
        `${violation.id} (${violation.impact ?? "?"}): ${node.target.join(" ")} ${node.html.slice(0, 160)}`,
    ),
  );
}
