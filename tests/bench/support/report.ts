import { mkdir, writeFile } from "node:fs/promises";
import { join } from "node:path";

/** One figure of a benchmark. */
export interface Measured {
  name: string;
  value: number;
  unit: string;
  /** As in "(aim >= 20)"; absent where there is none. */
  aim?: string;
  samples: readonly number[];
}

/** The value below which so large a part of the samples lies. */
export function quantile(samples: readonly number[], part: number): number {
  const sorted = [...samples].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * part))] ?? Number.NaN;
}

export const median = (samples: readonly number[]): number => quantile(samples, 0.5);

/** Milliseconds that something takes. */
export function timed(run: () => void): number {
  const start = performance.now();
  run();
  return performance.now() - start;
}

/** Prints one line a figure and writes a JSON file with all samples. */
export async function report(group: string, figures: readonly Measured[], seeds: string): Promise<void> {
  for (const { name, value, unit, aim } of figures) {
    const shown = value >= 100 ? value.toFixed(0) : value.toPrecision(3);
    process.stdout.write(`${name} ${Number(shown)} ${unit}${aim === undefined ? "" : ` (aim ${aim})`}\n`);
  }
  const folder = join(import.meta.dirname, "..", "..", "..", ".data", "bench");
  await mkdir(folder, { recursive: true });
  const stamp = new Date().toISOString().replaceAll(/[:.]/g, "-");
  const file = join(folder, `${group}-${stamp}.json`);
  await writeFile(file, `${JSON.stringify({ group, seeds, figures }, null, 1)}\n`);
}
