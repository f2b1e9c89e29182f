import type { Build } from "../catalogue/build.ts";
import type { Catalogue, Choice, Option } from "../catalogue/catalogue.ts";
import type { Cents } from "../money/cents.ts";
import type { PriceList } from "./price-list.ts";

/** One visible line of a block's price. */
export interface PriceLine {
  kind: "base" | "option";
  label: string;
  choice?: string;
  option?: string;
  amountCents: Cents;
}

export interface PricedBuild {
  lines: PriceLine[];
  totalCents: Cents;
}

/**
 * Amount of one option in a family, cents; negative = a deduction. Throws RangeError where the price list has none:
 * an option without an amount must never be sold as free by oversight.
 */
export function optionAmount(priceList: PriceList, family: string, choice: string, option: string): Cents {
  const entry = priceList.options[choice]?.[option];
  const amount = typeof entry === "object" ? entry[family] : entry;
  if (amount === undefined) {
    throw new RangeError(
      `price list ${priceList.version} has no amount for ${choice} ${option} in ${family}`,
    );
  }
  return amount;
}

/** Base amount of a bare block of the family, cents. Throws RangeError where the price list has none. */
export function baseAmount(priceList: PriceList, family: string): Cents {
  const amount = priceList.families[family];
  if (amount === undefined)
    throw new RangeError(`price list ${priceList.version} has no amount for ${family}`);
  return amount;
}

function answered(catalogue: Catalogue, build: Build, family: string): { choice: Choice; option: Option }[] {
  return catalogue.choices.flatMap((choice) => {
    if (choice.id === "family") return [];
    const option = choice.options.find((candidate) => candidate.id === build.answers[choice.id]);
    if (option === undefined || option.families?.includes(family) === false) return [];
    return [{ choice, option }];
  });
}

/**
 * Price of one block as answered so far: family base plus the amounts of the answered options that exist in the family,
 * in catalogue order; an amount of zero gives no line. Throws RangeError without a family ("no family, no price").
 */
export function priceBuild(priceList: PriceList, catalogue: Catalogue, build: Build): PricedBuild {
  const family = catalogue.families.find((candidate) => candidate.id === build.answers["family"]);
  if (family === undefined) throw new RangeError("a build without a family has no price");
  const lines: PriceLine[] = [
    { kind: "base", label: `${family.name} block`, amountCents: baseAmount(priceList, family.id) },
  ];
  for (const { choice, option } of answered(catalogue, build, family.id)) {
    const amountCents = optionAmount(priceList, family.id, choice.id, option.id);
    if (amountCents === 0) continue;
    lines.push({
      kind: "option",
      label: `${choice.name}: ${option.name}`,
      choice: choice.id,
      option: option.id,
      amountCents,
    });
  }
  return { lines, totalCents: lines.reduce((total, line) => total + line.amountCents, 0) };
}
