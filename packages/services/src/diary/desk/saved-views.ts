import {
  listSavedViewsInput,
  removeSavedViewInput,
  type SavedView,
  saveViewInput,
} from "@withy/contracts/diary";
import { notFound, refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { savedViews } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { inTransaction } from "../../transaction";
import { verb } from "../../verb";

const mostViews = 30;

const ofPerson = (ctx: Context) =>
  and(eq(savedViews.practiceId, ctx.practiceId), eq(savedViews.staffMemberId, ctx.staffMemberId));

/** Keeps a view of the diary under a name of one's own; the same name again replaces it. */
export const saveView = verb("diary.read", saveViewInput, (ctx, input) =>
  inTransaction(ctx, async (tx) => {
    const held = await tx.db.select({ name: savedViews.name }).from(savedViews).where(ofPerson(tx));
    const isNew = held.every(({ name }) => name !== input.name);
    if (isNew && held.length >= mostViews)
      throw refused(refusal("views-full", "You keep 30 views already. Remove one first.", "name"));
    const id = newId();
    await tx.db
      .insert(savedViews)
      .values({
        practiceId: tx.practiceId,
        id,
        staffMemberId: tx.staffMemberId,
        name: input.name,
        address: input.address,
        createdAt: tx.clock.now(),
      })
      .onDuplicateKeyUpdate({ set: { address: input.address } });
    await recordAudit(tx, { action: "view.saved", subjectKind: "staff-member", subjectId: tx.staffMemberId });
    return { name: input.name, address: input.address };
  }),
);

/** One's own views by name. */
export const listSavedViews = verb(
  "diary.read",
  listSavedViewsInput,
  (ctx): Promise<SavedView[]> =>
    ctx.db
      .select({ id: savedViews.id, name: savedViews.name, address: savedViews.address })
      .from(savedViews)
      .where(ofPerson(ctx))
      .orderBy(asc(savedViews.name)),
);

export const removeSavedView = verb("diary.read", removeSavedViewInput, (ctx, input) =>
  inTransaction(ctx, async (tx) => {
    const row = await loadRecord(tx, savedViews, input.viewId, "view", { lock: true });
    if (row.staffMemberId !== tx.staffMemberId) throw notFound("view");
    await tx.db
      .delete(savedViews)
      .where(and(eq(savedViews.practiceId, tx.practiceId), eq(savedViews.id, row.id)));
    await recordAudit(tx, {
      action: "view.removed",
      subjectKind: "staff-member",
      subjectId: tx.staffMemberId,
    });
    return { id: row.id };
  }),
);
