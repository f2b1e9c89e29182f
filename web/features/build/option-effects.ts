import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import type { OptionState } from "#shared/rules/evaluation.ts";
import { money, pounds } from "#web/lib/format.ts";
import { effectParts } from "./build-words.ts";

/** What choosing an option changes, in a few short parts; a family says what it costs and weighs by itself. */
export function optionEffects(current: CurrentCatalogue, choice: string, state: OptionState): string[] {
  if (choice === "family" && state.effect.priceCents === null) return familyParts(current, state.option);
  if (state.chosen) return ["chosen"];
  if (state.effect.priceCents === null) return [];
  const parts = effectParts(state.effect);
  return parts.length === 0 ? ["no change"] : parts;
}

function familyParts({ catalogue, priceList }: CurrentCatalogue, id: string): string[] {
  const family = catalogue.families.find((candidate) => candidate.id === id);
  const base = priceList.families[id];
  if (family === undefined || base === undefined) return [];
  return [`${money(base).replace(/\.00$/, "")} before options`, pounds(family.weight)];
}
