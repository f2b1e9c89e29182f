import { describe, expect, test } from "vitest";
import { QueryTypes, Transaction } from "sequelize";
import { randomUUID } from "node:crypto";
import { sequelize } from "#server/database/connection.ts";
import { transaction } from "#server/database/transaction.ts";
import { enqueue } from "#server/jobs/queue.ts";

async function count(sql: string): Promise<number> {
  const rows = await sequelize.query<{ count: number }>(sql, { type: QueryTypes.SELECT });
  return rows[0]?.count ?? Number.NaN;
}
const jobs = (emailId: string): Promise<number> =>
  count(`SELECT count(*)::integer AS count FROM jobs.job WHERE data->>'emailId' = '${emailId}'`);
const limits = (): Promise<number> => count("SELECT count(*)::integer AS count FROM rate_limits");

describe("a transaction", () => {
  test("takes rows and jobs with it when it fails", async () => {
    const emailId = randomUUID();
    const before = await limits();
    await expect(
      transaction(async () => {
        await sequelize.query("INSERT INTO rate_limits (key) VALUES ('lost')");
        await enqueue("send-email", { emailId });
        expect(await jobs(emailId)).toBe(1);
        throw new Error("stop here");
      }),
    ).rejects.toThrow("stop here");
    expect(await jobs(emailId)).toBe(0);
    expect(await limits()).toBe(before);
  });

  test("keeps rows and jobs when it ends well", async () => {
    const emailId = randomUUID();
    await transaction(() => enqueue("send-email", { emailId }));
    expect(await jobs(emailId)).toBe(1);
  });

  test("joins the one around it", async () => {
    const before = await limits();
    await expect(
      transaction(async () => {
        await transaction(() => sequelize.query("INSERT INTO rate_limits (key) VALUES ('inner')"));
        throw new Error("outer fails");
      }),
    ).rejects.toThrow("outer fails");
    expect(await limits()).toBe(before);
  });

  test("does not report success when a failed statement was swallowed", async () => {
    await expect(
      transaction(async () => {
        await sequelize.query("INSERT INTO rate_limits (key) VALUES ('swallowed')");
        await sequelize.query("SELECT 1/0").then(
          () => undefined,
          () => undefined,
        );
      }),
    ).rejects.toThrow(/current transaction is aborted/);
  });

  test("runs again after a deadlock, so that both sides get through", async () => {
    await sequelize.query("INSERT INTO rate_limits (key) VALUES ('left'), ('right')");
    let runs = 0;
    const touch = (first: string, second: string): Promise<unknown> =>
      transaction(async () => {
        runs += 1;
        await sequelize.query(`UPDATE rate_limits SET points = points + 1 WHERE key = '${first}'`);
        await sequelize.query("SELECT pg_sleep(0.3)");
        await sequelize.query(`UPDATE rate_limits SET points = points + 1 WHERE key = '${second}'`);
      });
    await Promise.all([touch("left", "right"), touch("right", "left")]);
    expect(runs).toBeGreaterThan(2);
    expect(
      await count("SELECT sum(points)::integer AS count FROM rate_limits WHERE key IN ('left', 'right')"),
    ).toBe(4);
  });

  test("runs again after a serialization failure", async () => {
    await sequelize.query("INSERT INTO rate_limits (key) VALUES ('counter')");
    const add = (): Promise<unknown> =>
      transaction(
        async () => {
          const now = await count("SELECT points AS count FROM rate_limits WHERE key = 'counter'");
          await sequelize.query("SELECT pg_sleep(0.1)");
          await sequelize.query(`UPDATE rate_limits SET points = ${now + 1} WHERE key = 'counter'`);
        },
        { isolation: Transaction.ISOLATION_LEVELS.SERIALIZABLE },
      );
    await Promise.all([add(), add(), add()]);
    expect(await count("SELECT points AS count FROM rate_limits WHERE key = 'counter'")).toBe(3);
  });
});
