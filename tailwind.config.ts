import type { Config } from "tailwindcss";
import plugin from "tailwindcss/plugin";

/**
 * The design tokens, in both themes. Nothing else in the client names a colour.
 * `light` is drafting paper under a lamp; `dark` is the night shift.
 *
 * paper, sheet, wash: surfaces, from the page to what lies on it to what is shaded.
 * ink, iron: text and quieter text. edge: outlines that must be seen (3:1). rule: thin lines that only divide.
 * dye: links, selection, dimension lines. pour: the one main action of a screen.
 * pass, caution, stop: states, each with the wash it may lie on. on-*: text upon a filled surface.
 */
export const tokens = {
  light: {
    paper: "#F7F5F0",
    sheet: "#FFFFFF",
    wash: "#EFECE4",
    ink: "#1B1F23",
    iron: "#535B63",
    edge: "#747C84",
    rule: "#CFCBC0",
    dye: "#1F4AA8",
    "dye-wash": "#E7EDF9",
    "on-dye": "#FFFFFF",
    pour: "#B8430B",
    "pour-deep": "#953507",
    "on-pour": "#FFFFFF",
    pass: "#1B6E3C",
    "pass-wash": "#E4F2E8",
    caution: "#8A5A00",
    "caution-wash": "#FFF4D6",
    stop: "#B3261E",
    "stop-deep": "#8E1B15",
    "stop-wash": "#FCEAE8",
    "on-stop": "#FFFFFF",
  },
  dark: {
    paper: "#13171A",
    sheet: "#1A1F23",
    wash: "#242B30",
    ink: "#ECE9E2",
    iron: "#AEB5BA",
    edge: "#7F8A92",
    rule: "#363F46",
    dye: "#93B7FF",
    "dye-wash": "#1C2A48",
    "on-dye": "#0B1530",
    pour: "#F28C4E",
    "pour-deep": "#FFAB78",
    "on-pour": "#1C0C03",
    pass: "#7FCE9B",
    "pass-wash": "#162E1F",
    caution: "#F0C24F",
    "caution-wash": "#352A0D",
    stop: "#FF978D",
    "stop-deep": "#FFB9B2",
    "stop-wash": "#3C1B18",
    "on-stop": "#260604",
  },
} as const;

type Theme = Record<keyof typeof tokens.light, string>;

function customProperties(theme: Theme, scheme: "light" | "dark"): Record<string, string> {
  const properties: Record<string, string> = { "color-scheme": scheme };
  for (const [name, value] of Object.entries(theme)) properties[`--${name}`] = value;
  return properties;
}

const colours: Record<string, string> = Object.fromEntries(
  Object.keys(tokens.light).map((name) => [name, `var(--${name})`]),
);

export default {
  content: ["./index.html", "./web/**/*.{ts,tsx}"],
  theme: {
    colors: {
      ...colours,
      shade: "rgb(0 0 0 / 0.55)",
      transparent: "transparent",
      current: "currentColor",
      inherit: "inherit",
    },
    fontFamily: {
      sans: ["Barlow", "system-ui", "sans-serif"],
      condensed: ['"Barlow Condensed"', "Barlow", "system-ui", "sans-serif"],
    },
    fontSize: {
      xs: ["0.8125rem", "1.125rem"],
      sm: ["0.9375rem", "1.375rem"],
      base: ["1rem", "1.5rem"],
      lg: ["1.1875rem", "1.625rem"],
      xl: ["1.4375rem", "1.75rem"],
      "2xl": ["1.875rem", "2.125rem"],
      "3xl": ["2.5rem", "2.625rem"],
      "4xl": ["3.375rem", "3.375rem"],
    },
    borderRadius: { none: "0", DEFAULT: "2px", full: "9999px" },
    boxShadow: { none: "none", float: "0 6px 28px rgb(0 0 0 / 0.22)" },
    extend: {
      maxWidth: { page: "76rem", text: "42rem", form: "34rem" },
      minHeight: { target: "2.75rem", "target-floor": "3rem" },
      minWidth: { target: "2.75rem", "target-floor": "3rem" },
    },
  },
  plugins: [
    plugin((api) => {
      api.addBase({
        ":root": customProperties(tokens.light, "light"),
        "@media (prefers-color-scheme: dark)": { ":root": customProperties(tokens.dark, "dark") },
        ':root[data-theme="light"]': customProperties(tokens.light, "light"),
        ':root[data-theme="dark"]': customProperties(tokens.dark, "dark"),
      });
    }),
  ],
} satisfies Config;
