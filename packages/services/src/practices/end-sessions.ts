import { sessions } from "@withy/db/schema";
import { and, eq, isNull, ne } from "drizzle-orm";
import type { SystemContext } from "../context";

/** Ends the open sessions of a person, but for one where it is named. Returns how many. */
export async function endSessionsOf(
  tx: SystemContext,
  { practiceId, staffMemberId }: { practiceId: string; staffMemberId: string },
  exceptId?: string,
): Promise<number> {
  const [result] = await tx.db
    .update(sessions)
    .set({ revokedAt: tx.clock.now() })
    .where(
      and(
        eq(sessions.practiceId, practiceId),
        eq(sessions.staffMemberId, staffMemberId),
        isNull(sessions.revokedAt),
        exceptId === undefined ? undefined : ne(sessions.id, exceptId),
      ),
    );
  return result.affectedRows;
}
