import { type AppointmentView, markAppointmentInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { sites } from "@withy/db/schema";
import type { AppointmentState } from "@withy/diary/appointment-states";
import { checkMark } from "@withy/diary/check-mark";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";
import { type AppointmentRow, saveAppointment, takeAppointment } from "./change-appointment";
import { recordChange } from "./record-change";

/** The instants that a mark sets. A session that was never begun by hand began when it was marked as over. */
function stamps(before: AppointmentRow, to: AppointmentState, now: Date): Partial<AppointmentRow> {
  if (to === "arrived") return { arrivedAt: now };
  if (to === "in-session") return { sessionStartedAt: now };
  if (to === "fulfilled") return { sessionStartedAt: before.sessionStartedAt ?? now, sessionEndedAt: now };
  return {};
}

/** Marks a visit as confirmed, arrived, in session, attended or missed. */
export const markAppointment = verb(
  "diary.mark",
  markAppointmentInput,
  async (ctx, input): Promise<AppointmentView> => {
    await once(ctx, "appointment.mark", async (tx) => {
      const before = await takeAppointment(tx, "diary.mark", input);
      const { zone } = await loadRecord(tx, sites, before.siteId, "site");
      const now = tx.clock.now();
      refuseIf(checkMark({ from: before.state, to: input.to, startsAt: before.startsAt, now, zone }));
      const after = await saveAppointment(tx, before, { state: input.to, ...stamps(before, input.to, now) });
      await recordChange(tx, "marked", before, after);
      return { appointmentId: before.id };
    });
    return readAppointment(ctx, input.appointmentId);
  },
);
