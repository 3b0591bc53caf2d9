import {
  type ApiKeyRow,
  listApiKeysInput,
  makeApiKeyInput,
  type NewApiKeyView,
  revokeApiKeyInput,
} from "@withy/contracts/practices";
import { notFound, refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { apiKeys, practices, staffMembers } from "@withy/db/schema";
import { and, desc, eq, isNull } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import type { Context } from "../context";
import { hashSecretToken, newSecretToken } from "../secret-token";
import { inTransaction } from "../transaction";
import { verb } from "../verb";

const mostKeys = 20;

async function readKeys(ctx: Context): Promise<ApiKeyRow[]> {
  const rows = await ctx.db
    .select({ key: apiKeys, givenName: staffMembers.givenName, familyName: staffMembers.familyName })
    .from(apiKeys)
    .innerJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, apiKeys.practiceId), eq(staffMembers.id, apiKeys.createdBy)),
    )
    .where(eq(apiKeys.practiceId, ctx.practiceId))
    .orderBy(desc(apiKeys.createdAt), desc(apiKeys.id))
    .limit(100);
  return rows.map(({ key, givenName, familyName }) => ({
    id: key.id,
    name: key.name,
    createdAt: key.createdAt.toISOString(),
    createdByName: `${givenName} ${familyName}`,
    lastUsedOn: key.lastUsedAt === null ? null : dayOf(key.lastUsedAt, ctx.zone),
    revokedAt: key.revokedAt?.toISOString() ?? null,
  }));
}

/** The keys with which other programs read the diary, newest first; ended ones stay to be seen. */
export const listApiKeys = verb("practice.manage", listApiKeysInput, (ctx) => readKeys(ctx));

/** Makes a key. No idempotency key: its stored answer would keep the secret. */
export const makeApiKey = verb(
  "practice.manage",
  makeApiKeyInput,
  async (ctx, { name }): Promise<NewApiKeyView> => {
    const secret = `withy_${newSecretToken()}`;
    return inTransaction(ctx, async (tx) => {
      // The practice's row stands in for the count, which two at once must not both find one short.
      await tx.db
        .select({ id: practices.id })
        .from(practices)
        .where(eq(practices.id, tx.practiceId))
        .for("update");
      const live = and(eq(apiKeys.practiceId, tx.practiceId), isNull(apiKeys.revokedAt));
      const isFull = (await tx.db.$count(apiKeys, live)) >= mostKeys;
      refuseIf(
        isFull
          ? refusal("too-many-keys", `There are ${mostKeys} keys already. End one that is not used.`)
          : null,
      );
      const id = newId();
      await tx.db.insert(apiKeys).values({
        practiceId: tx.practiceId,
        id,
        name,
        keyHash: hashSecretToken(secret),
        createdAt: tx.clock.now(),
        createdBy: tx.staffMemberId,
      });
      await recordAudit(tx, { action: "api-key.made", subjectKind: "api-key", subjectId: id });
      return { secret, keys: await readKeys(tx) };
    });
  },
);

/** Ends a key at once. */
export const revokeApiKey = verb(
  "practice.manage",
  revokeApiKeyInput,
  (ctx, { apiKeyId }): Promise<ApiKeyRow[]> =>
    inTransaction(ctx, async (tx) => {
      const [written] = await tx.db
        .update(apiKeys)
        .set({ revokedAt: tx.clock.now() })
        .where(
          and(eq(apiKeys.practiceId, tx.practiceId), eq(apiKeys.id, apiKeyId), isNull(apiKeys.revokedAt)),
        );
      if (written.affectedRows === 0) throw notFound("key");
      await recordAudit(tx, { action: "api-key.revoked", subjectKind: "api-key", subjectId: apiKeyId });
      return readKeys(tx);
    }),
);
