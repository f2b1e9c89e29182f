import type { Build } from "../catalogue/build.ts";
import type { CompiledCatalogue } from "../rules/compile.ts";
import type { EvaluationContext } from "../rules/evaluation.ts";
import { findingsOf } from "../rules/findings.ts";
import type { Assignment } from "../rules/problem.ts";
import type { Numbers } from "../rules/rule-table.ts";
import { totalsOf } from "../rules/totals.ts";
import { findCandidates, type Candidate, type Candidates } from "./candidates.ts";
import type { PowerReach } from "./power-reach.ts";
import type { Target } from "./target.ts";
import { tradeOffsOf } from "./trade-offs.ts";

/** A complete build that answers a target; it may be ordered as it stands. */
export interface RankedBuild {
  build: Build;
  priceCents: number;
  /** Ship date, ISO, and the same as a day number. */
  shipsOn: string;
  shipDay: number;
  /** Pounds, bare block. */
  weight: number;
  /** Nominal least, in; null where it is not known. */
  wall: number | null;
  /** Cu in; null where the rotating assembly that is there does not tell. */
  displacement: number | null;
  /** What engines of this kind usually make; null where speed, pressure or shot are not known. */
  power: PowerReach | null;
  fit: {
    /** Cu in from the middle of the displacement wished for; null where there is no middle. */
    offMiddle: number | null;
    cautions: number;
    /** Rules that cannot be judged until something is measured. */
    toConfirm: number;
  };
  /** In plain words: where it is best among the answers, and what it gives up against the best in each other respect. */
  tradeOffs: string[];
}

interface Measured extends Candidate {
  cautions: number;
  /** How far it is from what was asked for: whole per cent short of the power and off the middle, and one for every caution. */
  misfit: number;
}

interface Weighed extends Measured {
  weight: number;
  wall: number | null;
  offMiddle: number | null;
  /** Family, stroke and cap style, and the same with the bore. */
  group: string;
  kind: string;
}

/**
 * The best complete builds for a target, at most `most`, ranked by price, weight, wall and date. They lie on the front of price,
 * date and fit: no other build is as good in all three and better in one. No two are alike in family, bore, stroke and cap style at
 * once. A power that no build reaches is answered by those that come nearest. Empty where nothing fits (see `wishesInTheWay`).
 * Pure. Throws RangeError on a target that the catalogue cannot read and where the rules join too many choices.
 */
export function findBuilds(
  context: EvaluationContext,
  target: Target,
  { most = 8 }: { most?: number } = {},
): RankedBuild[] {
  const candidates = findCandidates(context, target);
  const { compiled, question } = candidates;
  const front = frontOf(candidates, target).map((measured) =>
    weigh(context, compiled, target, { measured, numbers: question.numbers }),
  );
  const chosen = choose(front.sort(byRank), most);
  const builds = chosen.map((one): Omit<RankedBuild, "tradeOffs"> => {
    const build: Build = {
      answers: answersOf(compiled, one.assignment),
      numbers: { ...question.numbers },
      mine: [...question.mine],
    };
    const findings = findingsOf(compiled, one.assignment, question.numbers);
    return {
      build,
      priceCents: one.priceCents,
      shipsOn: one.ships.date,
      shipDay: one.ships.day,
      weight: one.weight,
      wall: one.wall,
      displacement: one.displacement,
      power: one.power,
      fit: {
        offMiddle: one.offMiddle,
        cautions: one.cautions,
        toConfirm: findings.filter(({ undecided }) => undecided).length,
      },
    };
  });
  return builds.map((build) => ({ ...build, tradeOffs: tradeOffsOf(build, builds) }));
}

function answersOf(compiled: CompiledCatalogue, assignment: Assignment): Build["answers"] {
  return Object.fromEntries(
    compiled.choices.flatMap(({ id, options }, choice) => {
      const option = options[assignment[choice] ?? -1];
      return option === undefined ? [] : [[id, option.id] as const];
    }),
  );
}

/** Per cent of the power aimed at that is out of reach. */
function shortfall({ power }: Candidate, target: Target): number {
  if (target.power === undefined || power === null) return 0;
  return Math.max(0, (100 * (target.power - power.high)) / target.power);
}

function middleOf({ displacement }: Target): number | null {
  const { least, most } = displacement ?? {};
  return least === undefined || most === undefined ? null : (least + most) / 2;
}

function offMiddle({ displacement }: Candidate, middle: number | null): number | null {
  return middle === null || displacement === null ? null : Math.abs(displacement - middle);
}

/** Candidates that no other beats in price, date and fit. Those that reach the power aimed at, if any does, leave the others out. */
function frontOf({ compiled, question, found }: Candidates, target: Target): Measured[] {
  const reached = found.some((candidate) => shortfall(candidate, target) === 0);
  const middle = middleOf(target);
  const farOff = (one: Candidate): number =>
    middle === null ? 0 : Math.floor((100 * (offMiddle(one, middle) ?? 0)) / middle);
  const sorted = found
    .map((candidate) => ({ candidate, short: shortfall(candidate, target) }))
    .filter(({ short }) => !reached || short === 0)
    .map(({ candidate, short }) => ({ candidate, missed: Math.floor(short) + farOff(candidate) }))
    .sort(
      (a, b) =>
        a.candidate.priceCents - b.candidate.priceCents ||
        a.candidate.ships.day - b.candidate.ships.day ||
        a.missed - b.missed,
    );
  // What is kept so far, one of each price, date and misfit: none that comes later is cheaper.
  const marks = new Map<string, Mark>();
  const kept: Measured[] = [];
  for (const { candidate, missed } of sorted) {
    const { priceCents, ships } = candidate;
    const mark = { priceCents, day: ships.day, misfit: missed };
    // Cautions only add to the misfit, and are asked for only where that may matter.
    if (isBeaten(mark, marks)) continue;
    const cautions = cautionsOf(compiled, candidate.assignment, question.numbers);
    mark.misfit = missed + cautions;
    if (isBeaten(mark, marks)) continue;
    kept.push({ ...candidate, cautions, misfit: mark.misfit });
    marks.set(`${priceCents} ${mark.day} ${mark.misfit}`, mark);
  }
  // Of one price a later one may still beat an earlier one.
  return kept.filter(
    ({ priceCents, ships, misfit }) => !isBeaten({ priceCents, day: ships.day, misfit }, marks),
  );
}

/** Price, date and fit of a candidate; less is better. */
interface Mark {
  priceCents: number;
  day: number;
  misfit: number;
}

function isBeaten(mark: Mark, marks: ReadonlyMap<string, Mark>): boolean {
  for (const other of marks.values()) {
    if (other.priceCents > mark.priceCents || other.day > mark.day || other.misfit > mark.misfit) continue;
    if (other.priceCents < mark.priceCents || other.day < mark.day || other.misfit < mark.misfit) return true;
  }
  return false;
}

function cautionsOf(compiled: CompiledCatalogue, assignment: Assignment, numbers: Numbers): number {
  const tables = compiled.tables(assignment[compiled.familyChoice] ?? -1, numbers);
  let broken = 0;
  tables.forEach((table, at) => {
    if (compiled.rules[at]?.rule.severity !== "caution") return;
    const cell = table.scope.reduce(
      (sum, choice, place) => sum + ((assignment[choice] ?? -1) + 1) * (table.strides[place] ?? 0),
      0,
    );
    if (table.verdict(cell) === 2) broken += 1;
  });
  return broken;
}

function weigh(
  context: EvaluationContext,
  compiled: CompiledCatalogue,
  target: Target,
  { measured, numbers }: { measured: Measured; numbers: Numbers },
): Weighed {
  const { assignment, stroke } = measured;
  const family = assignment[compiled.familyChoice] ?? -1;
  const answer = (id: string): number => assignment[compiled.choiceIndex.get(id) ?? -1] ?? -1;
  const group = `${family} ${stroke ?? "unknown"} ${answer("capStyle")}`;
  return {
    ...measured,
    weight: totalsOf(context, compiled, assignment, numbers)?.weight ?? 0,
    wall: compiled.reading(family, (choice) => assignment[choice] ?? -1, numbers).figure("wall"),
    offMiddle: offMiddle(measured, middleOf(target)),
    group,
    kind: `${group} ${answer("bore")}`,
  };
}

function byRank(a: Weighed, b: Weighed): number {
  return (
    a.priceCents - b.priceCents ||
    a.weight - b.weight ||
    (b.wall ?? 0) - (a.wall ?? 0) ||
    a.ships.day - b.ships.day ||
    a.misfit - b.misfit ||
    (a.offMiddle ?? 0) - (b.offMiddle ?? 0) ||
    compareAssignments(a.assignment, b.assignment)
  );
}

function compareAssignments(a: Assignment, b: Assignment): number {
  const at = a.findIndex((option, choice) => option !== b[choice]);
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}

/**
 * The best in each respect first, so that every respect has its best; then the best of each family, stroke and cap style; then by
 * rank; no two of a kind. In the order of rank.
 */
function choose(ranked: readonly Weighed[], most: number): Weighed[] {
  const respects: ((one: Weighed) => number)[] = [
    (one) => one.priceCents,
    (one) => one.ships.day,
    (one) => one.misfit,
    (one) => one.offMiddle ?? 0,
    (one) => -(one.wall ?? 0),
    (one) => one.weight,
    (one) => -(one.displacement ?? 0),
  ];
  const taken = new Map<string, Weighed>();
  const take = (one: Weighed | undefined): void => {
    if (one !== undefined && taken.size < most && !taken.has(one.kind)) taken.set(one.kind, one);
  };
  for (const respect of respects) {
    const best = ranked.reduce((least, one) => Math.min(least, respect(one)), Number.POSITIVE_INFINITY);
    take(ranked.find((one) => respect(one) === best));
  }
  const groups = new Set<string>();
  for (const one of ranked) {
    if (!groups.has(one.group)) take(one);
    groups.add(one.group);
  }
  for (const one of ranked) take(one);
  const chosen = new Set(taken.values());
  return ranked.filter((one) => chosen.has(one));
}
