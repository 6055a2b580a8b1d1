import pino, { type Logger } from "pino";

let logger: Logger | null = null;

/** The process's log: JSON lines without personal data. Made on first use. */
export function log(): Logger {
  logger ??= pino({ level: process.env.KEYPEG_LOG_LEVEL ?? "info", base: null });
  return logger;
}
