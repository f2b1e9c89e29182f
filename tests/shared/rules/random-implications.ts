import { catalogueSchema, type Catalogue } from "#shared/catalogue/catalogue.ts";
import { priceListSchema, type PriceList } from "#shared/pricing/price-list.ts";
import { drawFrom, randomFrom } from "./random-catalogue.ts";

/** Rules "if a in A then b in B" between choices of one family, drawn round a planted valid build. */
export interface ImplicationCatalogue {
  catalogue: Catalogue;
  priceList: PriceList;
  /** As drawn: choice and option indices, the family apart. */
  implications: { a: number; whenIn: number[]; b: number; thenIn: number[] }[];
}

/** As many choices with as many options each, and as many rules; A of 2 to 6 options, B of half of them. */
export function implicationCatalogue(
  seed: number,
  size: { choices: number; options: number; rules: number },
): ImplicationCatalogue {
  const draw = drawFrom(randomFrom(seed));
  const planted = Array.from({ length: size.choices }, () => draw.whole(size.options));
  const implications: ImplicationCatalogue["implications"] = [];
  while (implications.length < size.rules) {
    const a = draw.whole(size.choices);
    const b = draw.whole(size.choices);
    if (a === b) continue;
    const whenIn = pick(2 + draw.whole(Math.min(5, size.options - 1)));
    const thenIn = pick(Math.max(1, Math.floor(size.options / 2)));
    if (whenIn.includes(planted[a] ?? -1) && !thenIn.includes(planted[b] ?? -1)) continue;
    implications.push({ a, whenIn, b, thenIn });
  }
  const ids = Array.from({ length: size.choices }, (_, at) => `c${at}`);
  const options = Array.from({ length: size.options }, (_, at) => `o${at}`);
  const catalogue = catalogueSchema.parse({
    version: 1,
    name: `Implications ${seed}`,
    publishedOn: "2026-01-01",
    families: [
      {
        id: "only",
        name: "Only",
        summary: "",
        values: {},
        weight: 200,
        minutes: { wash: 60 },
        facts: [],
        crate: { length: 1, width: 1, height: 1, weight: 1 },
      },
    ],
    steps: [{ id: "all", name: "All", intro: "", choices: ["family", ...ids] }],
    choices: [
      { id: "family", options: [{ id: "only", name: "Only" }] },
      ...ids.map((id) => ({ id, options: options.map((option) => ({ id: option, name: option })) })),
    ].map((choice) => ({
      ...choice,
      name: choice.id,
      question: "?",
      help: { what: "", when: "", cost: "" },
    })),
    numbers: [],
    rules: implications.map(({ a, whenIn, b, thenIn }, at) => ({
      id: `r${at}`,
      kind: "expression",
      severity: "stop",
      sentence: "Random rule.",
      why: "Drawn for a test.",
      when: { choice: `c${a}`, in: whenIn.map((option) => `o${option}`) },
      require: { choice: `c${b}`, in: thenIn.map((option) => `o${option}`) },
    })),
  });
  const priceList = priceListSchema.parse({
    version: 1,
    name: "Random",
    effectiveOn: "2026-01-01",
    currency: "USD",
    families: { only: 1000 },
    options: Object.fromEntries(
      ids.map((id) => [id, Object.fromEntries(options.map((option) => [option, 100 * draw.whole(9)]))]),
    ),
    freightByZone: {},
  });
  return { catalogue, priceList, implications };

  function pick(count: number): number[] {
    const picked = new Set<number>();
    while (picked.size < Math.min(count, size.options)) picked.add(draw.whole(size.options));
    return [...picked].sort((x, y) => x - y);
  }
}
