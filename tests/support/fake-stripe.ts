import { z } from "zod";
import { startChild, type RunningChild } from "./child-process.ts";
import { freePort } from "./free-port.ts";

export interface FakeStripe extends RunningChild {
  origin: string;
  secretKey: string;
  webhookSecret: string;
  /** The settings that point a server at this fake. */
  serverEnvironment: Record<string, string>;
}

export interface FakeStripeOptions {
  /** Where it sends its events; none are sent without. */
  webhookUrl?: string;
  /** Keeps its state over restarts. */
  stateFile?: string;
  port?: number;
}

const readyLine = z.object({ ready: z.literal(true), port: z.number() });

/** The first line that a fake writes, once it is whole. */
export function parseReadyLine<Line>(schema: z.ZodType<Line>, output: string): Line | undefined {
  const end = output.indexOf("\n");
  return end < 0 ? undefined : schema.parse(JSON.parse(output.slice(0, end)));
}

/** Starts the payment fake; in server tests it listens where the file's own environment points. */
export async function startFakeStripe(options: FakeStripeOptions = {}): Promise<FakeStripe> {
  const named = process.env["STRIPE_API_ORIGIN"];
  const port = options.port ?? (named === undefined ? await freePort() : Number(new URL(named).port));
  const secretKey = process.env["STRIPE_SECRET_KEY"] ?? "sk_test_known_to_the_tests_only";
  const webhookSecret = process.env["STRIPE_WEBHOOK_SECRET"] ?? "whsec_known_to_the_tests_only";
  const child = await startChild({
    name: "payment fake",
    file: "fake-services/stripe/main.ts",
    env: {
      FAKE_STRIPE_PORT: String(port),
      FAKE_STRIPE_SECRET_KEY: secretKey,
      FAKE_STRIPE_WEBHOOK_SECRET: webhookSecret,
      ...(options.webhookUrl === undefined ? {} : { FAKE_STRIPE_WEBHOOK_URL: options.webhookUrl }),
      ...(options.stateFile === undefined ? {} : { FAKE_STRIPE_STATE_FILE: options.stateFile }),
    },
    isReady: (output) => parseReadyLine(readyLine, output) !== undefined,
  });
  const origin = `http://127.0.0.1:${String(port)}`;
  return {
    ...child,
    origin,
    secretKey,
    webhookSecret,
    serverEnvironment: {
      STRIPE_SECRET_KEY: secretKey,
      STRIPE_WEBHOOK_SECRET: webhookSecret,
      STRIPE_API_ORIGIN: origin,
    },
  };
}
