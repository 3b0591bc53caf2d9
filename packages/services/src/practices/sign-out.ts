import { sessions } from "@withy/db/schema";
import { and, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { recordAudit } from "../audit/record-audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";

/** Ends this browser's session. */
export const signOut = verb("account.own", z.strictObject({}), (ctx) =>
  inTransaction(ctx, async (tx) => {
    await tx.db.update(sessions).set({ revokedAt: tx.clock.now() }).where(eq(sessions.id, ctx.sessionId));
    await recordAudit(tx, { action: "session.ended", subjectKind: "session", subjectId: ctx.sessionId });
    return { ended: 1 };
  }),
);

/** Ends every session of the person who asks, this one included. */
export const signOutEverywhere = verb("account.own", z.strictObject({}), (ctx) =>
  inTransaction(ctx, async (tx) => {
    const [result] = await tx.db
      .update(sessions)
      .set({ revokedAt: tx.clock.now() })
      .where(
        and(
          eq(sessions.practiceId, ctx.practiceId),
          eq(sessions.staffMemberId, ctx.staffMemberId),
          isNull(sessions.revokedAt),
        ),
      );
    await recordAudit(tx, {
      action: "sessions.ended",
      subjectKind: "staff-member",
      subjectId: ctx.staffMemberId,
    });
    return { ended: result.affectedRows };
  }),
);
