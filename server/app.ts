import express, { type Express } from "express";
import { config } from "#server/config.ts";
import { csrf } from "#server/middleware/csrf.ts";
import { oneOrigin } from "#server/middleware/one-origin.ts";
import { person } from "#server/middleware/person.ts";
import { noSuchRoute, problemDetails } from "#server/middleware/problems.ts";
import { requestLog } from "#server/middleware/request-log.ts";
import { securityHeaders, tokenPageHeaders } from "#server/middleware/security-headers.ts";
import { sessions } from "#server/middleware/session.ts";
import { clientRouter } from "#server/routes/client.ts";
import { healthRouter } from "#server/routes/health.ts";
import { routes } from "#server/routes/index.ts";
import { openApiRouter } from "#server/routes/openapi.ts";
import { routerOf } from "#server/routes/register.ts";
import { stripeWebhookRouter } from "#server/routes/stripe-webhook.ts";

/** Addresses that look at the browser's session; all else is the same for everybody. */
const withSession = ["/api", "/order-link"];

/** The whole HTTP application, without a port. `workersRun` tells /readyz whether jobs are done in this process. */
export function createApp(workersRun: () => boolean = () => false): Express {
  const app = express();
  app.disable("x-powered-by");
  app.set("trust proxy", config.TRUST_PROXY);
  app.set("query parser", "simple");

  app.use(requestLog, securityHeaders);
  app.use(healthRouter(workersRun));
  app.use(oneOrigin, tokenPageHeaders);
  // Its signature is over the raw body: before anything reads that, and without session.
  app.use(stripeWebhookRouter);
  app.use(openApiRouter(routes));

  app.use(withSession, sessions(), person, csrf, express.json({ limit: "100kb", strict: true }));
  app.use(routerOf(routes));
  app.use("/api", noSuchRoute);

  if (config.SERVE_WEB !== "none") app.use(clientRouter(config.SERVE_WEB));
  app.use(noSuchRoute);
  app.use(problemDetails);
  return app;
}
