import type { Catalogue } from "../catalogue/catalogue.ts";
import type { PriceList } from "../pricing/price-list.ts";
import { checkBites } from "./check-bites.ts";
import { checkNames } from "./check-names.ts";
import { compileCatalogue, type CompiledCatalogue } from "./compile.ts";
import { minimalConflict } from "./conflict.ts";
import { flaw, type Flaw } from "./flaw.ts";
import { openFlags } from "./open-options.ts";

/**
 * What the shop should know of a catalogue and its price list before they are published: unknown and double names, missing prices,
 * families with no valid build, options that are never possible, choices left with one answer in a family, and rules that never
 * bite, each with the rules that cause it. While a name is unknown, nothing is said of what depends on the rules.
 */
export function checkCatalogue(catalogue: Catalogue, priceList: PriceList): Flaw[] {
  const names = checkNames(catalogue, priceList);
  const prices = missingPrices(catalogue, priceList);
  if (names.length > 0) return [...names, ...prices];
  const compiled = compileCatalogue(catalogue);
  const open = compiled.families.map((_, family) => openFlags(compiled, onlyFamily(compiled, family), {}));
  const possible = compiled.families.map(
    (_, family) => open[family]?.[(compiled.offsets[compiled.familyChoice] ?? 0) + family] === 1,
  );
  return [
    ...prices,
    ...impossibleFamilies(compiled, possible),
    ...deadOptions(compiled, open, possible),
    ...checkBites(compiled, open),
  ];
}

function onlyFamily({ choices, familyChoice }: CompiledCatalogue, family: number): Int16Array {
  const given = new Int16Array(choices.length).fill(-1);
  given[familyChoice] = family;
  return given;
}

function missingPrices({ families, choices }: Catalogue, priceList: PriceList): Flaw[] {
  const without = (sentence: string, more: Partial<Flaw>): Flaw =>
    flaw({ kind: "missingPrice", severity: "stop", sentence, ...more });
  return families.flatMap((family) => [
    ...(priceList.families[family.id] === undefined
      ? [without(`Price list ${priceList.version} has no amount for ${family.name}.`, { family: family.id })]
      : []),
    ...choices.flatMap((choice) => {
      const unpriced = choice.options.filter((option) => {
        const amount = priceList.options[choice.id]?.[option.id];
        const priced = typeof amount === "object" ? amount[family.id] : amount;
        return priced === undefined && option.families?.includes(family.id) !== false;
      });
      if (choice.id === "family" || unpriced.length === 0) return [];
      const listed = unpriced.map(({ name }) => name).join(", ");
      return [
        without(
          `Price list ${priceList.version} has no amount for ${choice.name}: ${listed} in ${family.name}.`,
          {
            family: family.id,
            choice: choice.id,
            options: unpriced.map(({ id }) => id),
          },
        ),
      ];
    }),
  ]);
}

/** Rules that together leave nothing to a family, with an option of a choice if one is given. */
function culprits(compiled: CompiledCatalogue, family: number, choice?: number, option = -1): string[] {
  const given = onlyFamily(compiled, family);
  const held = new Set([compiled.familyChoice]);
  if (choice !== undefined) {
    given[choice] = option;
    held.add(choice);
  }
  const conflict = minimalConflict({ compiled, given, numbers: {}, held });
  return (conflict?.stops ?? []).flatMap((stop) => compiled.stops[stop]?.rule.id ?? []);
}

function impossibleFamilies(compiled: CompiledCatalogue, possible: readonly boolean[]): Flaw[] {
  return compiled.families.flatMap((family, index) =>
    possible[index] === true
      ? []
      : [
          flaw({
            kind: "impossibleFamily",
            severity: "stop",
            sentence: `${family.name} has no valid build.`,
            family: family.id,
            rules: culprits(compiled, index),
          }),
        ],
  );
}

/** Options that are never open, in any family or in one of the families that have them, and choices left with one answer there. */
function deadOptions(
  compiled: CompiledCatalogue,
  open: readonly Uint8Array[],
  possible: readonly boolean[],
): Flaw[] {
  return compiled.choices.flatMap((choice, index) => {
    if (index === compiled.familyChoice) return [];
    const isOpen = (family: number, option: number): boolean =>
      open[family]?.[(compiled.offsets[index] ?? 0) + option] === 1;
    const everywhere = [...choice.options.entries()].filter(
      ([option]) => !compiled.families.some((_, family) => isOpen(family, option)),
    );
    const dead = everywhere.map(([at, option]) =>
      flaw({
        kind: "deadOption",
        severity: "caution",
        sentence: `${choice.name}: ${option.name} is not possible in any family.`,
        choice: choice.id,
        options: [option.id],
        rules: [
          ...new Set(
            [...compiled.families.keys()]
              .filter((family) => compiled.exists(family, index, at))
              .flatMap((family) => culprits(compiled, family, index, at)),
          ),
        ],
      }),
    );
    const inFamilies = [...compiled.families.keys()]
      .filter((family) => possible[family] === true)
      .flatMap((family) => inFamily(compiled, family, index, (option) => isOpen(family, option)));
    return [...dead, ...inFamilies];
  });
}

function inFamily(
  compiled: CompiledCatalogue,
  family: number,
  index: number,
  isOpen: (option: number) => boolean,
): Flaw[] {
  const choice = compiled.choices[index];
  const { id = "", name = "" } = compiled.families[family] ?? {};
  if (choice === undefined) return [];
  const existing = [...choice.options.keys()].filter((option) => compiled.exists(family, index, option));
  const closed = existing.filter((option) => !isOpen(option));
  const rules = [...new Set(closed.flatMap((option) => culprits(compiled, family, index, option)))];
  const idsOf = (options: readonly number[]) => options.flatMap((option) => choice.options[option]?.id ?? []);
  const at = { severity: "note", family: id, choice: choice.id, rules } as const;
  const flaws: Flaw[] = [];
  if (closed.length > 0) {
    const listed = closed.flatMap((option) => choice.options[option]?.name ?? []).join(", ");
    const sentence = `${name} never takes ${choice.name}: ${listed}.`;
    flaws.push(flaw({ kind: "deadOption", sentence, ...at, options: idsOf(closed) }));
  }
  const left = existing.filter(isOpen);
  if (left.length === 1) {
    const only = choice.options[left[0] ?? 0]?.name ?? "";
    const sentence = `${name} leaves one answer to ${choice.name}: ${only}.`;
    flaws.push(flaw({ kind: "oneAnswer", sentence, ...at, options: idsOf(left) }));
  }
  return flaws;
}
