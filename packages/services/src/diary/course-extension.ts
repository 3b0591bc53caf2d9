import { notFound, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { sites } from "@withy/db/schema";
import { dayAfterCourse, longestCourse, type SeriesVisit, seriesOf } from "@withy/diary/series";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import type { AppointmentRow } from "./change-appointment";
import type { CourseRecord } from "./course-row";

export interface Extension {
  readonly zone: string;
  readonly series: readonly SeriesVisit[];
  /** The visit that the new ones follow. */
  readonly last: AppointmentRow;
}

/**
 * The visits that go on where the course ends, by its own rhythm, never before today.
 * @throws refused `too-long` beyond the most visits that a course may have
 */
export async function extensionOf(
  ctx: Context,
  course: CourseRecord,
  rows: readonly AppointmentRow[],
  visits: number,
): Promise<Extension> {
  const left = longestCourse - course.plannedVisits;
  if (visits > left)
    throw refused(
      refusal(
        "too-long",
        `A course has at most ${longestCourse} visits. ${left > 0 ? `Add ${left} or fewer.` : "Book another course."}`,
        "visits",
      ),
    );
  const { zone } = await loadRecord(ctx, sites, course.siteId, "site");
  const standing = rows.filter((row) => row.state !== "cancelled");
  const last = standing.at(-1) ?? rows.at(-1);
  if (!last) throw notFound("course");
  const today = dayOf(ctx.clock.now(), zone);
  const next = dayAfterCourse(dayOf(last.startsAt, zone), course.rhythm);
  const firstDay = [today, next].sort().at(-1) ?? today;
  const { startTime: time, rhythm } = course;
  return { zone, last, series: seriesOf({ firstDay, time, zone, visits, rhythm }) };
}
