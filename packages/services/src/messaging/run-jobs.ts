import { isAppError } from "@withy/core/errors";
import { jobs } from "@withy/db/schema";
import { and, asc, eq, lt, lte } from "drizzle-orm";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { heldBy, type JobHandler, JobLost, JobPaused, type JobRow, jobRun } from "./job-run";
import { claimsLostBefore, nextTry } from "./retry-schedule";

/** Someone waits for it: better to say soon that it failed than to try for a day. */
const triesForAPerson = 3;

const fault =
  "Something went wrong on our side. What was done so far stands; start it again for the rest, and if it fails again, tell whoever runs Withy for you.";

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
  const ended = { ...free, finishedAt: now, liveKey: null };
  if (error === null) return { ...ended, state: "done", lastError: null };
  if (error instanceof JobPaused)
    return { ...free, state: "waiting", dueAt: now, attempts: row.attempts - 1 };
  const lastError = error instanceof Error ? error.name : "unknown";
  // An expected refusal stays one however often it is tried, and its sentence says what to do.
  if (isAppError(error)) return { ...ended, state: "failed", lastError, problem: error.message };
  const isGivenUp = row.requestedBy !== null && row.attempts >= triesForAPerson;
  const dueAt = isGivenUp ? null : nextTry(row.attempts, now);
  return dueAt === null
    ? { ...ended, state: "failed", lastError, problem: fault }
    : { ...free, state: "waiting", dueAt, lastError };
}

export interface JobRound {
  readonly workerId: string;
  readonly handlers: Readonly<Record<string, JobHandler>>;
  /** Raised where the worker is asked to stop. */
  readonly signal?: AbortSignal;
  /** Told of bugs, without personal data. */
  readonly onFault?: (fault: { jobId: string; kind: string; error: unknown }) => void;
}

/** Runs one due job, if there is one. @returns whether there was */
export async function runNextJob(ctx: SystemContext, round: JobRound): Promise<boolean> {
  const lost = and(eq(jobs.state, "claimed"), lt(jobs.claimedAt, claimsLostBefore(ctx.clock.now())));
  await ctx.db.update(jobs).set({ state: "waiting", claimedAt: null, claimedBy: null }).where(lost);
  const row = await claimJob(ctx, round.workerId);
  if (!row) return false;
  let failure: unknown = null;
  try {
    const handler = round.handlers[row.kind];
    if (!handler) throw new Error(`No handler for jobs of kind ${row.kind}`);
    await handler(ctx, jobRun(ctx, row, round.workerId, round.signal));
  } catch (error) {
    failure = error ?? new Error("unknown");
    const isExpected = isAppError(error) || error instanceof JobLost || error instanceof JobPaused;
    if (!isExpected) round.onFault?.({ jobId: row.id, kind: row.kind, error });
  }
  await ctx.db
    .update(jobs)
    .set(settlement(row, failure, ctx.clock.now()))
    .where(heldBy(row, round.workerId));
  return true;
}
