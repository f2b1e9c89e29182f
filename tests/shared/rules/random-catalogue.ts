import { catalogueSchema, type Catalogue } from "#shared/catalogue/catalogue.ts";
import { priceListSchema, type PriceList } from "#shared/pricing/price-list.ts";

/** A small catalogue with its rules once as data and once as plain functions, written apart from the engine. */
export interface RandomCatalogue {
  catalogue: Catalogue;
  priceList: PriceList;
  /** By rule id: whether a full assignment keeps the rule at the typed numbers. */
  keeps: Map<string, (full: Record<string, string>, numbers: Record<string, string>) => boolean>;
}

/** Numbers from 0 to below 1, the same for the same seed (mulberry32). */
export function randomFrom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

interface Draw {
  whole(below: number): number;
  chance(part: number): boolean;
  some<Item>(items: readonly Item[], atLeast?: number): Item[];
  one<Item>(items: readonly Item[]): Item;
}

export function drawFrom(random: () => number): Draw {
  const whole = (below: number): number => Math.floor(random() * below);
  const one = <Item>(items: readonly Item[]): Item => {
    const item = items[whole(items.length)];
    if (item === undefined) throw new Error("nothing to draw from");
    return item;
  };
  return {
    whole,
    one,
    chance: (part) => random() < part,
    some(items, atLeast = 1) {
      const picked = items.filter(() => random() < 0.5);
      while (picked.length < Math.min(atLeast, items.length)) {
        const item = one(items);
        if (!picked.includes(item)) picked.push(item);
      }
      return picked;
    },
  };
}

interface RawOption {
  id: string;
  name: string;
  description: string;
  families?: string[];
  values?: Record<string, number>;
  minutes?: { wash: number };
  leadDays?: number;
}

interface RawChoice {
  id: string;
  options: RawOption[];
}

type Full = Record<string, string>;

/** A catalogue of one to three families and three to five more choices, its rules drawn round a planted valid build. */
export function randomCatalogue(seed: number): RandomCatalogue {
  const draw = drawFrom(randomFrom(seed));
  const families = ["fa", "fb", "fc"].slice(0, 1 + draw.whole(3));
  const choices: RawChoice[] = Array.from({ length: 3 + draw.whole(3) }, (_, at) => ({
    id: `c${at}`,
    options: Array.from({ length: 2 + draw.whole(3) }, (_, index) => ({
      id: `o${index}`,
      name: `Option ${index}`,
      description: "",
      values: { [`v${at}`]: draw.whole(4) },
      minutes: { wash: draw.whole(3) * 240 },
      leadDays: draw.whole(3) * 2,
      ...(index > 0 && draw.chance(0.25) ? { families: draw.some(families) } : {}),
    })),
  }));
  const planted = plant(draw, families, choices);
  const keeps: RandomCatalogue["keeps"] = new Map();
  const rules: unknown[] = [];
  const count = 3 + draw.whole(7);
  for (let at = 0; at < count; at += 1) {
    const { rule, keeps: kept } = drawRule(draw, `r${at}`, families, choices);
    if (!kept(planted, {})) continue;
    rules.push(rule);
    keeps.set(`r${at}`, kept);
  }
  const catalogue = catalogueSchema.parse({
    version: 1,
    name: `Random ${seed}`,
    publishedOn: "2026-01-01",
    families: families.map((id) => ({
      id,
      name: id,
      summary: "",
      values: {},
      weight: 200,
      minutes: { wash: 60 },
      facts: [],
      crate: { length: 1, width: 1, height: 1, weight: 1 },
    })),
    steps: [
      {
        id: "all",
        name: "All",
        intro: "",
        choices: ["family", ...choices.map(({ id }) => id)],
        numbers: ["load"],
      },
    ],
    choices: [
      { id: "family", options: families.map((id) => ({ id, name: id, description: "" })) },
      ...choices,
    ].map((choice) => ({
      ...choice,
      name: choice.id,
      question: "?",
      help: { what: "", when: "", cost: "" },
    })),
    numbers: [{ id: "load", name: "Load", unit: "hp", step: 1, least: 0, most: 9 }],
    rules,
  });
  const priceList = priceListSchema.parse({
    version: 1,
    name: "Random",
    effectiveOn: "2026-01-01",
    currency: "USD",
    families: Object.fromEntries(families.map((id) => [id, 1000 * (1 + draw.whole(3))])),
    options: Object.fromEntries(
      choices.map((choice) => [
        choice.id,
        Object.fromEntries(choice.options.map((option) => [option.id, 100 * (draw.whole(5) - 1)])),
      ]),
    ),
    freightByZone: {},
  });
  return { catalogue, priceList, keeps };
}

function plant(draw: Draw, families: string[], choices: RawChoice[]): Full {
  const family = draw.one(families);
  const options = choices.map((choice): [string, string] => {
    const made = choice.options.filter((option) => option.families?.includes(family) ?? true);
    return [choice.id, draw.one(made).id];
  });
  return Object.fromEntries([["family", family] as [string, string], ...options]);
}

const base = { severity: "stop", sentence: "Random rule.", why: "Drawn for a test." };

/** One rule in one of five shapes. */
function drawRule(
  draw: Draw,
  id: string,
  families: string[],
  choices: RawChoice[],
): { rule: unknown; keeps: (full: Full, numbers: Record<string, string>) => boolean } {
  const all: RawChoice[] = [
    ...choices,
    { id: "family", options: families.map((name) => ({ id: name, name, description: "" })) },
  ];
  const ids = (choice: RawChoice): string[] => choice.options.map((option) => option.id);
  const a = draw.one(all);
  const b = draw.one(choices.filter((choice) => choice.id !== a.id));
  const inA = draw.some(ids(a));
  const inB = draw.some(ids(b));
  const valueOf = (full: Full, choice: RawChoice): number =>
    Object.values(choice.options.find((option) => option.id === full[choice.id])?.values ?? {})[0] ?? 0;
  const head = { ...base, id };
  switch (draw.whole(5)) {
    case 0: {
      const rule = {
        ...head,
        kind: "expression",
        when: { choice: a.id, in: inA },
        require: { choice: b.id, in: inB },
      };
      return { rule, keeps: (full) => !inA.includes(full[a.id] ?? "") || inB.includes(full[b.id] ?? "") };
    }
    case 1: {
      const rows = Array.from(
        { length: 2 + draw.whole(3) },
        () => [draw.some(ids(a)), draw.some(ids(b))] as const,
      );
      const rule = { ...head, kind: "table", choices: [a.id, b.id], rows };
      return {
        rule,
        keeps: (full) =>
          rows.some(([left, right]) => left.includes(full[a.id] ?? "") && right.includes(full[b.id] ?? "")),
      };
    }
    case 2: {
      const c = draw.one(choices.filter((choice) => choice.id !== b.id));
      const most = 2 + draw.whole(4);
      const sum = { sum: [{ value: `v${b.id.slice(1)}` }, { value: `v${c.id.slice(1)}` }] };
      const rule = {
        ...head,
        kind: "expression",
        require: { left: sum, is: "<=", right: { constant: most } },
      };
      return { rule, keeps: (full) => valueOf(full, b) + valueOf(full, c) <= most };
    }
    case 3: {
      const require = {
        not: {
          all: [
            { choice: a.id, in: inA },
            { choice: b.id, in: inB },
          ],
        },
      };
      const rule = { ...head, kind: "expression", require };
      return { rule, keeps: (full) => !(inA.includes(full[a.id] ?? "") && inB.includes(full[b.id] ?? "")) };
    }
    default: {
      const require = { left: { number: "load" }, is: "<=", right: { value: `v${b.id.slice(1)}` } };
      const rule = { ...head, kind: "expression", require };
      return { rule, keeps: (full, { load }) => load === undefined || Number(load) <= valueOf(full, b) };
    }
  }
}
