import { type AppointmentView, moveAppointmentInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { minutesBetween } from "@withy/core/zoned-time";
import { stateFacts } from "@withy/diary/appointment-states";
import { canBeMoved } from "@withy/diary/check-mark";
import type { z } from "zod";
import type { Context } from "../context";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";
import { type AppointmentRow, saveAppointment, takeAppointment } from "./change-appointment";
import { releaseSlots } from "./claim-slots";
import { claimPlan, planVisit, type VisitPlan } from "./plan-visit";
import { recordChange } from "./record-change";
import { sendVisitMessage } from "./send-visit-message";

type Input = z.output<typeof moveAppointmentInput>;

function refuseUnlessMovable(row: AppointmentRow): void {
  if (canBeMoved(row.state)) return;
  const word = stateFacts[row.state].word.toLowerCase();
  const message = `This visit is ${word}, so its time stays. Undo that first, or book another visit.`;
  refuseIf(refusal("wrong-state", message));
}

function planMove(ctx: Context, before: AppointmentRow, input: Input): Promise<VisitPlan> {
  const siteId = input.siteId ?? before.siteId;
  if (siteId !== before.siteId) requireReach(ctx, "diary.book", siteId, "site");
  const { serviceId, patientId, cleanDownMinutes } = before;
  const sameRoom = siteId === before.siteId ? before.roomId : null;
  const roomId = input.roomId === undefined ? sameRoom : input.roomId;
  const therapistId = input.therapistId ?? before.therapistId;
  const durationMinutes = input.durationMinutes ?? minutesBetween(before.startsAt, before.endsAt);
  const ids = { siteId, therapistId, serviceId, roomId, patientId, episodeId: null };
  const { startsAt, overrideReason } = input;
  return planVisit(ctx, ids, {
    startsAt,
    durationMinutes,
    cleanDownMinutes,
    overrideReason,
    movingId: before.id,
  });
}

/** Gives a visit another time, therapist, room or site. The old time is given back in the same transaction. */
export const moveAppointment = verb(
  "diary.book",
  moveAppointmentInput,
  async (ctx, input): Promise<AppointmentView> => {
    await once(ctx, "appointment.move", async (tx) => {
      const before = await takeAppointment(tx, "diary.book", input);
      refuseUnlessMovable(before);
      const plan = await planMove(tx, before, input);
      await releaseSlots(tx, before.id);
      await claimPlan(tx, before.id, plan);
      const { startsAt, endsAt, room, setting } = plan;
      const after = await saveAppointment(tx, before, {
        ...{ siteId: setting.site.id, therapistId: setting.therapist.id, roomId: room.id, startsAt, endsAt },
        // Whoever confirmed, confirmed the old time.
        state: startsAt.getTime() === before.startsAt.getTime() ? before.state : "booked",
        overrideReason: input.overrideReason,
      });
      await recordChange(tx, "moved", before, after);
      await sendVisitMessage(tx, "booking-moved", before.id, before.startsAt);
      return { appointmentId: before.id };
    });
    return readAppointment(ctx, input.appointmentId);
  },
);
