import { runCommand } from "./failure.mjs";
import { runShop } from "./shop.mjs";

/** The demo shop for its developers: client and server start anew, or renew themselves, when a file changes. */
await runCommand(() =>
  runShop({
    async beforeServing() {},
    behindAnother: true,
    async serve({ supervision, environment, host, port }) {
      const watch = ["node_modules/tsx/dist/cli.mjs", "watch", "--clear-screen=false", "server/main.ts"];
      await supervision.start("server", watch, { ...environment, SERVE_WEB: "none" });
      const vite = ["node_modules/vite/bin/vite.js", "--host", host, "--port", String(port), "--strictPort"];
      await supervision.start("client", vite, {
        ...process.env,
        NODE_ENV: "development",
        SERVER_ORIGIN: `http://127.0.0.1:${environment.PORT}`,
      });
    },
  }),
);
