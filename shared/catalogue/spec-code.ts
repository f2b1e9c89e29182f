import type { Catalogue, Choice } from "./catalogue.ts";

/**
 * The spec code: catalogue version and every answer, unanswered ones included, as Crockford base 32 in groups of four, each
 * group closed by its own check character. Typed numbers and the engraving are not in it.
 */

export type SpecProblem =
  | { ok: false; problem: "character"; at: number; character: string; sentence: string }
  | { ok: false; problem: "group"; group: number; sentence: string }
  | { ok: false; problem: "length"; sentence: string }
  | { ok: false; problem: "version"; version: number; sentence: string }
  | { ok: false; problem: "option"; sentence: string };

export type SpecVersion = { ok: true; version: number } | SpecProblem;

export type DecodedSpec = { ok: true; catalogue: Catalogue; answers: Record<string, string> } | SpecProblem;

/** One catalogue, or a look-up of catalogues by their version. */
export type CatalogueSource = Catalogue | ((version: number) => Catalogue | undefined);

const alphabet = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";
const groupLength = 4;
const dataPerGroup = groupLength - 1;
/** The group's position enters its check as an element of GF(32), so positions repeat after 32. */
const mostGroups = 32;
const versionBits = 10n;
const bitsPerGroup = BigInt(dataPerGroup * 5);

/** Product in GF(32) modulo x^5 + x^2 + 1. */
function fieldProduct(a: number, b: number): number {
  let product = 0;
  for (let bit = 4; bit >= 0; bit -= 1) {
    product <<= 1;
    if ((product & 32) !== 0) product ^= 0b100101;
    if (((b >> bit) & 1) === 1) product ^= a;
  }
  return product;
}

/**
 * Check value of a group's three data values at its position (from 0). The four places weigh 8, 4, 2 and 1 in GF(32): all
 * different and none zero, so one wrong character or a swap of neighbours never cancels; the position differs between groups.
 */
function checkValue(data: readonly number[], position: number): number {
  return data.reduce((sum, value, index) => sum ^ fieldProduct(value, 8 >> index), position);
}

function radix(choice: Choice): bigint {
  return BigInt(choice.options.length + 1);
}

function groupsNeeded(catalogue: Catalogue): number {
  const states = catalogue.choices.reduce((product, choice) => product * radix(choice), 1n);
  const bits = BigInt((states - 1n).toString(2).length) + versionBits;
  const groups = Number((bits + bitsPerGroup - 1n) / bitsPerGroup);
  if (groups > mostGroups) throw new RangeError("the catalogue has too many choices for a spec code");
  return groups;
}

/**
 * Spec code of the answers (choice id -> option id; absent = unanswered), e.g. "04A7-...". Throws RangeError on a choice or
 * option that the catalogue does not have.
 */
export function encodeSpec(catalogue: Catalogue, answers: Readonly<Record<string, string>>): string {
  const known = new Set(catalogue.choices.map((choice) => choice.id));
  for (const id of Object.keys(answers)) {
    if (!known.has(id)) throw new RangeError(`the catalogue has no choice ${id}`);
  }
  let state = 0n;
  for (const choice of catalogue.choices) {
    const answer = answers[choice.id];
    const index = answer === undefined ? -1 : choice.options.findIndex((option) => option.id === answer);
    if (answer !== undefined && index < 0) throw new RangeError(`${choice.id} has no option ${answer}`);
    state = state * radix(choice) + BigInt(index + 1);
  }
  const groups = groupsNeeded(catalogue);
  const stateBits = bitsPerGroup * BigInt(groups) - versionBits;
  const whole = (BigInt(catalogue.version) << stateBits) | state;
  return Array.from({ length: groups }, (_, position) => {
    const chunk = Number(
      (whole >> (bitsPerGroup * BigInt(groups - 1 - position))) & ((1n << bitsPerGroup) - 1n),
    );
    const data = [chunk >> 10, (chunk >> 5) & 31, chunk & 31];
    return [...data, checkValue(data, position)].map((value) => alphabet.charAt(value)).join("");
  }).join("-");
}

type Groups = { ok: true; groups: number[][] } | SpecProblem;

function readGroups(code: string): Groups {
  const values: number[] = [];
  for (const [index, character] of [...code].entries()) {
    if (/[\s-]/.test(character)) continue;
    const upper = character.toUpperCase().replace(/[IL]/, "1").replace("O", "0");
    const value = alphabet.indexOf(upper);
    if (value < 0) {
      const sentence = `The character "${character}" at place ${index + 1} is not used in spec codes.`;
      return { ok: false, problem: "character", at: index + 1, character, sentence };
    }
    values.push(value);
  }
  if (values.length === 0 || values.length % groupLength !== 0) {
    const sentence = `A spec code is made of groups of four characters; this one has ${values.length} characters.`;
    return { ok: false, problem: "length", sentence };
  }
  const groups: number[][] = [];
  for (let start = 0; start < values.length; start += groupLength) {
    const position = groups.length;
    const data = values.slice(start, start + dataPerGroup);
    if (checkValue(data, position % mostGroups) !== values[start + dataPerGroup]) {
      const sentence = `Group ${position + 1} of the spec code has a slip. Compare its four characters with the original.`;
      return { ok: false, problem: "group", group: position + 1, sentence };
    }
    groups.push(data);
  }
  return { ok: true, groups };
}

function versionOf(groups: readonly number[][]): number {
  const [high = 0, low = 0] = groups[0] ?? [];
  return high * 32 + low;
}

/** Catalogue version of a spec code; characters and every group are checked first. */
export function readSpecVersion(code: string): SpecVersion {
  const read = readGroups(code);
  return read.ok ? { ok: true, version: versionOf(read.groups) } : read;
}

/**
 * Answers of a spec code. Lower case is taken, I and L as 1, O as 0, hyphens and blanks are ignored. A code of another
 * catalogue version, of the wrong length, or with an option that its family does not have, is a problem with a sentence.
 */
export function decodeSpec(code: string, source: CatalogueSource): DecodedSpec {
  const read = readGroups(code);
  if (!read.ok) return read;
  const version = versionOf(read.groups);
  const catalogue = typeof source === "function" ? source(version) : source;
  if (catalogue?.version !== version) {
    const sentence = `This spec code was made with catalogue ${version}, which is not at hand here.`;
    return { ok: false, problem: "version", version, sentence };
  }
  const expected = groupsNeeded(catalogue);
  if (read.groups.length !== expected) {
    const sentence = `A spec code of catalogue ${version} has ${expected} groups; this one has ${read.groups.length}.`;
    return { ok: false, problem: "length", sentence };
  }
  const whole = read.groups.flat().reduce((value, digit) => (value << 5n) | BigInt(digit), 0n);
  return readAnswers(catalogue, whole & ((1n << (bitsPerGroup * BigInt(expected) - versionBits)) - 1n));
}

function readAnswers(catalogue: Catalogue, state: bigint): DecodedSpec {
  const picked: [string, string][] = [];
  let rest = state;
  for (const choice of [...catalogue.choices].reverse()) {
    const option = choice.options[Number(rest % radix(choice)) - 1];
    rest /= radix(choice);
    if (option !== undefined) picked.unshift([choice.id, option.id]);
  }
  const answers = Object.fromEntries(picked);
  if (rest !== 0n) {
    return {
      ok: false,
      problem: "option",
      sentence: "This spec code names an option that its catalogue does not have.",
    };
  }
  const family = answers["family"];
  for (const choice of catalogue.choices) {
    const option = choice.options.find((candidate) => candidate.id === answers[choice.id]);
    if (family !== undefined && option?.families?.includes(family) === false) {
      const sentence = `This spec code asks for ${choice.name} "${option.name}", which its family does not have.`;
      return { ok: false, problem: "option", sentence };
    }
  }
  return { ok: true, catalogue, answers };
}
