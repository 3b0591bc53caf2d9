import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { appointmentChanges } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import type { AppointmentRow } from "./change-appointment";
import { readVisitRow } from "./visit-row";
import { readSurroundings, type Undo } from "./visit-surroundings";

/**
 * The change to take back: the last one that made the visit what it is now.
 * @throws refused `wrong-state` where there is none, `depends` where something has come to rest on it
 */
export async function findUndo(ctx: Context, row: AppointmentRow): Promise<Undo> {
  const { undo } = await readSurroundings(ctx, await readVisitRow(ctx, row.id));
  if (!undo)
    throw refused(
      refusal("wrong-state", "There is nothing to undo for this visit. Reload to see what changed."),
    );
  if (undo.dependsOn !== null)
    throw refused(
      refusal("depends", `This cannot be undone, because ${undo.dependsOn}. Put that right first.`),
    );
  return undo;
}

/** Keeps the same change from being taken back twice. A change told at two sites is closed at both. */
export async function closeChange(ctx: Context, row: AppointmentRow, undo: Undo): Promise<void> {
  await ctx.db
    .update(appointmentChanges)
    .set({ undoneAt: ctx.clock.now() })
    .where(
      and(
        eq(appointmentChanges.practiceId, ctx.practiceId),
        eq(appointmentChanges.appointmentId, row.id),
        eq(appointmentChanges.id, undo.changeId),
      ),
    );
}
