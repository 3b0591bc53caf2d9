import type { MessageEntry } from "@withy/contracts/patients";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { outboxMessages } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import type { Context } from "../../context";
import { olderThan, type Slice } from "./cursor";

/** Messages to the patient, at the moment they were caused. */
export async function messageEntries(
  ctx: Context,
  { patientId, before, limit }: Slice,
): Promise<MessageEntry[]> {
  const { id, template, state, createdAt } = outboxMessages;
  const rows = await ctx.db
    .select({ id, template, state, createdAt })
    .from(outboxMessages)
    .where(
      and(
        eq(outboxMessages.practiceId, ctx.practiceId),
        eq(outboxMessages.patientId, patientId),
        olderThan(createdAt, id, before),
      ),
    )
    .orderBy(desc(createdAt), desc(id))
    .limit(limit);
  return rows.map((row) => ({
    kind: "message",
    id: row.id,
    at: row.createdAt.toISOString(),
    day: dayOf(row.createdAt, ctx.zone),
    time: timeOf(row.createdAt, ctx.zone),
    template: row.template,
    state: row.state,
  }));
}
