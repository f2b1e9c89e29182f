import { baseAmount, optionAmount } from "../pricing/price-build.ts";
import type { PriceList } from "../pricing/price-list.ts";
import type { CompiledCatalogue } from "./compile.ts";

/** A family's amounts in cents: the bare block, and by flat option index every option that exists in it. */
export interface Amounts {
  base: number;
  options: Float64Array;
}

const known = new WeakMap<CompiledCatalogue, WeakMap<PriceList, Map<number, Amounts>>>();

/** Throws RangeError where the price list lacks an amount of the family or of an option that exists in it. */
export function amountsOf(compiled: CompiledCatalogue, priceList: PriceList, family: number): Amounts {
  const lists = known.get(compiled) ?? new WeakMap<PriceList, Map<number, Amounts>>();
  known.set(compiled, lists);
  const families = lists.get(priceList) ?? new Map<number, Amounts>();
  lists.set(priceList, families);
  const found = families.get(family) ?? readAmounts(compiled, priceList, family);
  families.set(family, found);
  return found;
}

function readAmounts(compiled: CompiledCatalogue, priceList: PriceList, family: number): Amounts {
  const { choices, familyChoice, families } = compiled;
  const id = families[family]?.id ?? "";
  const options = choices.flatMap((choice, index) =>
    choice.options.map((option) =>
      index === familyChoice || option.families?.includes(id) === false
        ? 0
        : optionAmount(priceList, id, choice.id, option.id),
    ),
  );
  return { base: baseAmount(priceList, id), options: Float64Array.from(options) };
}
