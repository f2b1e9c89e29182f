import type { ShopView } from "#shared/contracts/session.ts";

/** A part of a message. Every message is made of these alone, so that its text and its HTML say the same. */
export type LetterPart =
  | { part: "paragraph"; text: string }
  | { part: "rows"; rows: readonly (readonly [label: string, value: string])[] }
  | { part: "list"; items: readonly string[] }
  /** What to do next. */
  | { part: "action"; label: string; url: string }
  | { part: "caution"; text: string };

export interface Letter {
  subject: string;
  parts: readonly LetterPart[];
}

export interface WrittenLetter {
  subject: string;
  text: string;
  html: string;
}

/** Puts a letter on the shop's letterhead, as plain text and as HTML. */
export function writeLetter(letter: Letter, shop: ShopView): WrittenLetter {
  return { subject: letter.subject, text: asText(letter, shop), html: asHtml(letter, shop) };
}

const letterhead = (shop: ShopView): string[] => [
  shop.name,
  ...shop.addressLines,
  readablePhone(shop.phone),
  shop.email,
];

function readablePhone(phone: string): string {
  const parts = /^\+1(\d{3})(\d{3})(\d{4})$/.exec(phone);
  return parts ? `${parts[1] ?? ""}-${parts[2] ?? ""}-${parts[3] ?? ""}` : phone;
}

function asText({ subject, parts }: Letter, shop: ShopView): string {
  const body = parts.map((part) => {
    switch (part.part) {
      case "paragraph":
        return part.text;
      case "rows":
        return part.rows.map(([label, value]) => `${label}: ${value}`).join("\n");
      case "list":
        return part.items.map((item) => `- ${item}`).join("\n");
      case "action":
        return `${part.label}:\n${part.url}`;
      case "caution":
        return `Caution: ${part.text}`;
    }
  });
  return `${[subject, ...body, `-- \n${letterhead(shop).join("\n")}`].join("\n\n")}\n`;
}

const escapes: Record<string, string> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};
const html = (text: string): string =>
  text.replace(/[&<>"']/g, (character) => escapes[character] ?? character);

const font = "font-family:Barlow,Helvetica,Arial,sans-serif";
const condensed = "font-family:'Barlow Condensed',Barlow,Helvetica,Arial,sans-serif";

/** In dark mail clients paper and ink change places; the colours are the product's own. */
const style = `
  :root { color-scheme: light dark; }
  @media (prefers-color-scheme: dark) {
    .paper { background: #14171A !important; }
    .sheet { background: #1B1F23 !important; }
    .ink, .ink td, .ink p, .ink li, .ink h1 { color: #F7F5F0 !important; }
    .quiet { color: #B9BEC3 !important; }
    .action a { background: #E2783F !important; color: #14171A !important; }
  }`;

function partAsHtml(part: LetterPart): string {
  switch (part.part) {
    case "paragraph":
      return `<p style="margin:0 0 16px">${html(part.text).replaceAll("\n", "<br>")}</p>`;
    case "rows":
      return `<table role="presentation" cellpadding="0" cellspacing="0" style="width:100%;margin:0 0 16px;border-collapse:collapse">${part.rows
        .map(
          ([label, value]) =>
            `<tr><td class="quiet" style="padding:6px 16px 6px 0;border-top:1px solid #8A9096;color:#565D63;vertical-align:top">${html(label)}</td><td style="padding:6px 0;border-top:1px solid #8A9096;text-align:right;font-variant-numeric:tabular-nums">${html(value)}</td></tr>`,
        )
        .join("")}</table>`;
    case "list":
      return `<ul style="margin:0 0 16px;padding-left:20px">${part.items.map((item) => `<li>${html(item)}</li>`).join("")}</ul>`;
    case "action":
      return `<p class="action" style="margin:24px 0"><a href="${html(part.url)}" style="display:inline-block;padding:12px 20px;background:#B8430B;color:#FFFFFF;text-decoration:none;border-radius:2px;font-weight:600">${html(part.label)}</a></p><p class="quiet" style="margin:0 0 16px;font-size:14px;color:#565D63;word-break:break-all">${html(part.url)}</p>`;
    case "caution":
      return `<p style="margin:0 0 16px;padding-left:12px;border-left:3px solid #8A5A00"><strong>Caution.</strong> ${html(part.text)}</p>`;
  }
}

function asHtml({ subject, parts }: Letter, shop: ShopView): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<meta name="color-scheme" content="light dark">
<title>${html(subject)}</title>
<style>${style}</style>
</head>
<body class="paper" style="margin:0;padding:0;background:#F7F5F0">
<table role="presentation" class="paper" cellpadding="0" cellspacing="0" style="width:100%;background:#F7F5F0"><tr><td style="padding:24px 12px">
<table role="presentation" class="sheet ink" cellpadding="0" cellspacing="0" style="width:100%;max-width:600px;margin:0 auto;background:#FFFFFF;color:#1B1F23;${font};font-size:16px;line-height:1.5">
<tr><td style="padding:16px 24px;border-bottom:1px solid #8A9096;${condensed};font-weight:600;font-size:20px">${html(shop.name)}</td></tr>
<tr><td style="padding:24px">
<h1 style="margin:0 0 16px;${condensed};font-weight:600;font-size:26px;line-height:1.2">${html(subject)}</h1>
${parts.map(partAsHtml).join("\n")}
</td></tr>
<tr><td class="quiet" style="padding:16px 24px;border-top:1px solid #8A9096;font-size:14px;color:#565D63">${letterhead(shop).map(html).join("<br>")}</td></tr>
</table>
</td></tr></table>
</body>
</html>
`;
}
