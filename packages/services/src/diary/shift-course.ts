import { type CourseView, shiftCourseInput } from "@withy/contracts/diary";
import { addDays, addMinutes, dayOf, minutesBetween, timeOf } from "@withy/core/zoned-time";
import { sites } from "@withy/db/schema";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { type AppointmentRow, saveAppointment } from "./change-appointment";
import { findHolder, releaseSlots } from "./claim-slots";
import { saveCourse, takeCourse, takeRest } from "./course-row";
import { readCourse } from "./course-view";
import { onVisit } from "./course-visits";
import { claimPlan, planVisit, type VisitPlan } from "./plan-visit";
import { recordChange } from "./record-change";
import { sendCourseMessage } from "./send-course-message";

/** The same clock time so many days on, in the same room where it is free and in another of its kind where not. */
async function planShift(ctx: Context, row: AppointmentRow, startsAt: string): Promise<VisitPlan> {
  const { siteId, therapistId, serviceId, patientId, cleanDownMinutes, overrideReason } = row;
  const durationMinutes = minutesBetween(row.startsAt, row.endsAt);
  const wish = { startsAt, durationMinutes, cleanDownMinutes, overrideReason, movingId: row.id };
  const ids = { siteId, therapistId, serviceId, patientId, episodeId: null };
  const same = await planVisit(ctx, { ...ids, roomId: row.roomId }, wish);
  const until = addMinutes(same.endsAt, cleanDownMinutes);
  const claim = { appointmentId: row.id, therapistId, roomId: row.roomId, startsAt: same.startsAt, until };
  if ((await findHolder(ctx, claim)) === null) return { ...same, isFree: true };
  return planVisit(ctx, { ...ids, roomId: null }, wish);
}

async function shiftVisit(ctx: Context, row: AppointmentRow, startsAt: string): Promise<AppointmentRow> {
  const plan = await planShift(ctx, row, startsAt);
  await claimPlan(ctx, row.id, plan);
  const { startsAt: start, endsAt, room } = plan;
  // Whoever confirmed, confirmed the old time.
  return saveAppointment(ctx, row, { roomId: room.id, startsAt: start, endsAt, state: "booked" });
}

/** Moves every visit that is still to come by the same number of days, all or none. The clock time holds. */
export const shiftCourse = verb("diary.book", shiftCourseInput, async (ctx, input): Promise<CourseView> => {
  await once(ctx, "course.shift", async (tx) => {
    const before = await takeCourse(tx, "diary.book", input);
    const rest = await takeRest(tx, "diary.book", before.id);
    // One visit may take the place of the next, so all the old times are given back first.
    for (const row of rest) await releaseSlots(tx, row.id);
    for (const [n, row] of rest.entries()) {
      const { zone } = await loadRecord(tx, sites, row.siteId, "site");
      const startsAt = `${addDays(dayOf(row.startsAt, zone), input.days)}T${timeOf(row.startsAt, zone)}`;
      const after = await onVisit(n + 1, startsAt, zone, () => shiftVisit(tx, row, startsAt));
      await recordChange(tx, "moved", row, after);
    }
    const after = await saveCourse(tx, before, "shifted", { days: input.days, visits: rest.length });
    await sendCourseMessage(
      tx,
      "course-moved",
      after,
      rest.map((r) => r.id),
    );
    return { courseId: before.id };
  });
  return readCourse(ctx, input.courseId);
});
