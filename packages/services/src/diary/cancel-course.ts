import { type CourseView, cancelCourseInput } from "@withy/contracts/diary";
import { once } from "../once";
import { verb } from "../verb";
import { cancelVisit, noticeHoursOf } from "./cancellation";
import { saveCourse, takeCourse, takeRest } from "./course-row";
import { readCourse } from "./course-view";
import { sendCourseMessage } from "./send-course-message";

/** Cancels every visit that is still to come, for one reason. Each is late or not by its own notice. */
export const cancelCourse = verb(
  "diary.cancel",
  cancelCourseInput,
  async (ctx, input): Promise<CourseView> => {
    await once(ctx, "course.cancel", async (tx) => {
      const before = await takeCourse(tx, "diary.cancel", input);
      const rest = await takeRest(tx, "diary.cancel", before.id);
      const noticeHours = await noticeHoursOf(tx);
      for (const row of rest) await cancelVisit(tx, row, input, noticeHours);
      const after = await saveCourse(tx, before, "cancelled", { by: input.by, visits: rest.length });
      await sendCourseMessage(
        tx,
        "course-cancelled",
        after,
        rest.map((r) => r.id),
      );
      return { courseId: before.id };
    });
    return readCourse(ctx, input.courseId);
  },
);
