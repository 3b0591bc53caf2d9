import { type CourseProposal, previewCourseInput } from "@withy/contracts/diary";
import { seriesOf } from "@withy/diary/series";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { rhythmOf } from "./course-visits";
import { proposeVisits } from "./propose-visits";

/** What a course would come to: each visit free or not, and what to take instead. Nothing is booked. */
export const previewCourse = verb(
  "diary.book",
  previewCourseInput,
  async (ctx, input): Promise<CourseProposal> => {
    requireReach(ctx, "diary.book", input.siteId, "site");
    const { siteId, therapistId, serviceId, patientId, firstDay, startTime: time, visits } = input;
    const ids = { siteId, therapistId, serviceId, patientId, roomId: null, episodeId: null };
    const rhythm = rhythmOf(input);
    return proposeVisits(ctx, ids, (zone) => seriesOf({ firstDay, time, zone, visits, rhythm }), time);
  },
);
