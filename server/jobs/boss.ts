import PgBoss from "pg-boss";
import { config } from "#server/config.ts";
import { jobNames } from "./jobs.ts";

const SCHEMA = "jobs";
/** Jobs that failed for good are kept there, for a person to look at. */
const GIVEN_UP = "given-up";

const policy = {
  // Delays double from a second to ten minutes (see workers.ts): a week of trying before a job is given up.
  retryLimit: 1000,
  retryDelay: 1,
  retryBackoff: true,
  // A worker that was killed in the middle of a job: the job is taken up again after this.
  expireInSeconds: 60,
  retentionDays: 90,
};

/** A door to the job queue. It opens no connection before `start`. */
export function createBoss(options: { workers: boolean }): PgBoss {
  return new PgBoss({
    connectionString: config.DATABASE_URL,
    application_name: "blockwright jobs",
    schema: SCHEMA,
    max: options.workers ? 4 : 1,
    migrate: !options.workers,
    supervise: options.workers,
    schedule: false,
    maintenanceIntervalSeconds: 20,
    archiveFailedAfterSeconds: 90 * 24 * 3600,
    deleteAfterDays: 90,
  });
}

/** Makes or updates the queue's own schema and a queue for each kind of job. Safe to repeat. */
export async function createJobQueues(): Promise<void> {
  const boss = createBoss({ workers: false });
  let failure: unknown;
  boss.on("error", (error) => (failure = error));
  await boss.start();
  try {
    await boss.createQueue(GIVEN_UP, { name: GIVEN_UP });
    for (const name of jobNames) {
      const queue = { name, deadLetter: GIVEN_UP, ...policy };
      await boss.createQueue(name, queue);
      await boss.updateQueue(name, queue);
    }
  } finally {
    await boss.stop({ graceful: false });
  }
  if (failure instanceof Error) throw failure;
}
