import { runCommand } from "./failure.mjs";
import { runShop } from "./shop.mjs";
import { ensureWebBuild } from "./web-build.mjs";

/** The demo shop as a visitor would meet it: the built client, served by the server. */
await runCommand(() =>
  runShop({
    beforeServing: ensureWebBuild,
    async serve({ supervision, environment }) {
      await supervision.start("server", ["--import", "tsx", "server/main.ts"], {
        ...environment,
        SERVE_WEB: "dist",
      });
    },
  }),
);
