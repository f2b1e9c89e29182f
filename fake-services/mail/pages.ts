import type { StoredMessage } from "./message.ts";

const style = `
:root { color-scheme: light; }
* { box-sizing: border-box; }
body { margin: 0; padding: 32px 24px; background: #F7F5F0; color: #1B1F23; font: 16px/1.5 Barlow, system-ui, sans-serif; }
main { max-width: 72rem; margin: 0 auto; }
h1 { font: 600 1.75rem/1.2 "Barlow Condensed", Barlow, system-ui, sans-serif; margin: 0 0 4px; }
p.about { margin: 0 0 24px; color: #4A5158; }
a { color: #1F4AA8; }
table { width: 100%; border-collapse: collapse; background: #FFFFFF; border-top: 2px solid #1B1F23; }
th, td { text-align: left; padding: 10px 12px; border-bottom: 1px solid #D5D2CA; vertical-align: top; overflow-wrap: anywhere; }
th { font-weight: 600; }
td.when { white-space: nowrap; font-variant-numeric: tabular-nums; }
dl { display: grid; grid-template-columns: max-content 1fr; margin: 0 0 24px; background: #FFFFFF; border: 1px solid #1B1F23; }
dt, dd { margin: 0; padding: 6px 12px; border-bottom: 1px solid #D5D2CA; overflow-wrap: anywhere; }
dt { font-weight: 600; border-right: 1px solid #D5D2CA; }
.sheets { display: grid; grid-template-columns: repeat(auto-fit, minmax(min(100%, 26rem), 1fr)); gap: 24px; }
h2 { font: 600 1.125rem/1.2 "Barlow Condensed", Barlow, system-ui, sans-serif; margin: 0 0 8px; }
iframe, pre { width: 100%; min-height: 36rem; margin: 0; background: #FFFFFF; border: 1px solid #1B1F23; }
pre { padding: 16px; white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; }
@media (max-width: 40rem) { table, tbody, tr, td { display: block; } thead { display: none; } td { border: 0; padding: 2px 12px; } tr { display: block; padding: 10px 0; border-bottom: 1px solid #D5D2CA; } }
`;

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${String(character.charCodeAt(0))};`);
}

/** Escaped text in which web addresses are links. */
function withLinks(text: string): string {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .map((part, index) => {
      const safe = escapeHtml(part);
      return index % 2 === 1 ? `<a href="${safe}" target="_blank" rel="noreferrer">${safe}</a>` : safe;
    })
    .join("");
}

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escapeHtml(title)}</title><style>${style}</style></head><body><main>${body}</main></body></html>`;
}

const when = (message: StoredMessage): string => message.receivedAt.replace("T", " ").slice(0, 19);

export function listPage(messages: readonly StoredMessage[]): string {
  const rows = messages
    .toReversed()
    .map(
      (message) =>
        `<tr><td class="when">${when(message)}</td><td>${escapeHtml(message.to.join(", "))}</td>` +
        `<td><a href="/read/${message.id}">${escapeHtml(message.subject || "(no subject)")}</a>` +
        `${message.copies > 1 ? ` (came ${String(message.copies)} times)` : ""}</td></tr>`,
    )
    .join("");
  const table = `<table><thead><tr><th scope="col">Received (UTC)</th><th scope="col">To</th><th scope="col">Subject</th></tr></thead><tbody>${rows}</tbody></table>`;
  const empty = "<p>No message has come in yet.</p>";
  return page(
    "Test mailbox",
    `<h1>Test mailbox</h1><p class="about">Every e-mail that the demo sends ends here; none leaves this machine.</p>${messages.length > 0 ? table : empty}`,
  );
}

export function messagePage(message: StoredMessage): string {
  const facts: [string, string][] = [
    ["From", message.from],
    ["To", message.to.join(", ")],
    ["Received (UTC)", when(message)],
    ["Message-ID", message.messageId],
    ["Came", message.copies === 1 ? "once" : `${String(message.copies)} times`],
  ];
  const list = facts.map(([term, value]) => `<dt>${term}</dt><dd>${escapeHtml(value)}</dd>`).join("");
  const html =
    message.html === null
      ? ""
      : `<section><h2>As HTML</h2><iframe title="The message as HTML" sandbox="allow-popups allow-popups-to-escape-sandbox" src="/read/${message.id}/html"></iframe></section>`;
  return page(
    message.subject,
    `<p><a href="/">All messages</a></p><h1>${escapeHtml(message.subject)}</h1><dl>${list}</dl>` +
      `<div class="sheets">${html}<section><h2>As plain text</h2><pre>${withLinks(message.text)}</pre></section></div>`,
  );
}

/** The message's own HTML; its links open beside the mailbox. */
export function framedHtml(html: string): string {
  return `<base target="_blank">${html}`;
}

export function missingPage(): string {
  return page("No such message", '<h1>No such message</h1><p><a href="/">All messages</a></p>');
}
