import { bigint, int, mysqlTable, varchar } from "drizzle-orm/mysql-core";

/** Counters of tries per account and per address, in the shape that rate-limiter-flexible expects. */
export const requestLimits = mysqlTable("request_limits", {
  key: varchar("key", { length: 255 }).primaryKey(),
  points: int("points").notNull().default(0),
  expire: bigint("expire", { mode: "number" }),
});
