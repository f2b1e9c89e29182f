import type { Logger } from "pino";
import { QueryTypes } from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import { sendEmail } from "#server/services/emails/send-email.ts";
import { checkPayment } from "#server/services/payments/check-payment.ts";
import { refundPayment } from "#server/services/payments/refund-payment.ts";
import { createBoss } from "./boss.ts";
import { jobNames, jobSchemas, type JobName } from "./jobs.ts";

/** The one that does each job. It may be called twice for the same job and must not mind. */
const workers: Record<JobName, (data: unknown) => Promise<void>> = {
  "send-email": (data) => sendEmail(jobSchemas["send-email"].parse(data).emailId),
  "check-payment": (data) => checkPayment(jobSchemas["check-payment"].parse(data).paymentId),
  "refund-payment": (data) => refundPayment(jobSchemas["refund-payment"].parse(data).refundId),
};

const LONGEST_DELAY = "10 minutes";
const STOP_WITHIN = 20_000;

export interface RunningWorkers {
  isRunning: () => boolean;
  /** Takes no more jobs, lets those under way finish, and returns. */
  stop: () => Promise<void>;
}

/** Starts doing jobs in this process. Any number of processes may do so at once. */
export async function startWorkers(log: Logger): Promise<RunningWorkers> {
  const boss = createBoss({ workers: true });
  boss.on("error", (error) => log.error({ err: error }, "job queue"));
  await boss.start();
  for (const name of jobNames) await watch(name);
  // The queue doubles the delay after every failure without end; ten minutes is the longest that anything waits.
  const capping = setInterval(() => {
    capDelays().catch((error: unknown) => log.error({ err: error }, "job delays"));
  }, 60_000);
  let running = true;

  async function watch(name: JobName): Promise<void> {
    await boss.work<unknown>(name, { pollingIntervalSeconds: 0.5, batchSize: 1 }, async (jobs) => {
      for (const job of jobs) {
        try {
          await workers[name](job.data);
          log.info({ job: name, jobId: job.id }, "job done");
        } catch (error) {
          log.warn({ job: name, jobId: job.id, err: error }, "job failed, will be tried again");
          throw error;
        }
      }
    });
  }

  return {
    isRunning: () => running,
    stop: async () => {
      running = false;
      clearInterval(capping);
      await boss.stop({ graceful: true, wait: true, timeout: STOP_WITHIN });
    },
  };
}

async function capDelays(): Promise<void> {
  await sequelize.query(
    `UPDATE jobs.job SET start_after = now() + :longest::interval
      WHERE state = 'retry' AND start_after > now() + :longest::interval`,
    { replacements: { longest: LONGEST_DELAY }, type: QueryTypes.UPDATE },
  );
}
