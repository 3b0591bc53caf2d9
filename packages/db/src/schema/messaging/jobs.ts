import { index, int, json, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";

/** Long work with progress, done by the worker: any kind, told apart by its name. */
export const jobs = mysqlTable(
  "jobs",
  {
    id: uuid("id").primaryKey(),
    practiceId: uuid("practice_id").notNull(),
    /** "billing.draft-visits": area and work. */
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
    /** What has come of it so far, in the kind's own shape; written with the work itself, so a repeat goes on from here. */
    result: json("result").$type<Record<string, unknown>>(),
    /** The last failure's name, for whoever runs the machine. */
    lastError: varchar("last_error", { length: 200 }),
    /** Why it failed and what to do, as a sentence for the person who waits for it. */
    problem: varchar("problem", { length: 300 }),
    /** Who started it and in whose name it acts; null where nobody did. */
    requestedBy: uuid("requested_by"),
    /** What there may be one unfinished job of; null once it has ended. */
    liveKey: varchar("live_key", { length: 160 }),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    index("jobs_due").on(t.state, t.dueAt),
    index("jobs_by_practice").on(t.practiceId, t.createdAt),
    uniqueIndex("jobs_live_once").on(t.practiceId, t.liveKey),
  ],
);

/** Each worker says that it lives; health looks here. */
export const workerHeartbeats = mysqlTable("worker_heartbeats", {
  workerId: varchar("worker_id", { length: 40 }).primaryKey(),
  startedAt: instant("started_at").notNull(),
  beatAt: instant("beat_at").notNull(),
});
