import {
  type AccountLinkView,
  openAccountLinkInput,
  setPasswordByLinkInput,
} from "@withy/contracts/practices";
import { AppError, refuseIf } from "@withy/core/errors";
import { accountTokens, practices, staffAccounts, staffMembers } from "@withy/db/schema";
import { and, eq, gt, isNull } from "drizzle-orm";
import type { z } from "zod";
import { recordAudit } from "../audit/record-audit";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { parse } from "../verb";
import { endAccountTokens, hashToken } from "./account-token";
import { checkPassword } from "./check-password";
import { endSessionsOf } from "./end-sessions";
import { hashPassword } from "./password";

type Link = z.output<typeof openAccountLinkInput>;

/** Who a link belongs to while it works; null once it was used, is too old, or never was. */
export async function openAccountLink(
  ctx: SystemContext,
  raw: z.input<typeof openAccountLinkInput>,
): Promise<AccountLinkView | null> {
  const checked = openAccountLinkInput.safeParse(raw);
  if (!checked.success) return null;
  const found = await findLink(ctx, checked.data);
  return found && { name: found.givenName, email: found.email, practiceName: found.practiceName };
}

/**
 * Sets a password by a link from an e-mail, for a forgotten one or a new account. The link works once, and every
 * session that was open ends. @throws refused "link-ended", or what is wrong with the password
 */
export async function setPasswordByLink(
  ctx: SystemContext,
  raw: z.input<typeof setPasswordByLinkInput>,
): Promise<{ email: string }> {
  const { password, ...link } = parse(setPasswordByLinkInput, raw);
  const known = await findLink(ctx, link);
  if (!known) throw linkEnded();
  refuseIf(checkPassword(password, known.email));
  const passwordHash = await hashPassword(password);
  return inTransaction(ctx, async (tx) => {
    // Looked up again under a lock: of two who use the link at once, one finds it used.
    const found = await findLink(tx, link, { lock: true });
    if (!found) throw linkEnded();
    const member = { practiceId: found.practiceId, staffMemberId: found.staffMemberId };
    await tx.db
      .update(staffAccounts)
      .set({ passwordHash, passwordChangedAt: tx.clock.now() })
      .where(
        and(
          eq(staffAccounts.practiceId, member.practiceId),
          eq(staffAccounts.staffMemberId, member.staffMemberId),
        ),
      );
    await endAccountTokens(tx, member);
    await endSessionsOf(tx, member);
    await recordAudit(
      { ...tx, ...member },
      {
        action: link.purpose === "reset" ? "account.password-reset" : "account.joined",
        subjectKind: "staff-member",
        subjectId: member.staffMemberId,
      },
    );
    return { email: found.email };
  });
}

function linkEnded(): AppError {
  return new AppError(
    "refused",
    "This link was used or is too old. Ask for a new one; nothing was changed.",
    { kind: "link-ended" },
  );
}

async function findLink(ctx: SystemContext, { token, purpose }: Link, options: { lock?: boolean } = {}) {
  const query = ctx.db
    .select({
      practiceId: staffMembers.practiceId,
      staffMemberId: staffMembers.id,
      givenName: staffMembers.givenName,
      email: staffAccounts.email,
      practiceName: practices.name,
    })
    .from(accountTokens)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, accountTokens.practiceId),
        eq(staffMembers.id, accountTokens.staffMemberId),
        eq(staffMembers.isActive, true),
      ),
    )
    .innerJoin(
      staffAccounts,
      and(
        eq(staffAccounts.practiceId, accountTokens.practiceId),
        eq(staffAccounts.staffMemberId, accountTokens.staffMemberId),
      ),
    )
    .innerJoin(practices, eq(practices.id, accountTokens.practiceId))
    .where(
      and(
        eq(accountTokens.tokenHash, hashToken(token)),
        eq(accountTokens.purpose, purpose),
        isNull(accountTokens.usedAt),
        gt(accountTokens.expiresAt, ctx.clock.now()),
      ),
    )
    .limit(1);
  const [found] = await (options.lock ? query.for("update") : query);
  return found ?? null;
}
