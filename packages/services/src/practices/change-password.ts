import { changePasswordInput } from "@withy/contracts/practices";
import { notFound, refused, refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { staffAccounts } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import { forgetTries, spendTry, type TryLimit } from "../spend-try";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { checkPassword } from "./check-password";
import { endSessionsOf } from "./end-sessions";
import { hashPassword, matchesPassword } from "./password";

/** As many as at the sign-in: a browser that was left open must not become a place to guess at. */
const tries: TryLimit = { name: "own-password", tries: 10, minutes: 15, advice: "type it again" };

/** A new password for oneself. Every other session of the person ends. */
export const changePassword = verb(
  "account.own",
  changePasswordInput,
  async (ctx, { currentPassword, password }) => {
    const mine = and(
      eq(staffAccounts.practiceId, ctx.practiceId),
      eq(staffAccounts.staffMemberId, ctx.staffMemberId),
    );
    const [account] = await ctx.db.select().from(staffAccounts).where(mine).limit(1);
    if (!account) throw notFound("account");
    await spendTry(ctx, tries, ctx.staffMemberId);
    if (!(await matchesPassword(account.passwordHash, currentPassword)))
      throw refused(
        refusal(
          "wrong-password",
          "This is not the password you sign in with. Type it again.",
          "currentPassword",
        ),
      );
    await forgetTries(ctx, tries, ctx.staffMemberId);
    refuseIf(checkPassword(password, account.email));
    const passwordHash = await hashPassword(password);
    return inTransaction(ctx, async (tx) => {
      await tx.db.update(staffAccounts).set({ passwordHash, passwordChangedAt: tx.clock.now() }).where(mine);
      const endedSessions = await endSessionsOf(tx, ctx, ctx.sessionId);
      await recordAudit(tx, {
        action: "account.password-changed",
        subjectKind: "staff-member",
        subjectId: ctx.staffMemberId,
      });
      return { endedSessions };
    });
  },
);
