import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { evaluate } from "#shared/rules/evaluate.ts";

export interface FamilyChoice {
  id: string;
  name: string;
  /** Names of the options that are open with nothing answered but the family. */
  options: string[];
}

/** What a family leaves to choose, in the order of the catalogue. */
export function familyChoices(current: CurrentCatalogue, family: string): FamilyChoice[] {
  const { choices } = evaluate(current, { answers: { family }, numbers: {}, mine: [] });
  return current.catalogue.choices
    .filter(({ id }) => id !== "family")
    .map(({ id, name, options }) => {
      const open = new Set(
        choices
          .find(({ choice }) => choice === id)
          ?.options.filter((state) => state.open)
          .map(({ option }) => option),
      );
      return {
        id,
        name,
        options: options.filter((option) => open.has(option.id)).map((option) => option.name),
      };
    });
}
