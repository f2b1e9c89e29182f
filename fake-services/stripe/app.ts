import express, { type Express } from "express";
import { apiRoutes } from "./api.ts";
import { controlRoutes } from "./controls.ts";
import { hostedCheckoutRoutes } from "./hosted-checkout.ts";
import type { FakeStripe } from "./service.ts";

/** The stand-in's addresses: /v1 for the shop's server, /pay for buyers, /fake for tests. */
export function createApp(fake: FakeStripe): Express {
  const app = express();
  app.disable("x-powered-by");
  app.use("/v1", apiRoutes(fake));
  app.use("/pay", hostedCheckoutRoutes(fake));
  app.use("/fake", controlRoutes(fake));
  return app;
}
