import { type CourseView, getCourseInput } from "@withy/contracts/diary";
import { verb } from "../verb";
import { readCourse } from "./course-view";

export const getCourse = verb(
  "diary.read",
  getCourseInput,
  (ctx, input): Promise<CourseView> => readCourse(ctx, input.courseId),
);
