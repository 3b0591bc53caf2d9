import { endSessionInput } from "@withy/contracts/practices";
import { notFound } from "@withy/core/errors";
import { sessions } from "@withy/db/schema";
import { and, eq, isNull } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";

/** Ends one of one's own sessions, for example that of a tablet left behind. */
export const endSession = verb("account.own", endSessionInput, (ctx, { sessionId }) =>
  inTransaction(ctx, async (tx) => {
    const [result] = await tx.db
      .update(sessions)
      .set({ revokedAt: tx.clock.now() })
      .where(
        and(
          eq(sessions.id, sessionId),
          eq(sessions.practiceId, tx.practiceId),
          eq(sessions.staffMemberId, tx.staffMemberId),
          isNull(sessions.revokedAt),
        ),
      );
    if (result.affectedRows === 0) throw notFound("session");
    await recordAudit(tx, { action: "session.ended", subjectKind: "session", subjectId: sessionId });
    return { sessionId };
  }),
);
