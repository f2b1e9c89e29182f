import { html, type Html } from "./html.ts";

/** The frame of every payment page. */
export function page(title: string, merchant: string, content: Html): string {
  const { markup } = html`<html lang="en">
    <head>
      <meta charset="utf-8" />
      <meta name="viewport" content="width=device-width, initial-scale=1" />
      <title>${title} - ${merchant}</title>
      <link rel="stylesheet" href="/pay/style.css" />
      <link rel="icon" href="data:," />
    </head>
    <body>
      <header class="notice">Test payment page: no real card is charged</header>
      <main>
        <p class="merchant">${merchant}</p>
        ${content}
      </main>
    </body>
  </html>`;
  return `<!doctype html>\n${markup}`;
}

/** Cents as dollars and cents, or with the currency's code where it is another. */
export function money(cents: number, currency: string): string {
  return new Intl.NumberFormat("en-US", { style: "currency", currency: currency.toUpperCase() }).format(
    cents / 100,
  );
}

export const styleSheet = `
:root { color-scheme: light; --paper: #f7f5f0; --sheet: #ffffff; --ink: #1b1f23; --grey: #565d64; --rule: #b9b4a8;
  --pour: #b8430b; --dye: #1f4aa8; --stop: #b3261e; --caution: #fff4d6; }
* { box-sizing: border-box; }
body { margin: 0; background: var(--paper); color: var(--ink); font: 16px/1.5 system-ui, sans-serif; }
.notice { margin: 0; padding: 8px 16px; background: var(--caution); border-bottom: 1px solid var(--rule); text-align: center; font-weight: 600; }
main { max-width: 34rem; margin: 0 auto; padding: 32px 16px 64px; }
.merchant { margin: 0; color: var(--grey); }
h1 { margin: 0 0 24px; font-size: 1.75rem; line-height: 1.2; }
h2 { margin: 32px 0 8px; font-size: 1.125rem; border-bottom: 1px solid var(--rule); }
table { width: 100%; border-collapse: collapse; font-variant-numeric: tabular-nums; }
th, td { padding: 8px 0; text-align: left; vertical-align: top; border-bottom: 1px solid var(--rule); font-weight: 400; }
td { padding-left: 16px; text-align: right; white-space: nowrap; }
tfoot th, tfoot td { font-weight: 600; border-bottom: 0; }
.details { display: block; color: var(--grey); font-size: 0.875rem; }
label { display: block; margin-top: 16px; font-weight: 600; }
.hint { display: block; color: var(--grey); font-size: 0.875rem; font-weight: 400; }
input { width: 100%; min-height: 48px; padding: 8px 12px; font: inherit; color: inherit; background: var(--sheet); border: 1px solid var(--grey); border-radius: 2px; }
input[aria-invalid="true"] { border: 2px solid var(--stop); }
:focus-visible { outline: 3px solid var(--dye); outline-offset: 2px; }
.pair { display: grid; grid-template-columns: 1fr 1fr; gap: 16px; align-items: end; }
.problem { margin: 16px 0 -12px; color: var(--stop); font-weight: 600; }
.pair .problem { margin-bottom: -12px; }
.refused { margin: 24px 0; padding: 12px 16px; background: var(--sheet); border-left: 4px solid var(--stop); color: var(--stop); font-weight: 600; }
button { width: 100%; min-height: 48px; margin-top: 24px; font: inherit; font-weight: 600; color: #ffffff; background: var(--pour); border: 1px solid var(--pour); border-radius: 2px; cursor: pointer; }
button.second { margin-top: 12px; color: var(--ink); background: var(--sheet); border-color: var(--grey); }
a { color: var(--dye); }
.back { margin-top: 24px; }
@media (max-width: 24rem) { .pair { grid-template-columns: 1fr; gap: 0; } }
`;
