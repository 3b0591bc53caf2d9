import { index, int, json, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";

/** Long work with progress, done by the worker. */
export const jobs = mysqlTable(
  "jobs",
  {
    id: uuid("id").primaryKey(),
    practiceId: uuid("practice_id").notNull(),
    kind: varchar("kind", { length: 40 }).notNull(),
    input: json("input").$type<Record<string, unknown>>().notNull(),
    state: varchar("state", { length: 8 })
      .$type<"waiting" | "claimed" | "done" | "failed">()
      .notNull()
      .default("waiting"),
    progressDone: int("progress_done").notNull().default(0),
    progressTotal: int("progress_total").notNull().default(0),
    dueAt: instant("due_at").notNull(),
    attempts: int("attempts").notNull().default(0),
    claimedAt: instant("claimed_at"),
    claimedBy: varchar("claimed_by", { length: 40 }),
    finishedAt: instant("finished_at"),
    lastError: varchar("last_error", { length: 200 }),
    requestedBy: uuid("requested_by"),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [index("jobs_due").on(t.state, t.dueAt), index("jobs_by_practice").on(t.practiceId, t.createdAt)],
);

/** Each worker says that it lives; health looks here. */
export const workerHeartbeats = mysqlTable("worker_heartbeats", {
  workerId: varchar("worker_id", { length: 40 }).primaryKey(),
  startedAt: instant("started_at").notNull(),
  beatAt: instant("beat_at").notNull(),
});
