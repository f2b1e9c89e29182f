import type { Build } from "#shared/catalogue/build.ts";
import { buildToSearch } from "#shared/catalogue/build-address.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";
import { onlyOptionsFilled } from "./only-options.ts";

const ownKeys = new Set(["spec", "mine", "engraving"]);

/** The query of a build, "" or from the question mark on. Parameters of others in `around` stay. */
export function searchOf(catalogue: Catalogue, build: Build, engraving: string, around = ""): string {
  const others = [...new URLSearchParams(around)].filter(
    ([name]) => !ownKeys.has(name) && !name.startsWith("n."),
  );
  const text = new URLSearchParams([...buildToSearch(catalogue, build, engraving), ...others]).toString();
  return text === "" ? "" : `?${text}`;
}

/** Whether two queries say the same, however they are written. */
export function sameSearch(a: string, b: string): boolean {
  return a === b || new URLSearchParams(a).toString() === new URLSearchParams(b).toString();
}

/** Address of a step of the form, or of "review". */
export function stepPath(step: string): string {
  return `/build/${step}`;
}

/** Address of a fresh build with nothing answered but its family, and what is no question in it. */
export function familyAddress(catalogue: Catalogue, family: string): string {
  const build: Build = { answers: onlyOptionsFilled(catalogue, { family }), numbers: {}, mine: [] };
  return `${stepPath(catalogue.steps[0]?.id ?? "review")}${searchOf(catalogue, build, "")}`;
}
