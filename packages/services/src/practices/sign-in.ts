import { createHash } from "node:crypto";
import { AppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { sessions, staffAccounts, staffMembers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { matchesPassword } from "./password";
import { absoluteHours } from "./session-limits";
import type { SignInLimits } from "./sign-in-limits";

export interface SignInInput {
  email: string;
  password: string;
  /** Network address of the browser; only its hash is kept, as a limiter's key. */
  address: string;
  userAgent: string;
}

export interface SignedIn {
  sessionId: string;
  staffMemberId: string;
  name: string;
}

/** Opens a session for a right address and password. @throws refused "wrong-sign-in" or "too-many-tries" */
export async function signIn(
  ctx: SystemContext,
  limits: SignInLimits,
  input: SignInInput,
): Promise<SignedIn> {
  const email = input.email.trim().toLowerCase();
  await limits.count(digest(email), digest(input.address));
  const [found] = await ctx.db
    .select({ account: staffAccounts, member: staffMembers })
    .from(staffAccounts)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, staffAccounts.practiceId),
        eq(staffMembers.id, staffAccounts.staffMemberId),
      ),
    )
    .where(eq(staffAccounts.email, email))
    .limit(1);
  const isRight = await matchesPassword(found?.account.passwordHash ?? null, input.password);
  if (!found || !isRight || !found.member.isActive) {
    if (found) await noteFailure(ctx, found.member.practiceId, found.member.id);
    throw new AppError(
      "refused",
      "That e-mail address and password do not match. Check both and try again.",
      { kind: "wrong-sign-in" },
    );
  }
  await limits.forget(digest(email));
  return openSession(ctx, found.member, input.userAgent);
}

async function openSession(
  ctx: SystemContext,
  member: typeof staffMembers.$inferSelect,
  userAgent: string,
): Promise<SignedIn> {
  return inTransaction(ctx, async (tx) => {
    const now = tx.clock.now();
    const sessionId = newId();
    await tx.db.insert(sessions).values({
      id: sessionId,
      practiceId: member.practiceId,
      staffMemberId: member.id,
      createdAt: now,
      lastSeenAt: now,
      expiresAt: new Date(now.getTime() + absoluteHours * 3_600_000),
      userAgent: userAgent.slice(0, 200),
      deskSiteId: member.homeSiteId,
    });
    await recordAudit(
      { ...tx, practiceId: member.practiceId, staffMemberId: member.id },
      { action: "session.opened", subjectKind: "session", subjectId: sessionId },
    );
    return { sessionId, staffMemberId: member.id, name: `${member.givenName} ${member.familyName}` };
  });
}

async function noteFailure(ctx: SystemContext, practiceId: string, staffMemberId: string): Promise<void> {
  await recordAudit(
    { ...ctx, practiceId, staffMemberId: null },
    { action: "session.refused", subjectKind: "staff-member", subjectId: staffMemberId },
  );
}

function digest(text: string): string {
  return createHash("sha256").update(text).digest("hex").slice(0, 40);
}
