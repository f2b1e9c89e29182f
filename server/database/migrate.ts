import { resolve } from "node:path";
import { pathToFileURL } from "node:url";
import pg from "pg";
import type { Sequelize } from "sequelize";
import { SequelizeStorage, Umzug } from "umzug";
import { config } from "#server/config.ts";
import { createJobQueues } from "#server/jobs/boss.ts";
import { sequelize } from "./connection.ts";
import { transaction } from "./transaction.ts";

/** One step forward; there is none back. All pending steps are one transaction. */
export type Migration = (step: { name: string; context: Sequelize }) => Promise<void>;

const folder = resolve(import.meta.dirname, "../migrations");

/** Any number that all processes of the product agree on. */
const MIGRATION_LOCK = 47_001;

function isMigration(module: unknown): module is { up: Migration } {
  return typeof module === "object" && module !== null && "up" in module && typeof module.up === "function";
}

const steps = new Umzug({
  context: sequelize,
  storage: new SequelizeStorage({ sequelize, tableName: "migrations", modelName: "migrations" }),
  logger: undefined,
  migrations: {
    glob: ["*.ts", { cwd: folder }],
    resolve: ({ name, path, context }) => ({
      name,
      up: async () => {
        if (path === undefined) throw new Error(`Migration ${name} has no file`);
        const module: unknown = await import(pathToFileURL(path).href);
        if (!isMigration(module)) throw new Error(`Migration ${name} exports no function "up"`);
        await module.up({ name, context });
      },
    }),
  },
});

/**
 * Brings the database to the newest shape, the job queue's schema included. Several processes may call it at once:
 * one works, the others wait.
 * @returns the names of the steps that were taken
 */
export async function migrate(): Promise<string[]> {
  const lock = new pg.Client({ connectionString: config.DATABASE_URL });
  await lock.connect();
  try {
    await lock.query("SELECT pg_advisory_lock($1)", [MIGRATION_LOCK]);
    const taken = await transaction(() => steps.up());
    await createJobQueues();
    return taken.map((step) => step.name);
  } finally {
    await lock.end();
  }
}

/** Whether no step is left to take. */
export async function isMigrated(): Promise<boolean> {
  return (await steps.pending()).length === 0;
}

async function run(): Promise<void> {
  try {
    const taken = await migrate();
    process.stdout.write(
      taken.length === 0 ? "The database is up to date.\n" : `Migrated: ${taken.join(", ")}.\n`,
    );
  } finally {
    await sequelize.close();
  }
}

if (process.argv[1] !== undefined && import.meta.filename === resolve(process.argv[1])) await run();
