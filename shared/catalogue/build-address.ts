import { buildSchema, emptyBuild, type Build } from "./build.ts";
import type { Catalogue } from "./catalogue.ts";
import { decodeSpec, encodeSpec, type CatalogueSource, type SpecProblem } from "./spec-code.ts";

/** Most characters of an engraving. */
export const engravingLength = 12;

/** Key and value pairs of a query string; `new URLSearchParams(pairs)` makes the text. */
export type SearchPairs = [key: string, value: string][];

/** What is wrong with one part of an address; the rest of it is still read. */
interface AddressProblem {
  key: string;
  message: string;
}

export interface AddressBuild {
  build: Build;
  engraving: string | null;
  problems: AddressProblem[];
  /** What is wrong with the spec code, if anything; the build then has no answers. */
  spec: SpecProblem | null;
}

/**
 * A build as an address carries it: `spec=CODE` unless nothing is answered, `n.<id>=6.1250` for every typed number,
 * `mine=a,b`, and `engraving=...` if given. Keys in a fixed order.
 */
export function buildToSearch(catalogue: Catalogue, build: Build, engraving?: string | null): SearchPairs {
  const pairs: SearchPairs = [];
  if (Object.keys(build.answers).length > 0) pairs.push(["spec", encodeSpec(catalogue, build.answers)]);
  for (const field of catalogue.numbers) {
    const text = build.numbers[field.id];
    if (text !== undefined) pairs.push([`n.${field.id}`, text]);
  }
  if (build.mine.length > 0) pairs.push(["mine", build.mine.join(",")]);
  if (engraving !== undefined && engraving !== null && engraving !== "") pairs.push(["engraving", engraving]);
  return pairs;
}

/**
 * Reads what `buildToSearch` wrote, in any order (an URLSearchParams will do). The spec code finds its own catalogue through
 * `source`. Whatever cannot be read is left out and reported; keys of others are ignored.
 */
export function searchToBuild(
  source: CatalogueSource,
  pairs: Iterable<readonly [string, string]>,
): AddressBuild {
  const search = new Map(pairs);
  const problems: AddressProblem[] = [];
  const code = search.get("spec");
  const decoded = code === undefined || code === "" ? null : decodeSpec(code, source);
  if (decoded?.ok === false) problems.push({ key: "spec", message: decoded.sentence });
  const catalogue =
    decoded?.ok === true ? decoded.catalogue : typeof source === "function" ? undefined : source;
  const numbers = readNumbers(catalogue, search, problems);
  const mine = readMine(catalogue, search.get("mine"), problems);
  const engraving = search.get("engraving") ?? null;
  const tooLong = engraving !== null && [...engraving].length > engravingLength;
  if (tooLong) {
    problems.push({ key: "engraving", message: `An engraving has at most ${engravingLength} characters.` });
  }
  return {
    build: { ...emptyBuild, answers: decoded?.ok === true ? decoded.answers : {}, numbers, mine },
    engraving: tooLong || engraving === "" ? null : engraving,
    problems,
    spec: decoded?.ok === false ? decoded : null,
  };
}

function readNumbers(
  catalogue: Catalogue | undefined,
  search: ReadonlyMap<string, string>,
  problems: AddressProblem[],
): Record<string, string> {
  const numbers: Record<string, string> = {};
  for (const [key, text] of search) {
    if (!key.startsWith("n.")) continue;
    const id = key.slice(2);
    const field = catalogue?.numbers.find((candidate) => candidate.id === id);
    if (catalogue !== undefined && field === undefined) {
      problems.push({ key, message: `The catalogue asks for no number "${id}".` });
    } else if (!buildSchema.shape.numbers.safeParse({ [id]: text }).success) {
      problems.push({ key, message: `${field?.name ?? id}: "${text}" is not a plain decimal number.` });
    } else {
      numbers[id] = text;
    }
  }
  return numbers;
}

function readMine(
  catalogue: Catalogue | undefined,
  text: string | undefined,
  problems: AddressProblem[],
): string[] {
  if (text === undefined || text === "") return [];
  const known = catalogue === undefined ? null : new Set(catalogue.choices.map((choice) => choice.id));
  return [...new Set(text.split(","))].filter((id) => {
    if (known === null || known.has(id)) return true;
    problems.push({ key: "mine", message: `The catalogue has no choice "${id}".` });
    return false;
  });
}
