import { addWaitingEntryInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { patients, waitingEntries } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { auditEntry, checkedFields } from "./waiting-entry";

/** One line a patient and service: a second one would be offered the same time twice. */
async function refuseSecond(ctx: Context, patientId: string, serviceId: string): Promise<void> {
  const [known] = await ctx.db
    .select({ id: waitingEntries.id })
    .from(waitingEntries)
    .where(
      and(
        eq(waitingEntries.practiceId, ctx.practiceId),
        eq(waitingEntries.patientId, patientId),
        eq(waitingEntries.serviceId, serviceId),
        eq(waitingEntries.state, "waiting"),
      ),
    )
    .limit(1);
  if (!known) return;
  const message = "This patient is on the list for that already. Edit the line that is there.";
  throw refused(refusal("waits-already", message, "serviceId"), { entryId: known.id });
}

/** Puts someone on the waiting list. */
export const addWaitingEntry = verb(
  "diary.book",
  addWaitingEntryInput,
  async (ctx, { patientId, ...input }): Promise<{ entryId: string }> =>
    once(ctx, "waiting-entry.add", async (tx) => {
      // The patient's row is held, so that two desks cannot both find no line yet.
      await loadRecord(tx, patients, patientId, "patient", { lock: true });
      const fields = await checkedFields(tx, patientId, input);
      await refuseSecond(tx, patientId, fields.serviceId);
      const now = tx.clock.now();
      const row = { practiceId: tx.practiceId, id: newId(), patientId, ...fields };
      const { staffMemberId: createdBy } = tx;
      await tx.db.insert(waitingEntries).values({ ...row, waitingSince: now, createdBy, updatedAt: now });
      await auditEntry(tx, row, "added", { urgency: fields.urgency });
      return { entryId: row.id };
    }),
);
