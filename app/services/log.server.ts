import { pino } from "pino";
import { logLevel } from "./env.server.ts";

/**
 * What the server tells its operator, one JSON object a line. Nothing that signs somebody in may reach it: these
 * fields are cut wherever a caller passes them by mistake.
 */
export const log = pino({
  level: logLevel(),
  base: null,
  timestamp: pino.stdTimeFunctions.isoTime,
  redact: {
    paths: ["password", "*.password", "token", "*.token", "cookie", "*.cookie", "headers", "*.headers"],
    censor: "[cut]",
  },
});
