import { AsyncLocalStorage } from "node:async_hooks";
import { Sequelize } from "sequelize";
import { config } from "#server/config.ts";

const storage = new AsyncLocalStorage<Map<string, unknown>>();

// Sequelize finds the running transaction by itself through this: no call has to hand it on.
Sequelize.useCLS({
  get: (key: string) => storage.getStore()?.get(key),
  set: (key: string, value: unknown) => storage.getStore()?.set(key, value),
  run: (work: (context: unknown) => unknown) => {
    const context = new Map(storage.getStore());
    storage.run(context, () => work(context));
  },
  bind: (work: (...values: unknown[]) => unknown) => AsyncLocalStorage.bind(work),
  _contexts: new Map(),
});

/** The process's one connection pool. */
export const sequelize = new Sequelize(config.DATABASE_URL, {
  dialect: "postgres",
  logging: false,
  pool: { max: config.DATABASE_POOL, min: 0, acquire: 20_000, idle: 30_000 },
  dialectOptions: { application_name: "blockwright", statement_timeout: 30_000 },
});

/** The value that the running transaction, if any, left for Sequelize. */
export function fromContext(key: string): unknown {
  return storage.getStore()?.get(key);
}
