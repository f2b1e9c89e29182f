import type { Build } from "#shared/catalogue/build.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";

/** Choices that have one option in the family, with that option: they are no question there. */
function onlyOptions(catalogue: Catalogue, family: string | undefined): Map<string, string> {
  const only = new Map<string, string>();
  if (family === undefined) return only;
  for (const { id, options } of catalogue.choices) {
    const [first, second] = options.filter(({ families }) => families?.includes(family) !== false);
    if (id !== "family" && first !== undefined && second === undefined) only.set(id, first.id);
  }
  return only;
}

/** The answers with every choice that is no question in their family answered. */
export function onlyOptionsFilled(catalogue: Catalogue, answers: Build["answers"]): Build["answers"] {
  return { ...Object.fromEntries(onlyOptions(catalogue, answers["family"])), ...answers };
}

/** The answers without those that are no choice in their family. */
export function onlyOptionsFreed(catalogue: Catalogue, answers: Build["answers"]): Build["answers"] {
  const only = onlyOptions(catalogue, answers["family"]);
  return Object.fromEntries(
    Object.entries(answers).filter(([choice, option]) => only.get(choice) !== option),
  );
}
