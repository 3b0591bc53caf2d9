import { type AppointmentView, cancelAppointmentInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { sites } from "@withy/db/schema";
import { checkMark } from "@withy/diary/check-mark";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";
import { cancelVisit, noticeHoursOf } from "./cancellation";
import { takeAppointment } from "./change-appointment";
import { sendVisitMessage } from "./send-visit-message";

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
      await cancelVisit(tx, before, input, await noticeHoursOf(tx));
      await sendVisitMessage(tx, "booking-cancelled", before.id);
      return { appointmentId: before.id };
    });
    return readAppointment(ctx, input.appointmentId);
  },
);
