import { jobs } from "@withy/db/schema";
import { and, asc, eq, lt, lte } from "drizzle-orm";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { claimsLostBefore, nextTry } from "./retry-schedule";

export type JobRow = typeof jobs.$inferSelect;

export interface JobRun {
  readonly row: JobRow;
  /** Tells how far the work is; also keeps the claim alive. */
  progress(done: number, total: number): Promise<void>;
}

/** Does one kind of job. It may run twice for one row, so a repeat must do no harm. */
export type JobHandler = (ctx: SystemContext, run: JobRun) => Promise<void>;

async function claimJob(ctx: SystemContext, workerId: string): Promise<JobRow | null> {
  return inTransaction(ctx, async (tx) => {
    const now = tx.clock.now();
    const [row] = await tx.db
      .select()
      .from(jobs)
      .where(and(eq(jobs.state, "waiting"), lte(jobs.dueAt, now)))
      .orderBy(asc(jobs.dueAt))
      .limit(1)
      .for("update", { skipLocked: true });
    if (!row) return null;
    const claim = {
      state: "claimed" as const,
      claimedAt: now,
      claimedBy: workerId,
      attempts: row.attempts + 1,
    };
    await tx.db.update(jobs).set(claim).where(eq(jobs.id, row.id));
    return { ...row, ...claim };
  });
}

function settlement(row: JobRow, error: unknown, now: Date): Partial<JobRow> {
  const free = { claimedAt: null, claimedBy: null };
  if (error === null) return { ...free, state: "done", finishedAt: now, lastError: null };
  const lastError = error instanceof Error ? error.name : "unknown";
  const dueAt = nextTry(row.attempts, now);
  return dueAt === null
    ? { ...free, state: "failed", finishedAt: now, lastError }
    : { ...free, state: "waiting", dueAt, lastError };
}

/** Runs one due job, if there is one. @returns whether there was */
export async function runNextJob(
  ctx: SystemContext,
  options: {
    readonly workerId: string;
    readonly handlers: Readonly<Record<string, JobHandler>>;
    readonly onFault?: (fault: { jobId: string; kind: string; error: unknown }) => void;
  },
): Promise<boolean> {
  const lost = and(eq(jobs.state, "claimed"), lt(jobs.claimedAt, claimsLostBefore(ctx.clock.now())));
  await ctx.db.update(jobs).set({ state: "waiting", claimedAt: null, claimedBy: null }).where(lost);
  const row = await claimJob(ctx, options.workerId);
  if (!row) return false;
  const mine = and(eq(jobs.id, row.id), eq(jobs.state, "claimed"), eq(jobs.claimedBy, options.workerId));
  const progress = async (done: number, total: number) => {
    await ctx.db
      .update(jobs)
      .set({ progressDone: done, progressTotal: total, claimedAt: ctx.clock.now() })
      .where(mine);
  };
  let failure: unknown = null;
  try {
    const handler = options.handlers[row.kind];
    if (!handler) throw new Error(`No handler for jobs of kind ${row.kind}`);
    await handler(ctx, { row, progress });
  } catch (error) {
    failure = error ?? new Error("unknown");
    options.onFault?.({ jobId: row.id, kind: row.kind, error });
  }
  await ctx.db
    .update(jobs)
    .set(settlement(row, failure, ctx.clock.now()))
    .where(mine);
  return true;
}
