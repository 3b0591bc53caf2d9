import { outboxMessages } from "@withy/db/schema";
import { and, asc, eq, inArray, lt, lte, sql } from "drizzle-orm";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { claimsLostBefore } from "./retry-schedule";

export type OutboxRow = typeof outboxMessages.$inferSelect;

/** Gives back what a killed worker had claimed, so that nothing is lost. Such a message may go out twice, with one id. */
export async function releaseLostMessages(ctx: SystemContext): Promise<void> {
  await ctx.db
    .update(outboxMessages)
    .set({ state: "waiting", claimedAt: null, claimedBy: null })
    .where(
      and(
        eq(outboxMessages.state, "claimed"),
        lt(outboxMessages.claimedAt, claimsLostBefore(ctx.clock.now())),
      ),
    );
}

/**
 * Claims due messages for this worker and commits, before anything is sent: on a cluster two nodes may claim the
 * same rows, and the one that loses must learn it at commit, not after the mail has gone.
 */
export async function claimMessages(
  ctx: SystemContext,
  workerId: string,
  batch: number,
): Promise<OutboxRow[]> {
  return inTransaction(ctx, async (tx) => {
    const now = tx.clock.now();
    const rows = await tx.db
      .select()
      .from(outboxMessages)
      .where(and(eq(outboxMessages.state, "waiting"), lte(outboxMessages.dueAt, now)))
      .orderBy(asc(outboxMessages.dueAt))
      .limit(batch)
      .for("update", { skipLocked: true });
    const ids = rows.map((row) => row.id);
    if (ids.length === 0) return [];
    await tx.db
      .update(outboxMessages)
      .set({
        state: "claimed",
        claimedAt: now,
        claimedBy: workerId,
        attempts: sql`${outboxMessages.attempts} + 1`,
      })
      .where(inArray(outboxMessages.id, ids));
    return rows.map((row) => ({
      ...row,
      state: "claimed" as const,
      claimedBy: workerId,
      attempts: row.attempts + 1,
    }));
  });
}
