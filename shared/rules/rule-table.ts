import type { Choice } from "../catalogue/catalogue.ts";
import type { CompiledRule } from "./compile-rule.ts";

/** 1 kept, 2 broken, 3 undecided where the rule is known to apply, 4 undecided where it is not. */
export type CellVerdict = 1 | 2 | 3 | 4;

/** Typed numbers as given: number id -> decimal text. */
export type Numbers = Readonly<Record<string, string>>;

/**
 * A rule's verdicts for one family (or none yet) at some typed numbers, over the answers of its scope: a cell is the sum of
 * (option index + 1) x stride, an unanswered choice counting nothing. Filled as it is asked.
 */
export interface RuleTable {
  readonly scope: readonly number[];
  readonly strides: readonly number[];
  verdict(cell: number): CellVerdict;
}

/** A judge of the rule for a family and numbers; every time it is asked it reads the scope's answers (-1 = none) anew. */
export type CreateJudge = (
  family: number,
  optionIndexOf: (choice: number) => number,
  numbers: Numbers,
) => () => CellVerdict;

/** Verdicts that are kept; a larger table judges every cell anew. */
const mostCells = 1 << 20;
/** Tables kept per rule for different typed numbers. */
const mostTables = 48;

export interface RuleTables {
  /** The rule's table for a family (-1 = none) at these numbers; the same object while nothing that it reads changes. */
  table(family: number, numbers: Numbers): RuleTable;
}

/** The tables of one rule. `gates`: by number that it reads, the options as [choice, option index] that read it. */
export function createRuleTables(
  entry: CompiledRule,
  choices: readonly Choice[],
  gates: ReadonlyMap<string, readonly (readonly [number, number])[]>,
  createJudge: CreateJudge,
): RuleTables {
  const { scope } = entry;
  const sizes = scope.map((choice) => (choices[choice]?.options.length ?? 0) + 1);
  const strides = sizes.map((_, at) => sizes.slice(0, at).reduce((product, size) => product * size, 1));
  const cells = sizes.reduce((product, size) => product * size, 1);
  const optionAt = (cell: number, choice: number): number => {
    const at = scope.indexOf(choice);
    return at < 0 ? -1 : (Math.floor(cell / (strides[at] ?? 1)) % (sizes[at] ?? 1)) - 1;
  };
  const withoutNumbers = new Map<number, RuleTable>();
  const withNumbers = new Map<string, RuleTable>();

  const create = (
    family: number,
    numbers: Numbers,
    unaffected: (cell: number) => RuleTable | null,
  ): RuleTable => {
    let asked = 0;
    const judge = createJudge(family, (choice) => optionAt(asked, choice), numbers);
    const judgeCell = (cell: number): CellVerdict => {
      const same = unaffected(cell);
      if (same !== null) return same.verdict(cell);
      asked = cell;
      return judge();
    };
    if (cells > mostCells) return { scope, strides, verdict: judgeCell };
    let known: Uint8Array | null = null;
    return {
      scope,
      strides,
      verdict(cell) {
        known ??= new Uint8Array(cells);
        const code = known[cell];
        if (code === 1 || code === 2 || code === 3 || code === 4) return code;
        const judged = judgeCell(cell);
        known[cell] = judged;
        return judged;
      },
    };
  };

  const plain = (family: number): RuleTable => {
    const found = withoutNumbers.get(family) ?? create(family, {}, () => null);
    withoutNumbers.set(family, found);
    return found;
  };

  /** By choice of the scope with options that read one of the numbers: 1 for these, by option index + 1. Null = always read. */
  const readingOptions = (
    readers: readonly (readonly (readonly [number, number])[])[],
  ): { stride: number; size: number; reads: Uint8Array }[] | null => {
    if (readers.some((options) => options.length === 0)) return null;
    const options = readers.flat();
    if (options.some(([choice]) => !scope.includes(choice))) return null;
    return scope.flatMap((choice, at) => {
      const own = options.filter(([reader]) => reader === choice);
      if (own.length === 0) return [];
      const size = sizes[at] ?? 1;
      const reads = new Uint8Array(size);
      for (const [, option] of own) reads[option + 1] = 1;
      return [{ stride: strides[at] ?? 1, size, reads }];
    });
  };

  return {
    table(family, numbers) {
      const read = entry.numbers.filter((id) => numbers[id] !== undefined);
      if (read.length === 0) return plain(family);
      const texts = read.map((id) => [id, numbers[id] ?? ""] as const);
      const key = `${family} ${JSON.stringify(texts)}`;
      const found = withNumbers.get(key);
      if (found !== undefined) return found;
      if (withNumbers.size >= mostTables) withNumbers.clear();
      const base = plain(family);
      // A number is read only with its option: where no such option stands, the table without numbers holds.
      const affected = readingOptions(read.map((id) => gates.get(id) ?? []));
      const unaffected = (cell: number): RuleTable | null => {
        if (affected === null) return null;
        for (const { stride, size, reads } of affected) {
          if (reads[Math.floor(cell / stride) % size] === 1) return null;
        }
        return base;
      };
      const made = create(family, Object.fromEntries(texts), unaffected);
      withNumbers.set(key, made);
      return made;
    },
  };
}
