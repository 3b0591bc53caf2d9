import { type AppointmentView, cancelAppointmentInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { practices, sites } from "@withy/db/schema";
import { checkMark, isLateCancellation } from "@withy/diary/check-mark";
import { eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";
import { saveAppointment, takeAppointment } from "./change-appointment";
import { releaseSlots } from "./claim-slots";
import { recordChange } from "./record-change";
import { sendVisitMessage } from "./send-visit-message";

async function noticeHoursOf(ctx: Context): Promise<number> {
  const [row] = await ctx.db
    .select({ noticeHours: practices.noticeHours })
    .from(practices)
    .where(eq(practices.id, ctx.practiceId));
  return row?.noticeHours ?? 0;
}

/** Cancels a visit and gives its time back at once. Whether it is late follows from the practice's notice. */
export const cancelAppointment = verb(
  "diary.cancel",
  cancelAppointmentInput,
  async (ctx, input): Promise<AppointmentView> => {
    await once(ctx, "appointment.cancel", async (tx) => {
      const before = await takeAppointment(tx, "diary.cancel", input);
      const { zone } = await loadRecord(tx, sites, before.siteId, "site");
      const now = tx.clock.now();
      refuseIf(checkMark({ from: before.state, to: "cancelled", startsAt: before.startsAt, now, zone }));
      const noticeHours = await noticeHoursOf(tx);
      await releaseSlots(tx, before.id);
      const after = await saveAppointment(tx, before, {
        state: "cancelled",
        cancelledAt: now,
        cancelledBy: input.by,
        cancelReason: input.reason,
        isLateCancellation: isLateCancellation({ by: input.by, startsAt: before.startsAt, now, noticeHours }),
      });
      await recordChange(tx, "cancelled", before, after);
      await sendVisitMessage(tx, "booking-cancelled", before.id);
      return { appointmentId: before.id };
    });
    return readAppointment(ctx, input.appointmentId);
  },
);
