import type { Build } from "#shared/catalogue/build.ts";
import { priceBuild } from "#shared/pricing/price-build.ts";
import { estimateShipDate } from "#shared/scheduling/estimate.ts";
import type { RandomCatalogue } from "./random-catalogue.ts";

type Full = Record<string, string>;

const enumerated = new WeakMap<RandomCatalogue, Full[]>();

/** Every full assignment in which each option exists in its family. */
function allAssignments(random: RandomCatalogue): Full[] {
  const known = enumerated.get(random) ?? enumerate(random);
  enumerated.set(random, known);
  return known;
}

function enumerate({ catalogue }: RandomCatalogue): Full[] {
  let found: Full[] = [{}];
  for (const choice of catalogue.choices) {
    found = found.flatMap((partial) =>
      choice.options.map((option) => ({ ...partial, [choice.id]: option.id })),
    );
  }
  return found.filter((full) =>
    catalogue.choices.every((choice) => made(catalogue, choice.id, full[choice.id], full["family"])),
  );
}

function made(
  catalogue: RandomCatalogue["catalogue"],
  choice: string,
  option?: string,
  family?: string,
): boolean {
  const options = catalogue.choices.find(({ id }) => id === choice)?.options ?? [];
  return options.find(({ id }) => id === option)?.families?.includes(family ?? "") ?? true;
}

/** Assignments that keep the given rules (all if absent) at these numbers. */
export function validAssignments(
  random: RandomCatalogue,
  numbers: Build["numbers"],
  rules?: readonly string[],
): Full[] {
  const kept = [...random.keeps].filter(([id]) => rules === undefined || rules.includes(id));
  return allAssignments(random).filter((full) => kept.every(([, keeps]) => keeps(full, numbers)));
}

/** Whether one of the assignments has the option and agrees with all other answers. */
export function isOpen(
  valid: readonly Full[],
  answers: Build["answers"],
  choice: string,
  option: string,
): boolean {
  return valid.some(
    (full) =>
      full[choice] === option &&
      Object.entries(answers).every(([id, answer]) => id === choice || full[id] === answer),
  );
}

export interface BruteMend {
  changes: { choice: string; from: string; to: string | null }[];
  priceCents: number | null;
  days: number | null;
}

/** The cheapest mend by trying every valid assignment as its end; with nothing wanted, of the whole build. */
export function bruteMend(
  random: RandomCatalogue,
  valid: readonly Full[],
  build: Build,
  wanted: { choice: string; option: string } | null,
): BruteMend | null {
  const { catalogue, priceList } = random;
  const now = worth(random, build.answers);
  // Only a change of an answered (or wanted) family leaves answers without an option.
  const familyKnown = build.answers["family"] !== undefined || wanted?.choice === "family";
  const mends = valid
    .filter((full) => wanted === null || full[wanted.choice] === wanted.option)
    .flatMap((full) => {
      const changes = catalogue.choices.flatMap(({ id }) => {
        const from = build.answers[id];
        if (id === wanted?.choice || from === undefined || full[id] === from) return [];
        const lost = familyKnown && !made(catalogue, id, from, full["family"]);
        return [{ choice: id, from, to: lost ? null : (full[id] ?? null) }];
      });
      if (changes.some(({ choice }) => build.mine.includes(choice))) return [];
      const answers: Record<string, string | null> = {
        ...build.answers,
        ...(wanted === null ? {} : { [wanted.choice]: wanted.option }),
      };
      for (const { choice, to } of changes) answers[choice] = to;
      const kept = Object.fromEntries(
        Object.entries(answers).flatMap(([id, to]) => (to === null ? [] : [[id, to]])),
      );
      const then = worth(random, kept);
      return [{ changes, price: then?.price ?? 0, day: then?.day ?? 0, known: then !== null }];
    });
  const place = (choice: string): number => catalogue.choices.findIndex(({ id }) => id === choice);
  const order = ({ changes }: { changes: BruteMend["changes"] }): number[] =>
    changes.flatMap(({ choice, to }) => {
      const options = catalogue.choices[place(choice)]?.options ?? [];
      return [place(choice), options.findIndex(({ id }) => id === to)];
    });
  const best = mends.sort((a, b) => {
    const by = [a.changes.length - b.changes.length, a.price - b.price, a.day - b.day];
    const left = order(a);
    const right = order(b);
    return (
      [...by, ...left.map((at, index) => at - (right[index] ?? 0))].find((difference) => difference !== 0) ??
      0
    );
  })[0];
  if (best === undefined) return null;
  const comparable = now !== null && best.known;
  return {
    changes: best.changes,
    priceCents: comparable ? best.price - now.price : null,
    days: comparable ? best.day - now.day : null,
  };

  function worth(
    { catalogue: known }: RandomCatalogue,
    answers: Record<string, string>,
  ): { price: number; day: number } | null {
    const family = known.families.find(({ id }) => id === answers["family"]);
    if (family === undefined) return null;
    const options = known.choices.flatMap((choice) => {
      return choice.options.filter(({ id }) => choice.id !== "family" && answers[choice.id] === id);
    });
    const date = estimateShipDate({
      minutes: {
        wash: options.reduce((sum, option) => sum + (option.minutes.wash ?? 0), family.minutes.wash ?? 0),
      },
      leadDays: Math.max(family.leadDays, ...options.map(({ leadDays }) => leadDays)),
      load: { minutes: {} },
      today: "2026-12-01",
    });
    const { totalCents } = priceBuild(priceList, known, { answers, numbers: {}, mine: [] });
    return { price: totalCents, day: Date.parse(date) / 86_400_000 };
  }
}
