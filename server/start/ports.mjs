import { createServer } from "node:net";
import { join } from "node:path";
import { StartFailure } from "./failure.mjs";
import { readJsonFile, writePrivateFile } from "./private-file.mjs";

function listenOnce(port, host) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", reject);
    server.listen({ port, host, exclusive: true }, () => {
      const taken = server.address().port;
      server.close(() => resolve(taken));
    });
  });
}

/** The error code that keeps a port from being taken ("EADDRINUSE", "EACCES" ...), or undefined when it is free. */
export async function portObstacle(port, host = "127.0.0.1") {
  try {
    await listenOnce(port, host);
    return undefined;
  } catch (error) {
    return error.code ?? "unknown";
  }
}

export function freePort() {
  return listenOnce(0, "127.0.0.1");
}

/** The product's port from PORT, 4700 where it is not set. */
export function productPort(text = process.env.PORT) {
  if (text === undefined || text === "") return 4700;
  const port = Number(text);
  if (/^\d+$/.test(text) && port >= 1 && port <= 65535) return port;
  throw new StartFailure(`PORT must be a whole number from 1 to 65535; it is "${text}".`);
}

/** Throws one sentence when the product cannot have its port. */
export async function claimProductPort(port, host = "127.0.0.1") {
  const obstacle = await portObstacle(port, host);
  if (obstacle === undefined) return;
  if (obstacle === "EADDRINUSE") {
    throw new StartFailure(
      `Port ${port} is in use by another program: stop it, or choose another port with PORT=${port + 1} npm start.`,
    );
  }
  if (obstacle === "EACCES") {
    throw new StartFailure(
      `This user may not listen on port ${port}: choose one above 1023 with PORT=4700 npm start.`,
    );
  }
  if (obstacle === "EADDRNOTAVAIL" || obstacle === "ENOTFOUND") {
    throw new StartFailure(
      `HOST is ${host}, which is no address of this machine: leave HOST out or correct it.`,
    );
  }
  throw new StartFailure(`Port ${port} on ${host} cannot be used (${obstacle}).`);
}

/** Ports by name: those remembered in the data folder while they are free, else new free ones, remembered. */
export async function rememberedPorts(dataFolder, names) {
  const path = join(dataFolder, "ports.json");
  const kept = (await readJsonFile(path)) ?? {};
  const ports = { ...kept };
  for (const name of names) {
    const usable = Number.isInteger(kept[name]) && (await portObstacle(kept[name])) === undefined;
    if (usable) continue;
    const taken = new Set(Object.values(ports));
    let port = await freePort();
    while (taken.has(port)) port = await freePort();
    ports[name] = port;
  }
  await writePrivateFile(path, `${JSON.stringify(ports, null, 2)}\n`);
  return ports;
}
