import { AppError } from "@withy/core/errors";
import { idempotencyKeys } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "./context";
import { inTransaction } from "./transaction";

/**
 * Runs a write in one transaction at most once for the browser's idempotency key: a repeat gets the first answer
 * again. The work runs before the key is looked for, so that a first request, which nearly all are, does not pay
 * for it; a repeat is rolled back. Without a key it simply runs. The answer must be plain JSON.
 */
export async function once<T>(ctx: Context, name: string, work: (ctx: Context) => Promise<T>): Promise<T> {
  const key = ctx.idempotencyKey;
  if (key === null) return inTransaction(ctx, work);
  try {
    return await inTransaction(ctx, async (tx) => {
      const answer = await work(tx);
      await tx.db.insert(idempotencyKeys).values({
        practiceId: ctx.practiceId,
        key,
        verb: name,
        staffMemberId: ctx.staffMemberId,
        answer,
        createdAt: ctx.clock.now(),
      });
      return answer;
    });
  } catch (error) {
    // A repeat fails on the key at the latest, often sooner on what the first one did: both mean its answer.
    const first = await findAnswer<T>(ctx, key, name);
    if (!first) throw error;
    return first.answer;
  }
}

async function findAnswer<T>(ctx: Context, key: string, name: string): Promise<{ answer: T } | null> {
  const [row] = await ctx.db
    .select()
    .from(idempotencyKeys)
    .where(and(eq(idempotencyKeys.practiceId, ctx.practiceId), eq(idempotencyKeys.key, key)))
    .limit(1);
  if (!row) return null;
  if (row.verb !== name || row.staffMemberId !== ctx.staffMemberId) {
    throw new AppError(
      "refused",
      "This request's key was used for something else. Reload the page and try again.",
      { kind: "key-reused" },
    );
  }
  return { answer: row.answer as T };
}
