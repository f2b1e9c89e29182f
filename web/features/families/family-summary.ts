import type { Catalogue, Family, Option } from "#shared/catalogue/catalogue.ts";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { baseAmount, optionAmount } from "#shared/pricing/price-build.ts";
import { estimateShipDate } from "#shared/scheduling/estimate.ts";

/** What tells the families apart at a glance. */
export interface FamilySummary {
  family: Family;
  /** Inches. */
  boreSpacing: number | null;
  /** "4.000 to 4.155 in" */
  bores: string;
  deckHeights: string;
  /** The lightest and the strongest: "Two-bolt to four-bolt splayed". */
  mainCaps: string;
  /** The block with the least costly option of every choice, cents. */
  fromCents: number;
  /** ISO date, for the bare family at today's load. */
  shipsOn: string;
}

/** One summary for each family, in the order of the catalogue. */
export function summariseFamilies(current: CurrentCatalogue): FamilySummary[] {
  return current.catalogue.families.map((family) => summarise(current, family));
}

function summarise({ catalogue, priceList, load, today }: CurrentCatalogue, family: Family): FamilySummary {
  const names = (choice: string) => optionsIn(catalogue, family, choice).map(({ name }) => name);
  const bores = names("bore");
  const fromCents = catalogue.choices
    .filter(({ id }) => id !== "family")
    .reduce(
      (total, choice) => {
        const amounts = optionsIn(catalogue, family, choice.id).map(({ id }) =>
          optionAmount(priceList, family.id, choice.id, id),
        );
        return amounts.length === 0 ? total : total + Math.min(...amounts);
      },
      baseAmount(priceList, family.id),
    );
  return {
    family,
    boreSpacing: family.values["boreSpacing"] ?? null,
    bores: bores.length < 2 ? joined(bores) : `${withoutUnit(bores[0])} to ${bores.at(-1) ?? ""}`,
    deckHeights: joined(names("deckHeight")),
    mainCaps: range(names("capStyle")),
    fromCents,
    shipsOn: estimateShipDate({ minutes: family.minutes, load, today, leadDays: family.leadDays }),
  };
}

/** Options of a choice that the family is made with: by the option's own list, and by tables of family and choice. */
function optionsIn(catalogue: Catalogue, family: Family, choiceId: string): Option[] {
  const choice = catalogue.choices.find(({ id }) => id === choiceId);
  const allowed = catalogue.rules.flatMap((rule) => {
    if (rule.kind !== "table" || rule.severity !== "stop") return [];
    const [familyColumn, column] = [rule.choices.indexOf("family"), rule.choices.indexOf(choiceId)];
    if (familyColumn < 0 || column < 0) return [];
    const rows = rule.rows.filter((row) => row[familyColumn]?.includes(family.id) === true);
    return [new Set(rows.flatMap((row) => row[column] ?? []))];
  });
  return (choice?.options ?? []).filter(
    ({ id, families }) =>
      families?.includes(family.id) !== false && allowed.every((options) => options.has(id)),
  );
}

function range(names: readonly string[]): string {
  const [first = ""] = names;
  const last = names.at(-1) ?? "";
  return names.length < 2 ? first : `${first} to ${last.charAt(0).toLowerCase()}${last.slice(1)}`;
}

/** "9.025, 9.325 in": a unit that all share is said once; names with a comma of their own are kept apart by semicolons. */
export function joined(names: readonly string[]): string {
  const shared = names.length > 1 && names.every((name) => name.endsWith(" in"));
  if (shared) return `${names.map(withoutUnit).join(", ")} in`;
  return names.join(names.some((name) => name.includes(",")) ? "; " : ", ");
}

function withoutUnit(name: string | undefined): string {
  return name?.replace(/ in$/, "") ?? "";
}
