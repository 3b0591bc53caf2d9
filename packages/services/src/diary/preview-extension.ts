import { type CourseProposal, previewExtensionInput } from "@withy/contracts/diary";
import { appointments, courses } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { extensionOf } from "./course-extension";
import { proposeVisits } from "./propose-visits";

/** What more visits of a course would come to, as `previewCourse` tells it of a new one. */
export const previewExtension = verb(
  "diary.book",
  previewExtensionInput,
  async (ctx, input): Promise<CourseProposal> => {
    const course = await loadRecord(ctx, courses, input.courseId, "course");
    requireReach(ctx, "diary.book", course.siteId, "course");
    const rows = await ctx.db
      .select()
      .from(appointments)
      .where(and(eq(appointments.practiceId, ctx.practiceId), eq(appointments.courseId, course.id)))
      .orderBy(asc(appointments.startsAt));
    const { series } = await extensionOf(ctx, course, rows, input.visits);
    const { siteId, therapistId, serviceId, patientId } = course;
    const ids = { siteId, therapistId, serviceId, patientId, roomId: null, episodeId: null };
    return proposeVisits(ctx, ids, () => series, course.startTime);
  },
);
