import { createHash, randomBytes } from "node:crypto";
import type { AccountLinkPurpose } from "@withy/contracts/practices";
import { newId } from "@withy/core/ids";
import { accountTokens } from "@withy/db/schema";
import { and, eq, isNull } from "drizzle-orm";
import type { SystemContext } from "../context";

const lifetimes: Record<AccountLinkPurpose, { minutes: number; words: string }> = {
  reset: { minutes: 60, words: "one hour" },
  invitation: { minutes: 7 * 24 * 60, words: "seven days" },
};

interface Member {
  practiceId: string;
  staffMemberId: string;
}

/** Makes a link of 256 random bits, of which only the hash is kept; earlier links of the kind stop working. */
export async function issueAccountToken(tx: SystemContext, member: Member, purpose: AccountLinkPurpose) {
  const token = randomBytes(32).toString("base64url");
  const now = tx.clock.now();
  await endAccountTokens(tx, member, purpose);
  const id = newId();
  await tx.db.insert(accountTokens).values({
    id,
    ...member,
    purpose,
    tokenHash: hashToken(token),
    createdAt: now,
    expiresAt: new Date(now.getTime() + lifetimes[purpose].minutes * 60_000),
  });
  return { id, token, validFor: lifetimes[purpose].words };
}

/** Uses up every open link of the person, of one purpose or of both. */
export async function endAccountTokens(
  tx: SystemContext,
  { practiceId, staffMemberId }: Member,
  purpose?: AccountLinkPurpose,
): Promise<void> {
  await tx.db
    .update(accountTokens)
    .set({ usedAt: tx.clock.now() })
    .where(
      and(
        eq(accountTokens.practiceId, practiceId),
        eq(accountTokens.staffMemberId, staffMemberId),
        isNull(accountTokens.usedAt),
        purpose === undefined ? undefined : eq(accountTokens.purpose, purpose),
      ),
    );
}

export function hashToken(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}
