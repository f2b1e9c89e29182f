import { describe, expect, test } from "vitest";
import type { Condition } from "#shared/catalogue/catalogue.ts";
import { quickXplain } from "#shared/rules/conflict.ts";
import { explain } from "#shared/rules/explain.ts";
import { repair } from "#shared/rules/mend.ts";
import { count, openOptions } from "#shared/rules/open-options.ts";
import { plainContext } from "./plain-catalogue.ts";

const is = (choice: string, ...options: string[]): Condition => ({ choice, in: options });
const answered = (answers: Record<string, string>) => ({ answers, numbers: {}, mine: [] });

describe("the T-shirt (Hadzic, Jensen, Andersen, arXiv 0704.1394; data and count from memory, 11 of 24)", () => {
  const shirt = plainContext(
    {
      colour: ["black", "white", "red", "blue"],
      size: ["small", "medium", "large"],
      print: ["mib", "stw"],
    },
    [
      { id: "mib-black", when: is("print", "mib"), require: is("colour", "black") },
      { id: "stw-not-small", when: is("print", "stw"), require: is("size", "medium", "large") },
    ],
  );

  test.each([
    [{}, 11n, ["black", "white", "red", "blue"], ["small", "medium", "large"], ["mib", "stw"]],
    [{ colour: "white" }, 2n, null, ["medium", "large"], ["stw"]],
    [{ print: "mib" }, 3n, ["black"], ["small", "medium", "large"], null],
    [{ print: "stw" }, 8n, ["black", "white", "red", "blue"], ["medium", "large"], null],
    [{ size: "small" }, 1n, ["black"], null, ["mib"]],
    [{ colour: "black" }, 5n, null, ["small", "medium", "large"], ["mib", "stw"]],
    [{ colour: "black", size: "small" }, 1n, null, null, ["mib"]],
  ])("after %j: %d left, with exactly these options", (answers, left, colour, size, print) => {
    const build = answered(answers);
    expect(count(shirt, build)).toBe(left);
    const open = openOptions(shirt, build);
    for (const [id, options] of Object.entries({ colour, size, print })) {
      if (options !== null) expect(open.get(id)).toEqual(options);
    }
  });
});

test("the mobile phone (Benavides, Segura, Ruiz-Cortes, Information Systems 35, 2010; from memory): 14 products", () => {
  const phone = plainContext(
    {
      gps: ["with", "without"],
      screen: ["basic", "colour", "high"],
      media: ["with", "without"],
      camera: ["with", "without"],
      mp3: ["with", "without"],
    },
    [
      { id: "camera-high", when: is("camera", "with"), require: is("screen", "high") },
      { id: "gps-not-basic", when: is("gps", "with"), require: is("screen", "colour", "high") },
      {
        id: "media-some",
        when: is("media", "with"),
        require: { any: [is("camera", "with"), is("mp3", "with")] },
      },
      { id: "camera-media", when: is("camera", "with"), require: is("media", "with") },
      { id: "mp3-media", when: is("mp3", "with"), require: is("media", "with") },
    ],
  );
  expect(count(phone, answered({}))).toBe(14n);
  const screens = ["basic", "colour", "high"].map((screen) => count(phone, answered({ screen })));
  expect(screens).toEqual([2n, 4n, 8n]);
});

/** A choice of yes or no that costs so much. */
const wish = (value: number) => [
  { id: "yes", value, cents: value },
  { id: "no", value: 0 },
];

const budget = (most: number, ...wishes: string[]): Condition => ({
  left: { sum: wishes.map((value) => ({ value })) },
  is: "<=",
  right: { constant: most },
});

describe("the car's options (Junker, QuickXplain, AAAI 2004, Tables 1 and 2; budget 3000 from a later paper)", () => {
  const wishes = ["racks", "player", "seat", "metal", "luxury"];
  const car = plainContext(
    { racks: wish(500), player: wish(500), seat: wish(800), metal: wish(500), luxury: wish(2600) },
    [{ id: "budget", require: budget(3000, ...wishes) }],
  );
  const yes = (among: readonly string[]) => answered(Object.fromEntries(among.map((one) => [one, "yes"])));
  const conflicts = (among: readonly string[]): boolean => count(car, yes(among)) === 0n;

  test("the order of preference says which of the four minimal conflicts is found", () => {
    expect(quickXplain(wishes, conflicts)).toEqual(["racks", "luxury"]);
    expect(quickXplain([...wishes].reverse(), conflicts)?.sort()).toEqual(["luxury", "metal"]);
    expect(quickXplain(wishes.slice(0, 4), conflicts)).toBeNull();
  });

  test("the reason that closes the luxury version is one answer and the budget", () => {
    const reason = explain(car, yes(wishes.slice(0, 4)), { choice: "luxury", option: "yes" });
    expect(reason).toMatchObject({ answers: [{ choice: "racks", option: "yes" }], rules: ["budget"] });
  });

  test("the mend of everything at once gives up the luxury version, the smallest correction", () => {
    expect(repair(car, { ...yes(wishes), answers: { family: "only", ...yes(wishes).answers } })).toEqual({
      changes: [{ choice: "luxury", from: "yes", to: "no" }],
      priceCents: -2600,
      days: 0,
    });
  });
});

describe("five constraints (O'Sullivan, Papadopoulos, Faltings, Pu, AAAI 2007)", () => {
  const wishes = { c2: "racks", c3: "convertible", c4: "player", c5: "leather" };
  const exclude = { id: "exclude", when: is("racks", "yes"), require: is("convertible", "no") };
  const choices = { racks: wish(500), convertible: wish(500), player: wish(500), leather: wish(2600) };
  const within = plainContext(choices, [
    exclude,
    { id: "budget", require: budget(3000, ...Object.values(wishes)) },
  ]);
  const unlimited = plainContext(choices, [exclude]);
  const all = ["c1", "c2", "c3", "c4", "c5"];

  const conflicts = (among: readonly string[]): boolean => {
    const chosen = Object.entries(wishes).filter(([id]) => among.includes(id));
    const build = answered(Object.fromEntries(chosen.map(([, choice]) => [choice, "yes"])));
    return count(among.includes("c1") ? within : unlimited, build) === 0n;
  };
  const subsets = Array.from({ length: 32 }, (_, mask) => all.filter((_, at) => ((mask >> at) & 1) === 1));
  const named = (sets: readonly string[][]): string[] => sets.map((set) => set.join(" ")).sort();

  test("minimal conflicts are the four that are printed", () => {
    const minimal = subsets.filter(
      (set) => conflicts(set) && set.every((one) => !conflicts(set.filter((other) => other !== one))),
    );
    expect(named(minimal)).toEqual(["c1 c2 c5", "c1 c3 c5", "c1 c4 c5", "c2 c3"]);
    // Each of them is found by some order of preference, and nothing else ever is.
    const orders = permutations(all).map((order) => quickXplain(order, conflicts)?.sort() ?? []);
    expect([...new Set(named(orders))]).toEqual(named(minimal));
  });

  test("largest consistent sets and smallest corrections", () => {
    const largest = subsets.filter(
      (set) => !conflicts(set) && all.every((one) => set.includes(one) || conflicts([...set, one])),
    );
    expect(named(largest)).toEqual(["c1 c2 c4", "c1 c3 c4", "c1 c5", "c2 c4 c5", "c3 c4 c5"]);
    const corrections = largest.map((set) => all.filter((one) => !set.includes(one)));
    expect(named(corrections)).toEqual(["c1 c2", "c1 c3", "c2 c3 c4", "c2 c5", "c3 c5"]);
  });

  test("with the budget held, the mend is the cheaper of the two corrections of two answers", () => {
    const answers = Object.fromEntries(Object.values(wishes).map((choice) => [choice, "yes"]));
    const found = repair(within, answered({ family: "only", ...answers }));
    expect(found?.changes.map(({ choice }) => choice)).toEqual(["racks", "leather"]);
    expect(found?.priceCents).toBe(-3100);
    const racksMine = repair(within, { ...answered({ family: "only", ...answers }), mine: ["racks"] });
    expect(racksMine?.changes.map(({ choice }) => choice)).toEqual(["convertible", "leather"]);
    const bothMine = { ...answered({ family: "only", ...answers }), mine: ["racks", "convertible"] };
    expect(repair(within, bothMine)).toBeNull();
  });
});

function permutations(items: readonly string[]): string[][] {
  if (items.length === 0) return [[]];
  return items.flatMap((item) =>
    permutations(items.filter((other) => other !== item)).map((rest) => [item, ...rest]),
  );
}
