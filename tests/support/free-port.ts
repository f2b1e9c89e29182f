import { createServer } from "node:net";

/** A port on 127.0.0.1 that nobody listens on at this moment. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once("error", reject);
    server.listen(0, "127.0.0.1", () => {
      const address = server.address();
      server.close(() => {
        if (address === null || typeof address === "string") reject(new Error("No port was given"));
        else resolve(address.port);
      });
    });
  });
}
