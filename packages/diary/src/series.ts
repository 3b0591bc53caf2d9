import type { Refusal } from "@withy/core/refusal";
import { addDays, type PlainDateText, type PlainTimeText } from "@withy/core/zoned-time";
import { readStart } from "./check-booking";
import { recurringDays } from "./recurring-days";

/** How the visits of a course follow each other: every so many days, or on weekdays (1 Monday to 7 Sunday). */
export type CourseRhythm =
  | { readonly kind: "interval"; readonly days: number }
  | { readonly kind: "weekdays"; readonly weekdays: readonly number[] };

/** The most visits that one course may have. */
export const longestCourse = 60;

export interface SeriesRequest {
  /** With weekdays the first visit is on the first of them from this day on. */
  readonly firstDay: PlainDateText;
  /** The clock time at the site, kept over changes of the clocks. */
  readonly time: PlainTimeText;
  readonly zone: string;
  readonly visits: number;
  readonly rhythm: CourseRhythm;
}

export type SeriesVisit =
  | { readonly day: PlainDateText; readonly startsAt: Date }
  | { readonly day: PlainDateText; readonly refusal: Refusal };

/**
 * The days of a course from its first day on, in order.
 * @throws RangeError for fewer than 1 or more than 60 visits, less than a day between them, or no weekday at all
 */
export function courseDays(firstDay: PlainDateText, visits: number, rhythm: CourseRhythm): PlainDateText[] {
  if (!Number.isInteger(visits) || visits < 1 || visits > longestCourse)
    throw new RangeError(`A course has 1 to ${longestCourse} visits.`);
  if (rhythm.kind === "weekdays") {
    const isWeekday = (day: number): boolean => Number.isInteger(day) && day >= 1 && day <= 7;
    if (rhythm.weekdays.length === 0 || !rhythm.weekdays.every(isWeekday))
      throw new RangeError("Weekdays are 1 to 7, and there is at least one.");
    return recurringDays(firstDay, { every: "week", weekdays: rhythm.weekdays }, { count: visits });
  }
  const { days } = rhythm;
  if (!Number.isInteger(days) || days < 1) throw new RangeError("Visits are whole days apart.");
  return Array.from({ length: visits }, (_, n) => addDays(firstDay, n * days));
}

/** The day from which a course goes on after its last visit. */
export function dayAfterCourse(lastDay: PlainDateText, rhythm: CourseRhythm): PlainDateText {
  return addDays(lastDay, rhythm.kind === "interval" ? rhythm.days : 1);
}

/**
 * The starts of a course of visits at one clock time. A day on which that time does not happen carries its refusal,
 * so that another time can be proposed for that visit alone.
 * @throws RangeError as `courseDays` does
 */
export function seriesOf({ firstDay, time, zone, visits, rhythm }: SeriesRequest): SeriesVisit[] {
  return courseDays(firstDay, visits, rhythm).map((day) => {
    const start = readStart(day, time, zone);
    return start instanceof Date ? { day, startsAt: start } : { day, refusal: start };
  });
}
