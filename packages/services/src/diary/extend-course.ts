import { type CourseView, extendCourseInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { checkAuthorisation } from "@withy/diary/check-authorisation";
import { once } from "../once";
import { verb } from "../verb";
import { extensionOf } from "./course-extension";
import { saveCourse, takeCourse, takeVisits } from "./course-row";
import { readCourse } from "./course-view";
import { bookVisits, chosenStarts } from "./course-visits";
import { readPayerLimit } from "./payer-limit";
import { sendCourseMessage } from "./send-course-message";

/** Adds visits at the end of a course, all or none, within what the payer has authorised. */
export const extendCourse = verb("diary.book", extendCourseInput, async (ctx, input): Promise<CourseView> => {
  await once(ctx, "course.extend", async (tx) => {
    const before = await takeCourse(tx, "diary.book", input);
    refuseIf(checkAuthorisation(await readPayerLimit(tx, before.patientId, true), input.visits));
    const { zone, series, last } = await extensionOf(
      tx,
      before,
      await takeVisits(tx, before.id),
      input.visits,
    );
    const { patientId, serviceId, siteId, therapistId } = before;
    const who = { patientId, serviceId, siteId, therapistId, episodeId: last.episodeId };
    const visit = { ...who, courseId: before.id, deskNote: null, overrideReason: null };
    const starts = chosenStarts(series, before.startTime, input.changes);
    const rows = await bookVisits(tx, visit, starts, zone);
    const planned = before.plannedVisits + rows.length;
    const after = await saveCourse(tx, before, "extended", { visits: rows.length }, planned);
    await sendCourseMessage(
      tx,
      "course-booked",
      after,
      rows.map((r) => r.id),
    );
    return { courseId: before.id };
  });
  return readCourse(ctx, input.courseId);
});
