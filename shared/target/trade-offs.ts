import { formatCents } from "../money/cents.ts";

/** What trade-offs are told of. */
interface Compared {
  priceCents: number;
  shipDay: number;
  weight: number;
  wall: number | null;
  displacement: number | null;
  fit: { cautions: number };
}

interface Respect {
  /** The figure at the places that are told; greater is worse. Null where it is not known. */
  of: (one: Compared) => number | null;
  best: string;
  /** What is given up, by how much it is worse. */
  worse: (by: number) => string;
}

const counted = (count: number, one: string): string => `${count} ${one}${count === 1 ? "" : "s"}`;

const respects: readonly Respect[] = [
  { of: ({ priceCents }) => priceCents, best: "lowest price", worse: (by) => `+${formatCents(by)}` },
  { of: ({ shipDay }) => shipDay, best: "soonest", worse: (by) => `${counted(by, "day")} later` },
  {
    of: ({ wall }) => (wall === null ? null : -Math.round(wall * 10_000)),
    best: "thickest wall",
    worse: (by) => `wall ${(by / 10_000).toFixed(4)} in thinner`,
  },
  {
    of: ({ displacement }) => (displacement === null ? null : -Math.round(displacement * 10)),
    best: "most displacement",
    worse: (by) => `${(by / 10).toFixed(1)} cu in less`,
  },
  { of: ({ weight }) => Math.round(weight), best: "lightest", worse: (by) => `${by} lb heavier` },
  {
    of: ({ fit }) => fit.cautions,
    best: "fewest cautions",
    worse: (by) => counted(by, "more caution"),
  },
];

/** Where a build is best among the answers, alone or with others, and what it gives up; only respects in which they differ. */
export function tradeOffsOf(one: Compared, all: readonly Compared[]): string[] {
  const strengths: string[] = [];
  const losses: string[] = [];
  for (const { of, best, worse } of respects) {
    const own = of(one);
    const known = all.flatMap((other) => of(other) ?? []);
    const least = Math.min(...known);
    if (own === null || known.every((figure) => figure === least)) continue;
    if (own === least) strengths.push(best);
    else losses.push(worse(own - least));
  }
  return [...strengths, ...losses];
}
