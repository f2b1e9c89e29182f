import { queryInTransaction, transaction } from "#server/database/transaction.ts";
import { createBoss } from "./boss.ts";
import { jobSchemas, type JobData, type JobName } from "./jobs.ts";

const boss = createBoss({ workers: false });

/**
 * Puts a job in the queue within the running transaction: it is there exactly when that commits. Without a running
 * transaction it makes one.
 */
export async function enqueue<Name extends JobName>(
  name: Name,
  data: JobData<Name>,
  options: { startAfter?: Date } = {},
): Promise<void> {
  const checked = jobSchemas[name].parse(data);
  await transaction(async () => {
    const id = await boss.send(name, checked, { ...options, db: { executeSql: queryInTransaction } });
    if (id === null) throw new Error(`The queue took no job "${name}"`);
  });
}
