import { jobs } from "@withy/db/schema";
import { and, eq, type SQL } from "drizzle-orm";
import type { SystemContext } from "../context";

export type JobRow = typeof jobs.$inferSelect;

/** Thrown where the job is another worker's by now; what is under way is rolled back and nothing is settled. */
export class JobLost extends Error {
  override readonly name = "JobLost";
}

/** Thrown where this worker is asked to stop: the job goes back to the queue at once, and the try does not count. */
export class JobPaused extends Error {
  override readonly name = "JobPaused";
}

export interface ProgressNote {
  /** What has come of the work so far; left out, what was noted before stays. */
  readonly result?: Record<string, unknown>;
  /** The transaction that did the work: progress and result then stand exactly where the work does. */
  readonly within?: SystemContext;
}

export interface JobRun {
  readonly row: JobRow;
  /** Tells how far the work is; also keeps the claim alive. @throws JobLost where the claim is gone */
  progress(done: number, total: number, note?: ProgressNote): Promise<void>;
  /** To be called between two parts of the work. @throws JobPaused where the worker is asked to stop */
  pauseIfAsked(): void;
}

/** Does one kind of job. It may run twice for one row, so a repeat must do no harm. */
export type JobHandler = (ctx: SystemContext, run: JobRun) => Promise<void>;

/** The row as long as this worker holds it. */
export const heldBy = (row: JobRow, workerId: string): SQL | undefined =>
  and(eq(jobs.id, row.id), eq(jobs.state, "claimed"), eq(jobs.claimedBy, workerId));

export function jobRun(ctx: SystemContext, row: JobRow, workerId: string, signal?: AbortSignal): JobRun {
  return {
    row,
    async progress(done, total, { result, within = ctx } = {}) {
      const [written] = await within.db
        .update(jobs)
        .set({
          progressDone: done,
          progressTotal: total,
          claimedAt: ctx.clock.now(),
          ...(result === undefined ? {} : { result }),
        })
        .where(heldBy(row, workerId));
      if (written.affectedRows === 0) throw new JobLost();
    },
    pauseIfAsked() {
      if (signal?.aborted) throw new JobPaused();
    },
  };
}
