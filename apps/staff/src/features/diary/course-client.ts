import type {
  bookCourseInput,
  CourseProposal,
  CourseUndone,
  CourseView,
  cancelCourseInput,
  extendCourseInput,
  previewCourseInput,
  shiftCourseInput,
} from "@withy/contracts/diary";
import type { z } from "zod";
import { get, write } from "@/api/request";

export type BookCourse = z.input<typeof bookCourseInput>;
export type CourseQuery = z.input<typeof previewCourseInput>;

const course = (id: string) => `/api/diary/courses/${id}`;

export const fetchCourse = (id: string, signal?: AbortSignal) => get<CourseView>(course(id), {}, signal);

export const fetchProposal = (query: CourseQuery, signal?: AbortSignal) => {
  const weekdays = [query.weekdays ?? []].flat().map(String);
  const { visits, everyDays = 7, ...rest } = query;
  const numbers = { visits: String(visits), everyDays: String(everyDays), weekdays };
  return get<CourseProposal>("/api/diary/courses/preview", { ...rest, ...numbers }, signal);
};

export const fetchExtension = (id: string, visits: number, signal?: AbortSignal) =>
  get<CourseProposal>(`${course(id)}/preview`, { visits }, signal);

export const bookCourse = (input: BookCourse, key: string) =>
  write<CourseView>("POST", "/api/diary/courses", input, key);

export const extendCourse = ({ courseId, ...input }: z.input<typeof extendCourseInput>) =>
  write<CourseView>("POST", `${course(courseId)}/extend`, input);

export const shiftCourse = ({ courseId, ...input }: z.input<typeof shiftCourseInput>) =>
  write<CourseView>("POST", `${course(courseId)}/shift`, input);

export const cancelCourse = ({ courseId, ...input }: z.input<typeof cancelCourseInput>) =>
  write<CourseView>("POST", `${course(courseId)}/cancel`, input);

export const undoCancelCourse = ({ id, version }: { id: string; version: number }) =>
  write<CourseUndone>("POST", `${course(id)}/undo-cancel`, { version });
