import { AppError } from "@withy/core/errors";
import { dayBounds, dayOf } from "@withy/core/zoned-time";
import { apiKeys, practices } from "@withy/db/schema";
import { and, eq, isNull, lt, or } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context, SystemContext } from "../../context";
import { hashSecretToken } from "../../secret-token";
import { spendTry, type TryLimit } from "../../spend-try";
import { inTransaction } from "../../transaction";

/** What a program with a key has: a practice to read, and no person. */
export type KeyContext = Pick<Context, "practiceId" | "zone" | "clock" | "db" | "requestId">;

const reads: TryLimit = { name: "api-key", tries: 600, minutes: 5, advice: "ask again" };

const noKey = () =>
  new AppError(
    "unauthenticated",
    "Send a key that is not ended as a bearer token. The owner of the practice makes keys under Settings.",
  );

/** Writes the first use of each day into the audit. */
async function noteUse(ctx: KeyContext, key: typeof apiKeys.$inferSelect): Promise<void> {
  const now = ctx.clock.now();
  const today = dayBounds(dayOf(now, ctx.zone), ctx.zone).from;
  if (key.lastUsedAt !== null && key.lastUsedAt >= today) return;
  await inTransaction(ctx, async (tx) => {
    const [written] = await tx.db
      .update(apiKeys)
      .set({ lastUsedAt: now })
      .where(
        and(
          eq(apiKeys.practiceId, key.practiceId),
          eq(apiKeys.id, key.id),
          or(isNull(apiKeys.lastUsedAt), lt(apiKeys.lastUsedAt, today)),
        ),
      );
    if (written.affectedRows === 0) return;
    await recordAudit(tx, { action: "api-key.used", subjectKind: "api-key", subjectId: key.id });
  });
}

/**
 * The practice behind an Authorization header.
 * @throws unauthenticated in the same words for no key, a wrong one and an ended one; refused "too-many-tries"
 */
export async function openByKey(ctx: SystemContext, authorization: string | null): Promise<KeyContext> {
  const secret = /^Bearer (withy_[A-Za-z0-9_-]{43})$/i.exec(authorization ?? "")?.[1];
  if (secret === undefined) throw noKey();
  const [found] = await ctx.db
    .select({ key: apiKeys, zone: practices.zone })
    .from(apiKeys)
    .innerJoin(practices, eq(practices.id, apiKeys.practiceId))
    .where(and(eq(apiKeys.keyHash, hashSecretToken(secret)), isNull(apiKeys.revokedAt)))
    .limit(1);
  if (!found) throw noKey();
  await spendTry(ctx, reads, found.key.id);
  const own = { ...ctx, practiceId: found.key.practiceId, zone: found.zone };
  await noteUse(own, found.key);
  return own;
}
