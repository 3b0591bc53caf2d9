import { consents } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import type { Context } from "../context";

/** Whether the latest word of the patient on this is no. Silence is not a no. */
export async function isConsentWithdrawn(
  ctx: Pick<Context, "db" | "practiceId">,
  patientId: string,
  kind: (typeof consents.$inferSelect)["kind"],
): Promise<boolean> {
  const [last] = await ctx.db
    .select({ withdrawnAt: consents.withdrawnAt })
    .from(consents)
    .where(
      and(
        eq(consents.practiceId, ctx.practiceId),
        eq(consents.patientId, patientId),
        eq(consents.kind, kind),
      ),
    )
    .orderBy(desc(consents.givenAt), desc(consents.id))
    .limit(1);
  return last !== undefined && last.withdrawnAt !== null;
}
