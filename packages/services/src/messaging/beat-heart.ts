import { workerHeartbeats } from "@withy/db/schema";
import { eq, lt } from "drizzle-orm";
import type { SystemContext } from "../context";

const forgottenAfterMs = 24 * 60 * 60_000;

/** Says that this worker lives; health looks here. Workers gone for a day are forgotten. */
export async function beatHeart(ctx: SystemContext, workerId: string, startedAt: Date): Promise<void> {
  const now = ctx.clock.now();
  await ctx.db
    .insert(workerHeartbeats)
    .values({ workerId, startedAt, beatAt: now })
    .onDuplicateKeyUpdate({ set: { beatAt: now } });
  await ctx.db
    .delete(workerHeartbeats)
    .where(lt(workerHeartbeats.beatAt, new Date(now.getTime() - forgottenAfterMs)));
}

/** Takes the worker off the list when it stops in good order. */
export async function stopHeart(ctx: SystemContext, workerId: string): Promise<void> {
  await ctx.db.delete(workerHeartbeats).where(eq(workerHeartbeats.workerId, workerId));
}
