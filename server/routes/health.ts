import { Router } from "express";
import { readiness } from "#server/services/readiness.ts";

/** For whoever watches the process: /healthz says that it lives, /readyz that it can serve. */
export function healthRouter(workersRun: () => boolean): Router {
  const router = Router();
  router.get("/healthz", (_request, response) => {
    response.setHeader("Cache-Control", "no-store").json({ alive: true });
  });
  router.get("/readyz", async (_request, response) => {
    const state = await readiness(workersRun);
    response
      .status(state.ready ? 200 : 503)
      .setHeader("Cache-Control", "no-store")
      .json(state);
  });
  return router;
}
