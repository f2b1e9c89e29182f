/** Markup that is safe to put into a page as it stands. */
export interface Html {
  markup: string;
}

type Content = string | Html | Html[] | undefined;

/** Builds markup; whatever is not markup already is escaped. */
export function html(parts: TemplateStringsArray, ...contents: Content[]): Html {
  const markup = parts.reduce((before, part, place) => before + markupOf(contents[place - 1]) + part);
  return { markup };
}

function markupOf(content: Content): string {
  if (content === undefined) return "";
  if (typeof content === "string") return escaped(content);
  if (Array.isArray(content)) return content.map((one) => one.markup).join("");
  return content.markup;
}

function escaped(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}
