import { randomBytes } from "node:crypto";
import { Client } from "pg";
import { inject } from "vitest";
import { atEndOfFile } from "./end-of-file.ts";

export interface TestDatabase {
  url: string;
  /** Ends its sessions and removes it; done by itself at the end of the test file. */
  drop: () => Promise<void>;
}

async function onCluster(statement: string): Promise<void> {
  const client = new Client({ connectionString: inject("testCluster").url });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

/** A database of its own, migrated and empty. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const cluster = inject("testCluster");
  const name = `test_${String(process.pid)}_${randomBytes(6).toString("hex")}`;
  await onCluster(`create database ${name} template ${cluster.template}`);
  const url = new URL(cluster.url);
  url.pathname = `/${name}`;
  const drop = (): Promise<void> => onCluster(`drop database if exists ${name} with (force)`);
  atEndOfFile(drop);
  return { url: url.href, drop };
}
