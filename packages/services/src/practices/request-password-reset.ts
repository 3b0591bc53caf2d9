import { createHash } from "node:crypto";
import { requestPasswordResetInput } from "@withy/contracts/practices";
import { staffAccounts, staffMembers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import type { SystemContext } from "../context";
import { enqueueMessage } from "../messaging/enqueue-message";
import { inTransaction } from "../transaction";
import { parse } from "../verb";
import { issueAccountToken } from "./account-token";
import type { ResetLimits } from "./reset-limits";

/**
 * Sends a link for a new password where the address signs in to an active account. It answers the same either way,
 * so nobody learns which addresses do. @throws refused "too-many-tries"
 */
export async function requestPasswordReset(
  ctx: SystemContext,
  limits: ResetLimits,
  raw: { email: string; address: string },
): Promise<void> {
  const { email } = parse(requestPasswordResetInput, { email: raw.email });
  await limits.count(digest(email), digest(raw.address));
  await inTransaction(ctx, async (tx) => {
    const member = await findMember(tx, email);
    if (!member) return;
    const { id, token, validFor } = await issueAccountToken(tx, member, "reset");
    const scope = { ...tx, practiceId: member.practiceId };
    await enqueueMessage(scope, {
      template: "password-reset",
      toAddress: email,
      payload: { greetingName: member.givenName, path: `/reset/${token}`, validFor, invitedBy: null },
      aboutKind: "staff-member",
      aboutId: member.staffMemberId,
      dedupeKey: `password-reset:${id}`,
    });
    await recordAudit(
      { ...scope, staffMemberId: null },
      { action: "account.reset-asked", subjectKind: "staff-member", subjectId: member.staffMemberId },
    );
  });
}

async function findMember(tx: SystemContext, email: string) {
  const [found] = await tx.db
    .select({
      practiceId: staffMembers.practiceId,
      staffMemberId: staffMembers.id,
      givenName: staffMembers.givenName,
    })
    .from(staffAccounts)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, staffAccounts.practiceId),
        eq(staffMembers.id, staffAccounts.staffMemberId),
        eq(staffMembers.isActive, true),
      ),
    )
    .where(eq(staffAccounts.email, email))
    .limit(1);
  return found ?? null;
}

function digest(text: string): string {
  return createHash("sha256").update(text).digest("hex").slice(0, 40);
}
