import { notFound } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { isDuplicate } from "@withy/db/database-error";
import { jobs } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import type { JobRow } from "./job-run";

export interface NewJob {
  /** A key of `jobHandlers`. */
  readonly kind: string;
  /** Plain JSON that the handler parses again. */
  readonly input: Record<string, unknown>;
  /** What there may be one unfinished job of, within the practice; the kind is put before it. */
  readonly liveKey: string;
}

export interface StartedJob {
  readonly row: JobRow;
  /** False where the same work already waits or runs: then the row is that one. */
  readonly isNew: boolean;
}

/** Files long work with the caller's transaction, in the person's name, unless the same work is under way. */
export async function startJob(tx: Context, { kind, input, liveKey }: NewJob): Promise<StartedJob> {
  const now = tx.clock.now();
  const id = newId();
  const key = liveKeyOf(kind, liveKey);
  for (let tries = 1; ; tries += 1) {
    try {
      await tx.db.insert(jobs).values({
        id,
        practiceId: tx.practiceId,
        kind,
        input,
        dueAt: now,
        requestedBy: tx.staffMemberId,
        liveKey: key,
        createdAt: now,
      });
      return { row: await loadJob(tx, kind, id), isNew: true };
    } catch (error) {
      if (!isDuplicate(error, "jobs_live_once") || tries === 3) throw error;
      // The other one may end between the two statements; then there is room for this one.
      const live = await findLiveJob(tx, kind, liveKey);
      if (live) return { row: live, isNew: false };
    }
  }
}

/** A job of this kind inside the practice, or not found. */
export async function loadJob(ctx: Context, kind: string, jobId: string): Promise<JobRow> {
  const [row] = await ctx.db
    .select()
    .from(jobs)
    .where(and(eq(jobs.id, jobId), eq(jobs.practiceId, ctx.practiceId), eq(jobs.kind, kind)))
    .limit(1);
  if (!row) throw notFound("job");
  return row;
}

/** The unfinished job with this key, if there is one. */
export async function findLiveJob(ctx: Context, kind: string, liveKey: string): Promise<JobRow | null> {
  const [row] = await ctx.db
    .select()
    .from(jobs)
    .where(and(eq(jobs.practiceId, ctx.practiceId), eq(jobs.liveKey, liveKeyOf(kind, liveKey))))
    .limit(1);
  return row ?? null;
}

const liveKeyOf = (kind: string, liveKey: string): string => `${kind} ${liveKey}`;
