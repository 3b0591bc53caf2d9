import { bookCourseInput, type CourseView } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { courses } from "@withy/db/schema";
import { checkAuthorisation } from "@withy/diary/check-authorisation";
import { seriesOf } from "@withy/diary/series";
import type { z } from "zod";
import type { Context } from "../context";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { loadBookingSetting } from "./booking-setting";
import { type CourseRecord, recordCourse } from "./course-row";
import { readCourse } from "./course-view";
import { bookVisits, chosenStarts, rhythmOf } from "./course-visits";
import { readPayerLimit } from "./payer-limit";
import { sendCourseMessage } from "./send-course-message";

type Input = z.output<typeof bookCourseInput>;

function newCourse(ctx: Context, input: Input): CourseRecord {
  const { patientId, serviceId, siteId, therapistId, startTime, visits: plannedVisits } = input;
  return {
    ...{ practiceId: ctx.practiceId, id: newId(), patientId, serviceId, siteId, therapistId, startTime },
    ...{ rhythm: rhythmOf(input), plannedVisits, version: 1 },
    ...{ createdAt: ctx.clock.now(), createdBy: ctx.staffMemberId },
  };
}

/** Books a whole course or nothing of it, within what the payer has authorised; the patient is told once. */
export const bookCourse = verb("diary.book", bookCourseInput, async (ctx, input): Promise<CourseView> => {
  requireReach(ctx, "diary.book", input.siteId, "site");
  const { courseId } = await once(ctx, "course.book", async (tx) => {
    const { site } = await loadBookingSetting(tx, { ...input, roomId: null });
    refuseIf(checkAuthorisation(await readPayerLimit(tx, input.patientId, true), input.visits));
    const course = newCourse(tx, input);
    await tx.db.insert(courses).values(course);
    const { firstDay, startTime: time, visits } = input;
    const series = seriesOf({ firstDay, time, zone: site.zone, visits, rhythm: course.rhythm });
    const { patientId, serviceId, siteId, therapistId, episodeId, deskNote } = input;
    const visit = { patientId, serviceId, siteId, therapistId, episodeId, deskNote, overrideReason: null };
    const starts = chosenStarts(series, time, input.changes);
    const rows = await bookVisits(tx, { ...visit, courseId: course.id }, starts, site.zone);
    await recordCourse(tx, course, "booked", { visits: rows.length });
    await sendCourseMessage(
      tx,
      "course-booked",
      course,
      rows.map((r) => r.id),
    );
    return { courseId: course.id };
  });
  return readCourse(ctx, courseId);
});
