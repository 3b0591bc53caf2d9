import { type CourseUndone, undoCancelCourseInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addMinutes, dayOf, timeOf } from "@withy/core/zoned-time";
import { sites } from "@withy/db/schema";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { notCancelled } from "./cancellation";
import { type AppointmentRow, saveAppointment } from "./change-appointment";
import { claimSlots } from "./claim-slots";
import { saveCourse, takeCourse, takeVisits } from "./course-row";
import { readCourse } from "./course-view";
import { recordChange } from "./record-change";
import { sendCourseMessage } from "./send-course-message";
import { closeChange } from "./undo-change";
import { readVisitRow } from "./visit-row";
import { readSurroundings } from "./visit-surroundings";

type Lost = CourseUndone["lost"][number];

/** Those of the last cancelling: one instant for all of them. */
function lastCancelled(rows: readonly AppointmentRow[]): AppointmentRow[] {
  const at = (row: AppointmentRow): number =>
    row.state === "cancelled" ? (row.cancelledAt?.getTime() ?? 0) : 0;
  const last = Math.max(0, ...rows.map(at));
  return last === 0 ? [] : rows.filter((row) => at(row) === last);
}

/** Brings one visit back. @returns why it cannot be, or null */
async function restore(ctx: Context, row: AppointmentRow): Promise<string | null> {
  const { undo } = await readSurroundings(ctx, await readVisitRow(ctx, row.id));
  if (!undo) return "something was done to it since";
  if (undo.dependsOn !== null) return undo.dependsOn;
  const { id: appointmentId, therapistId, roomId, startsAt } = row;
  const until = addMinutes(row.endsAt, row.cleanDownMinutes);
  if (!(await claimSlots(ctx, { appointmentId, therapistId, roomId, startsAt, until })))
    return "someone else has its time now";
  const after = await saveAppointment(ctx, row, { state: undo.to, ...notCancelled });
  await closeChange(ctx, row, undo);
  await recordChange(ctx, "undone", row, after);
  return null;
}

async function lostVisit(ctx: Context, row: AppointmentRow, why: string): Promise<Lost> {
  const { zone } = await loadRecord(ctx, sites, row.siteId, "site");
  return { day: dayOf(row.startsAt, zone), startTime: timeOf(row.startsAt, zone), why };
}

/** Takes back the last cancelling of a course: every visit whose time is still free comes back, the others are named. */
export const undoCancelCourse = verb(
  "diary.cancel",
  undoCancelCourseInput,
  async (ctx, input): Promise<CourseUndone> => {
    const { lost } = await once(ctx, "course.undo-cancel", async (tx) => {
      const before = await takeCourse(tx, "diary.cancel", input);
      const rows = lastCancelled(await takeVisits(tx, before.id));
      const gone: Lost[] = [];
      const back: string[] = [];
      for (const row of rows) {
        requireReach(tx, "diary.cancel", row.siteId, "appointment");
        const why = await restore(tx, row);
        if (why === null) back.push(row.id);
        else gone.push(await lostVisit(tx, row, why));
      }
      if (back.length === 0)
        throw refused(
          refusal("nothing-to-undo", "None of the cancelled visits can come back. Book their times anew."),
          { lost: gone },
        );
      const after = await saveCourse(tx, before, "restored", { visits: back.length, lost: gone.length });
      await sendCourseMessage(tx, "course-booked", after, back);
      return { lost: gone };
    });
    return { course: await readCourse(ctx, input.courseId), lost };
  },
);
