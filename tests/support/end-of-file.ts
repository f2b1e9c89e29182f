import { afterAll } from "vitest";

/** What a test file started and must give back, in the order of its start. */
const pending: (() => Promise<void>)[] = [];

/** Has `work` done after the last test of this file, whether the tests passed or not. */
export function atEndOfFile(work: () => Promise<void>): void {
  pending.push(work);
}

afterAll(async () => {
  const failures: unknown[] = [];
  for (let work = pending.pop(); work !== undefined; work = pending.pop()) {
    try {
      await work();
    } catch (error) {
      failures.push(error);
    }
  }
  if (failures.length > 0) throw new AggregateError(failures, "Giving back what the file started failed");
});
