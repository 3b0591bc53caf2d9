import { practices } from "@withy/db/schema";
import { isLateCancellation } from "@withy/diary/check-mark";
import { eq } from "drizzle-orm";
import type { Context } from "../context";
import { type AppointmentRow, saveAppointment } from "./change-appointment";
import { releaseSlots } from "./claim-slots";
import { recordChange } from "./record-change";

/** Hours of notice that the practice asks for. */
export async function noticeHoursOf(ctx: Context): Promise<number> {
  const [row] = await ctx.db
    .select({ noticeHours: practices.noticeHours })
    .from(practices)
    .where(eq(practices.id, ctx.practiceId));
  return row?.noticeHours ?? 0;
}

/** Cancels a visit that was taken and may be cancelled, and gives its time back. */
export async function cancelVisit(
  ctx: Context,
  before: AppointmentRow,
  { by, reason }: { by: "patient" | "clinic"; reason: string },
  noticeHours: number,
): Promise<AppointmentRow> {
  const now = ctx.clock.now();
  await releaseSlots(ctx, before.id);
  const after = await saveAppointment(ctx, before, {
    state: "cancelled",
    cancelledAt: now,
    cancelledBy: by,
    cancelReason: reason,
    isLateCancellation: isLateCancellation({ by, startsAt: before.startsAt, now, noticeHours }),
  });
  await recordChange(ctx, "cancelled", before, after);
  return after;
}

/** The columns of a visit that is no longer cancelled. */
export const notCancelled = {
  cancelledAt: null,
  cancelledBy: null,
  cancelReason: null,
  isLateCancellation: false,
} as const;
