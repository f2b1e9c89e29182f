import { Client } from "pg";
import type { TestProject } from "vitest/node";
import { z } from "zod";
import { runNodeWell } from "./node-program.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** The tests' own cluster and the migrated database that every test database is copied from. */
    testCluster: { url: string; template: string };
  }
}

const clusterProgram = "server/start/test-cluster.mjs";
const answerSchema = z.object({ url: z.string(), template: z.string() });

/** Any number that all runs on this cluster agree on. */
const templateLock = 4700;

async function databaseExists(client: Client, name: string): Promise<boolean> {
  const { rowCount } = await client.query("select 1 from pg_database where datname = $1", [name]);
  return rowCount === 1;
}

/** Migrates under another name first, so that a run that was killed leaves no half-made template. */
async function makeTemplate(clusterUrl: string, template: string): Promise<void> {
  const client = new Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    await client.query("select pg_advisory_lock($1)", [templateLock]);
    if (await databaseExists(client, template)) return;
    const unfinished = `${template}_unfinished`;
    await client.query(`drop database if exists ${unfinished} with (force)`);
    await client.query(`create database ${unfinished}`);
    const url = new URL(clusterUrl);
    url.pathname = `/${unfinished}`;
    await runNodeWell(["--import", "tsx", "server/database/migrate.ts"], {
      ...process.env,
      NODE_ENV: "test",
      LOG_LEVEL: "warn",
      DATABASE_URL: url.href,
      SESSION_SECRET: "the-migration-signs-no-session-at-all",
      STRIPE_SECRET_KEY: "sk_test_unused_by_the_migration",
      STRIPE_WEBHOOK_SECRET: "whsec_unused_by_the_migration",
      STRIPE_API_ORIGIN: "http://127.0.0.1:9",
      SMTP_URL: "smtp://127.0.0.1:9",
      MAIL_FROM: "shop@shop.example",
    });
    await client.query(`alter database ${unfinished} rename to ${template}`);
  } finally {
    await client.end();
  }
}

/** Starts the tests' cluster where it is not running, and makes the template where the migrations changed. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const processId = String(process.pid);
  const answer = await runNodeWell([clusterProgram, "acquire", processId]);
  const release = async (): Promise<void> => {
    await runNodeWell([clusterProgram, "release", processId]);
  };
  try {
    // Lines above the last one tell what was installed or where the data lie.
    const cluster = answerSchema.parse(JSON.parse(answer.trim().split("\n").at(-1) ?? ""));
    await makeTemplate(cluster.url, cluster.template);
    project.provide("testCluster", cluster);
  } catch (error) {
    await release();
    throw error;
  }
  return release;
}
