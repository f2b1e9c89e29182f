import pg from "pg";
import { DatabaseError, Transaction } from "sequelize";
import { fromContext, sequelize } from "./connection.ts";

const MOST_ATTEMPTS = 6;
const serializationFailure = "40001";
const deadlock = "40P01";

/**
 * Runs `work` in one database transaction; every query of any model inside takes part by itself. A call within
 * another joins it: then the outer one decides. Serialization failures and deadlocks run `work` again, so it must
 * do nothing but database work (and `enqueue`): no network call, no answer to anybody.
 * Let database errors pass: PostgreSQL gives up the transaction at the first one.
 * @throws whatever `work` throws, after rolling back
 */
export async function transaction<Result>(
  work: () => Promise<Result>,
  options: { isolation?: Transaction.ISOLATION_LEVELS } = {},
): Promise<Result> {
  if (runningTransaction()) return work();
  const asked = options.isolation === undefined ? {} : { isolationLevel: options.isolation };
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await sequelize.transaction(asked, async () => {
        const result = await work();
        // COMMIT after a failed statement rolls back without a word; this query then fails instead.
        await sequelize.query("SELECT 1");
        return result;
      });
    } catch (error) {
      if (!mayRunAgain(error) || attempt >= MOST_ATTEMPTS) throw error;
      await new Promise((resolve) => setTimeout(resolve, Math.random() * 20 * 2 ** attempt));
    }
  }
}

function mayRunAgain(error: unknown): boolean {
  if (!(error instanceof DatabaseError)) return false;
  const code = "code" in error.original ? error.original.code : undefined;
  return code === serializationFailure || code === deadlock;
}

function runningTransaction(): Transaction | null {
  const found = fromContext("transaction");
  return found instanceof Transaction ? found : null;
}

/**
 * Runs SQL of a library on the running transaction's own connection.
 * @throws Error outside of a transaction
 */
export async function queryInTransaction(
  text: string,
  values: unknown[],
): Promise<{ rows: Record<string, unknown>[] }> {
  const running = runningTransaction();
  if (!running || !("connection" in running) || !(running.connection instanceof pg.Client))
    throw new Error("There is no running transaction");
  return running.connection.query<Record<string, unknown>>(text, values);
}
