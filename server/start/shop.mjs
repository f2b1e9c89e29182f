import { join } from "node:path";
import { readFile } from "node:fs/promises";
import { clusterVersion, startCluster, stopCluster } from "./cluster.mjs";
import { dataFolderFor, possibleDataFolders } from "./data-folder.mjs";
import { startFakes } from "./fakes.mjs";
import { say } from "./failure.mjs";
import { checkNodeVersion } from "./node-version.mjs";
import { claimProductPort, productPort, rememberedPorts } from "./ports.mjs";
import { pause } from "./alive.mjs";
import { ensurePostgres } from "./postgres-package.mjs";
import { prepareMachine } from "./preparation.mjs";
import { checkNotRunning, claimDataFolder } from "./running.mjs";
import { secretsOf } from "./secrets.mjs";
import { Supervision } from "./supervision.mjs";

const database = "blockwright";
const webhookPath = "/api/stripe-webhook";
const demo = JSON.parse(await readFile(new URL("demo-shop.json", import.meta.url), "utf8"));

function productAddress() {
  const port = productPort();
  const host = process.env.HOST || "127.0.0.1";
  const anyAddress = host === "0.0.0.0" || host === "::";
  const reachable = anyAddress ? "127.0.0.1" : host.includes(":") ? `[${host}]` : host;
  return { host, port, reachable, origin: process.env.PUBLIC_ORIGIN || `http://${reachable}:${port}` };
}

async function startDatabase(folder, port, password) {
  const programs = await ensurePostgres(await clusterVersion(folder));
  const cluster = await startCluster({ programs, folder, port, password });
  const there = await cluster.run(`select 1 from pg_database where datname = '${database}'`);
  if (there === "") await cluster.run(`create database ${database}`);
  return cluster;
}

async function isReady(origin) {
  try {
    return (await fetch(`${origin}/readyz`, { signal: AbortSignal.timeout(5000) })).status === 200;
  } catch (error) {
    // Nobody listens yet, or it takes its time.
    if (error instanceof TypeError || error.name === "TimeoutError") return false;
    throw error;
  }
}

function announce(origin, mailboxUrl) {
  const accounts = demo.accounts.map(({ role, email }) => `  ${role.padEnd(9)} ${email}`);
  say(
    [
      "",
      `Blockwright is ready: ${origin}`,
      "",
      `Demo accounts, password of each: ${demo.password}`,
      ...accounts,
      "",
      `E-mail that the shop sends: ${mailboxUrl}`,
      "",
      "Ctrl-C stops everything.",
    ].join("\n"),
  );
}

/** Resolves at the first signal that asks this process to stop. */
function askedToStop() {
  return new Promise((resolve) => {
    for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => resolve(signal));
  });
}

function environmentFor({ host, port, origin, cluster, secrets, fakes }) {
  return {
    ...process.env,
    NODE_ENV: "development",
    HOST: host,
    PORT: String(port),
    PUBLIC_ORIGIN: origin,
    DATABASE_URL: cluster.url(database),
    SESSION_SECRET: secrets.sessionSecret,
    STRIPE_SECRET_KEY: secrets.stripeSecretKey,
    STRIPE_WEBHOOK_SECRET: secrets.stripeWebhookSecret,
    STRIPE_API_ORIGIN: fakes.stripeOrigin,
    SMTP_URL: fakes.smtpUrl,
    MAIL_FROM: process.env.MAIL_FROM || demo.mailFrom,
    MAILBOX_URL: fakes.mailboxUrl,
    MIGRATE_ON_START: "1",
    DEMO: "1",
  };
}

/** The answers of all, each waited for even when another failed, so that nothing starts behind a stop's back. */
async function allOrFirstFailure(promises) {
  const results = await Promise.allSettled(promises);
  const failure = results.find((result) => result.status === "rejected");
  if (failure !== undefined) throw failure.reason;
  return results.map((result) => result.value);
}

/** Starts all parts in order and says where they are. */
async function openShop({
  dataFolder,
  databaseFolder,
  supervision,
  address,
  beforeServing,
  serve,
  behindAnother,
}) {
  const { host, port, origin, reachable } = address;
  await beforeServing();
  const secrets = await secretsOf(dataFolder);
  const ports = await rememberedPorts(dataFolder, ["database", "stripe", "smtp", "mailbox", "server"]);
  say("Starting the database, the stand-ins for payments and mail, and the server ...");
  const server = behindAnother ? { host: "127.0.0.1", port: ports.server } : { host, port };
  const serverOrigin = `http://${behindAnother ? server.host : reachable}:${server.port}`;
  const webhookUrl = `${serverOrigin}${webhookPath}`;
  const [cluster, fakes] = await allOrFirstFailure([
    startDatabase(databaseFolder, ports.database, secrets.databasePassword),
    startFakes(supervision, { dataFolder, ports, secrets, webhookUrl }),
  ]);
  await supervision.watch("database", cluster.pid, cluster.log);
  await serve({
    supervision,
    environment: environmentFor({ ...server, origin, cluster, secrets, fakes }),
    host,
    port,
  });
  await supervision.until("server", () => isReady(serverOrigin));
  if (behindAnother) await supervision.until("client", () => isReady(`http://${reachable}:${port}`));
  announce(origin, fakes.mailboxUrl);
}

/** Claims the data folder, opens the shop, and closes it again whatever happened: the database last. */
async function keepShop({ address, signal, ...ways }) {
  if ((await Promise.race([prepareMachine(), signal])) !== undefined) return;
  const dataFolder = await dataFolderFor("shop");
  const databaseFolder = join(dataFolder, "postgres");
  const running = await claimDataFolder(dataFolder, address.origin);
  const supervision = new Supervision({ dataFolder, onStarted: running.addChild });
  const opened = openShop({ dataFolder, databaseFolder, supervision, address, ...ways });
  try {
    await Promise.race([opened, signal]);
    const end = await Promise.race([supervision.failed, signal]);
    if (end instanceof Error) throw end;
    say("\nStopping ...");
  } finally {
    await supervision.stop();
    // A start that was interrupted may still be on its way to the database.
    await Promise.race([opened.catch(() => undefined), pause(20_000)]);
    await stopCluster({
      programs: await ensurePostgres(await clusterVersion(databaseFolder)),
      folder: databaseFolder,
    });
    await running.release();
  }
}

/**
 * Runs the whole demo shop until it is told to stop. `beforeServing` is done once the packages are there, `serve`
 * starts the server and what goes with it; the server has the product's port or, `behindAnother`, one of its own.
 */
export async function runShop(ways) {
  checkNodeVersion();
  const address = productAddress();
  const signal = askedToStop();
  for (const folder of possibleDataFolders("shop")) await checkNotRunning(folder);
  await claimProductPort(address.port, address.host);
  await keepShop({ address, signal, ...ways });
}
