import { type CourseRow, listCoursesInput } from "@withy/contracts/diary";
import { patients } from "@withy/db/schema";
import { loadRecord } from "../load-record";
import { verb } from "../verb";
import { readCoursesOf } from "./course-view";

/** The courses of a patient, newest first. */
export const listCourses = verb("diary.read", listCoursesInput, async (ctx, input): Promise<CourseRow[]> => {
  await loadRecord(ctx, patients, input.patientId, "patient");
  return readCoursesOf(ctx, input.patientId);
});
