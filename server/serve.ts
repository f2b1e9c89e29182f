import { once } from "node:events";
import { createServer, type Server } from "node:http";
import { createApp } from "#server/app.ts";
import { config } from "#server/config.ts";
import { sequelize } from "#server/database/connection.ts";
import { isMigrated, migrate } from "#server/database/migrate.ts";
import { seedDemo } from "#server/demo/seed.ts";
import { type RunningWorkers, startWorkers } from "#server/jobs/workers.ts";
import { log } from "#server/log.ts";

const ANSWERS_WITHIN = 10_000;

class StartRefused extends Error {
  override readonly name = "StartRefused";
}

/** Starts the process: database, demo shop where asked for, job workers, HTTP. Stops in the opposite order on a signal. */
export async function serve(): Promise<void> {
  await sequelize.authenticate();
  if (config.MIGRATE_ON_START) {
    const steps = await migrate();
    log.info({ steps }, "migrated");
  } else if (!(await isMigrated())) {
    throw new StartRefused(
      "The database is not in the newest shape: run npm run migrate, or set MIGRATE_ON_START=1.",
    );
  }
  if (config.DEMO) await seedDemo();
  let workersRun = (): boolean => false;
  const server = createServer(createApp(() => workersRun()));
  server.listen(config.PORT, config.HOST);
  await once(server, "listening");
  const workers = await startWorkers(log);
  workersRun = workers.isRunning;
  stopOnSignal(server, workers);
  log.info({ ready: true, origin: config.PUBLIC_ORIGIN, mailbox: config.MAILBOX_URL }, "ready");
}

function stopOnSignal(server: Server, workers: RunningWorkers): void {
  let stopping = false;
  const stop = (signal: NodeJS.Signals): void => {
    if (stopping) return;
    stopping = true;
    log.info({ signal }, "stopping");
    finish(server, workers).then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, "could not stop cleanly");
        process.exit(1);
      },
    );
  };
  for (const signal of ["SIGTERM", "SIGINT", "SIGHUP"] as const) process.on(signal, stop);
}

/** Takes no new request, lets those under way and the running jobs finish, then lets the database go. */
async function finish(server: Server, workers: RunningWorkers): Promise<void> {
  const closed = once(server, "close");
  server.close();
  server.closeIdleConnections();
  const patience = setTimeout(() => server.closeAllConnections(), ANSWERS_WITHIN);
  await Promise.all([closed, workers.stop()]);
  clearTimeout(patience);
  await sequelize.close();
}
