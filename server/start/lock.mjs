import { createHash } from "node:crypto";
import { createServer } from "node:net";
import { pause } from "./alive.mjs";

/**
 * A lock that the kernel gives back when its holder dies, however it dies: a name in the machine's
 * abstract socket namespace, which no file represents.
 */
function tryHold(name) {
  const address = `\0blockwright-${createHash("sha256").update(name).digest("hex").slice(0, 32)}`;
  return new Promise((resolve, reject) => {
    const server = createServer((socket) => socket.destroy());
    server.once("error", (error) => (error.code === "EADDRINUSE" ? resolve(undefined) : reject(error)));
    server.listen({ path: address }, () => resolve(server));
  });
}

/** Waits until no other process works under the same name, runs the work, gives the lock back. */
export async function withLock(name, work) {
  let held = await tryHold(name);
  while (held === undefined) {
    await pause(50);
    held = await tryHold(name);
  }
  try {
    return await work();
  } finally {
    await new Promise((resolve) => held.close(resolve));
  }
}
