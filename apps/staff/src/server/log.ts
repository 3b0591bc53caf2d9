import "server-only";
import pino from "pino";

/** Logs carry codes, ids and times; never names, addresses or text that a person typed. */
export const log = pino({ level: process.env.WITHY_LOG_LEVEL ?? "info", base: null });
