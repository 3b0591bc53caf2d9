import { type AppointmentView, bookAppointmentInput } from "@withy/contracts/diary";
import { newId } from "@withy/core/ids";
import { appointments } from "@withy/db/schema";
import type { z } from "zod";
import type { Context } from "../context";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { readAppointment, viewVisit } from "./appointment-view";
import type { AppointmentRow } from "./change-appointment";
import { claimPlan, planVisit, type VisitPlan } from "./plan-visit";
import { recordChange } from "./record-change";
import { sendVisitMessage } from "./send-visit-message";
import type { VisitRow } from "./visit-row";

type Input = z.output<typeof bookAppointmentInput>;

function newRow(ctx: Context, input: Input, plan: VisitPlan): AppointmentRow {
  const { siteId, therapistId, patientId, serviceId, episodeId, deskNote, overrideReason } = input;
  const { startsAt, endsAt, cleanDownMinutes } = plan;
  const now = ctx.clock.now();
  return {
    ...{ practiceId: ctx.practiceId, id: newId(), siteId, therapistId, roomId: plan.room.id, patientId },
    ...{
      serviceId,
      episodeId,
      courseId: null,
      startsAt,
      endsAt,
      cleanDownMinutes,
      state: "booked",
      deskNote,
      overrideReason,
    },
    ...{ arrivedAt: null, sessionStartedAt: null, sessionEndedAt: null },
    ...{ cancelledAt: null, cancelledBy: null, cancelReason: null, isLateCancellation: false },
    ...{ version: 1, createdAt: now, createdBy: ctx.staffMemberId, updatedAt: now },
  };
}

/** Books a visit, or says who has the time and what is free next. */
export const bookAppointment = verb(
  "diary.book",
  bookAppointmentInput,
  async (ctx, input): Promise<AppointmentView> => {
    requireReach(ctx, "diary.book", input.siteId, "site");
    const { startsAt, durationMinutes, overrideReason } = input;
    const wish = { startsAt, durationMinutes, cleanDownMinutes: null, overrideReason, movingId: null };
    const written: VisitRow[] = [];
    const { appointmentId } = await once(ctx, "appointment.book", async (tx) => {
      const plan = await planVisit(tx, input, wish);
      const row = newRow(tx, input, plan);
      await tx.db.insert(appointments).values(row);
      await claimPlan(tx, row.id, plan);
      await recordChange(tx, "booked", null, row);
      written.push(await sendVisitMessage(tx, "booking-confirmed", row.id));
      return { appointmentId: row.id };
    });
    // A repeat's own rows were rolled back: the visit is the first one's.
    const row = written.find(({ id }) => id === appointmentId);
    return row ? viewVisit(ctx, row) : readAppointment(ctx, appointmentId);
  },
);
