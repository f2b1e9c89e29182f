import { pino } from "pino";
import { config } from "#server/config.ts";

/** The process's log: one JSON object a line. No secret, cookie, token or password is ever written. */
export const log = pino({
  level: config.LOG_LEVEL,
  base: { pid: process.pid },
  redact: {
    paths: [
      "password",
      "*.password",
      "token",
      "*.token",
      "req.headers.cookie",
      "req.headers.authorization",
      'res.headers["set-cookie"]',
    ],
    censor: "(hidden)",
  },
});
