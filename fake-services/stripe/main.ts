import { createApp } from "./app.ts";
import { FakeStripe } from "./service.ts";
import { readSettings } from "./settings.ts";

const settings = readSettings(process.env);
const fake = new FakeStripe(settings);
const server = createApp(fake).listen(settings.port, "127.0.0.1");

server.on("error", (error) => {
  process.stderr.write(`The payment stand-in cannot listen: ${error.message}\n`);
  process.exit(1);
});

server.on("listening", () => {
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("not listening on a port");
  const { port } = address;
  fake.origin = `http://127.0.0.1:${port}`;
  process.stdout.write(`${JSON.stringify({ ready: true, port })}\n`);
});

function stop(): void {
  fake.stop();
  server.close(() => process.exit(0));
  server.closeAllConnections();
}

process.once("SIGINT", stop);
process.once("SIGTERM", stop);
process.once("SIGHUP", stop);
