import type { NumberField, Severity } from "../catalogue/catalogue.ts";
import type { CompiledCatalogue } from "./compile.ts";
import { quickXplain } from "./conflict.ts";
import { flaw, type Flaw } from "./flaw.ts";
import type { Assignment } from "./problem.ts";
import type { Numbers } from "./rule-table.ts";
import { findExtension } from "./search.ts";

/** Verdict of a rule's table for a broken cell. */
const broken = 2;
/** Combinations of a rule's choices that are looked at for each family and set of numbers; of more, every so manieth. */
const mostCombinations = 100_000;
/** Numbers whose least and most are tried in every combination; of more, one is turned at a time. */
const mostCrossed = 6;

/**
 * Rules that never bite. Idle: no combination of its choices, nor any extreme of the numbers it reads, breaks it. Covered: a stop
 * whose every breach breaks other stops as well, so that it closes nothing of its own; the rules named are the ones that cover one
 * such breach. A caution or note is idle when no build that may be ordered shows it.
 */
export function checkBites(compiled: CompiledCatalogue, open: readonly Uint8Array[]): Flaw[] {
  return compiled.rules.flatMap((_, index) => checkRule(compiled, open, index));
}

function checkRule(compiled: CompiledCatalogue, open: readonly Uint8Array[], index: number): Flaw[] {
  const rule = compiled.rules[index]?.rule;
  if (rule === undefined) return [];
  const stop = compiled.stops.findIndex((entry) => entry.rule.id === rule.id);
  let breach: { family: number; given: Assignment } | null = null;
  for (const family of compiled.families.keys()) {
    for (const given of breaches(compiled, index, family, {}, null)) {
      breach ??= { family, given: given.slice() };
      if (isBitten(compiled, family, given, stop)) return [];
    }
  }
  const fields = numbersOf(compiled, index);
  for (const numbers of fields.length === 0 ? [] : samplesOf(fields)) {
    for (const [family, possible] of open.entries()) {
      for (const given of breaches(compiled, index, family, numbers, possible)) {
        if (given[compiled.familyChoice] === family) return [];
      }
    }
  }
  const severity: Severity = "caution";
  if (breach === null || stop < 0) {
    const what = stop < 0 ? "No build that may be ordered shows it" : "Nothing breaks it";
    return [flaw({ kind: "idleRule", severity, sentence: `${what}: ${rule.sentence}`, rules: [rule.id] })];
  }
  const sentence = `It closes nothing that other rules leave open: ${rule.sentence}`;
  const rules = [rule.id, ...coveredBy(compiled, breach.family, breach.given, stop)];
  return [flaw({ kind: "coveredRule", severity: "note", sentence, rules })];
}

/** Answers of a rule's choices, in a family that breaks it; options are those that exist or, if given, are possible. */
function* breaches(
  compiled: CompiledCatalogue,
  index: number,
  family: number,
  numbers: Numbers,
  possible: Uint8Array | null,
): Generator<Assignment> {
  const table = compiled.tables(family, numbers)[index];
  if (table === undefined) return;
  const { scope, strides } = table;
  const options = scope.map((choice) =>
    [...(compiled.choices[choice]?.options.keys() ?? [])].filter((option) =>
      possible === null
        ? compiled.exists(family, choice, option)
        : possible[(compiled.offsets[choice] ?? 0) + option] === 1,
    ),
  );
  const all = options.reduce((product, { length }) => product * length, 1);
  const stride = Math.max(1, Math.ceil(all / mostCombinations));
  const given = new Int16Array(compiled.choices.length).fill(-1);
  given[compiled.familyChoice] = family;
  for (let at = 0; at < all; at += stride) {
    let rest = at;
    let cell = 0;
    for (const [place, choice] of scope.entries()) {
      const among = options[place] ?? [];
      const option = among[rest % among.length] ?? 0;
      rest = Math.floor(rest / among.length);
      given[choice] = option;
      cell += (option + 1) * (strides[place] ?? 0);
    }
    if (table.verdict(cell) === broken) yield given;
  }
}

/** Whether a build that breaks no stop rule, this one left out, extends the answers. */
function isBitten(compiled: CompiledCatalogue, family: number, given: Assignment, stop: number): boolean {
  const without = new Uint8Array(compiled.stops.length);
  if (stop >= 0) without[stop] = 1;
  return findExtension(compiled, compiled.problem(family, {}), given, { without }) !== null;
}

/** A smallest set of other stops that forbid the answers as well. */
function coveredBy(compiled: CompiledCatalogue, family: number, given: Assignment, stop: number): string[] {
  const others = [...compiled.stops.keys()].filter((other) => other !== stop);
  const found = quickXplain(others, (among) => {
    const without = new Uint8Array(compiled.stops.length).fill(1);
    for (const other of among) without[other] = 0;
    return findExtension(compiled, compiled.problem(family, {}), given, { without }) === null;
  });
  return (found ?? []).flatMap((other) => compiled.stops[other]?.rule.id ?? []);
}

function numbersOf(compiled: CompiledCatalogue, index: number): NumberField[] {
  const ids = compiled.rules[index]?.numbers ?? [];
  return ids.flatMap((id) => compiled.numberFields.get(id) ?? []);
}

/** Sets of typed numbers, each at its least or most. */
function samplesOf(fields: readonly NumberField[]): Numbers[] {
  const typed = (field: NumberField, high: boolean): [string, string] => [
    field.id,
    String(high ? field.most : field.least),
  ];
  if (fields.length <= mostCrossed) {
    return Array.from({ length: 2 ** fields.length }, (_, mask) =>
      Object.fromEntries(fields.map((field, at) => typed(field, ((mask >> at) & 1) === 1))),
    );
  }
  return [false, true].flatMap((high) =>
    [-1, ...fields.keys()].map((turned) =>
      Object.fromEntries(fields.map((field, at) => typed(field, at === turned ? !high : high))),
    ),
  );
}
