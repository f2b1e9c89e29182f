// @vitest-environment node
import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { tokens } from "../../tailwind.config.ts";

/** Relative luminance and contrast ratio as WCAG 2.2 defines them (w3.org/TR/WCAG22, definitions). */
function luminance(colour: string): number {
  const [red, green, blue] = [1, 3, 5].map((start) => {
    const channel = Number.parseInt(colour.slice(start, start + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * (red ?? NaN) + 0.7152 * (green ?? NaN) + 0.0722 * (blue ?? NaN);
}

function contrast(one: string, other: string): number {
  const [dark, light] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return ((light ?? NaN) + 0.05) / ((dark ?? NaN) + 0.05);
}

type Token = keyof typeof tokens.light;

const surfaces: Token[] = ["paper", "sheet", "wash"];
const texts: Token[] = ["ink", "iron", "dye", "pour", "pass", "caution", "stop"];
const everywhere = texts.flatMap((text) => surfaces.map((surface): [Token, Token] => [text, surface]));

/** Text, 4.5 to 1 (success criterion 1.4.3). */
const textPairs: [Token, Token][] = [
  ...everywhere,
  ...(["dye-wash", "pass-wash", "caution-wash", "stop-wash"] as const).flatMap((wash): [Token, Token][] => [
    ["ink", wash],
    ["iron", wash],
    ["dye", wash],
  ]),
  ["pass", "pass-wash"],
  ["caution", "caution-wash"],
  ["stop", "stop-wash"],
  ["on-dye", "dye"],
  ["on-pour", "pour"],
  ["on-pour", "pour-deep"],
  ["on-stop", "stop"],
  ["on-stop", "stop-deep"],
  ["paper", "ink"],
];

/** Outlines of controls, marks, dimension lines, the focus ring: 3 to 1 (success criterion 1.4.11). */
const graphicPairs: [Token, Token][] = [
  ...(["edge", "dye", "pass", "caution", "stop", "ink"] as const).flatMap((mark) =>
    surfaces.map((surface): [Token, Token] => [mark, surface]),
  ),
  ["dye", "dye-wash"],
  ["dye", "caution-wash"],
  ["dye", "stop-wash"],
  ["dye", "pass-wash"],
];

describe("contrast as WCAG computes it", () => {
  // Ratios on white: 4.54 and 21 published with WCAG's own examples; the others computed with wcag-contrast 3.0.0.
  it.each([
    ["#000000", 21.0],
    ["#595959", 7.0047],
    ["#757575", 4.6075],
    ["#767676", 4.5422],
    ["#777777", 4.4781],
    ["#949494", 3.0335],
    ["#959595", 2.9953],
    ["#0000ff", 8.5925],
    ["#ff0000", 3.9985],
    ["#008000", 5.1374],
    ["#ffff00", 1.0738],
  ])("%s on white is %f to 1", (colour, ratio) => {
    expect(contrast(colour, "#ffffff")).toBeCloseTo(ratio, 4);
  });
});

describe.each(["light", "dark"] as const)("the %s theme", (theme) => {
  it.each(textPairs)("text %s on %s", (text, surface) => {
    expect(contrast(tokens[theme][text], tokens[theme][surface])).toBeGreaterThanOrEqual(4.5);
  });

  it.each(graphicPairs)("graphics %s on %s", (mark, surface) => {
    expect(contrast(tokens[theme][mark], tokens[theme][surface])).toBeGreaterThanOrEqual(3);
  });

  it("tests every token but the thin rules that only divide", () => {
    const tested = new Set([...textPairs, ...graphicPairs].flat());
    const untested = Object.keys(tokens[theme]).filter((name) => !tested.has(name as Token));
    expect(untested).toEqual(["rule"]);
  });
});

describe("the client's sources", () => {
  it("name no colour by hand", () => {
    const sources = readdirSync("web", { recursive: true, encoding: "utf8" }).filter((file) =>
      /\.(tsx?|css)$/.test(file),
    );
    expect(sources.length).toBeGreaterThan(30);
    const byHand = sources.filter((file) =>
      /#[0-9a-f]{3}(?:[0-9a-f]{3})?\b(?!-)|\brgba?\(|\bhsla?\(|\boklch\(/i.test(
        readFileSync(`web/${file}`, "utf8").replace(/from "#[^"]+"|import\("#[^"]+"\)/g, ""),
      ),
    );
    expect(byHand).toEqual([]);
  });
});
