import type { Permission } from "@withy/core/access/permissions";
import { refused, stale } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { appointments, courses } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";
import type { AppointmentRow } from "./change-appointment";
import { readCourse } from "./course-view";

export type CourseRecord = typeof courses.$inferSelect;

/** Takes the course for this transaction, within reach and as the screen saw it. @throws not-found, stale */
export async function takeCourse(
  ctx: Context,
  permission: Permission,
  input: { courseId: string; version: number },
): Promise<CourseRecord> {
  const row = await loadRecord(ctx, courses, input.courseId, "course", { lock: true });
  requireReach(ctx, permission, row.siteId, "course");
  if (row.version !== input.version) throw stale("course", { current: await readCourse(ctx, row.id) });
  return row;
}

/** Every visit of the course, in order, held for this transaction. */
export async function takeVisits(ctx: Context, courseId: string): Promise<AppointmentRow[]> {
  return ctx.db
    .select()
    .from(appointments)
    .where(and(eq(appointments.practiceId, ctx.practiceId), eq(appointments.courseId, courseId)))
    .orderBy(asc(appointments.startsAt), asc(appointments.id))
    .for("update");
}

/** A visit that is still to come: neither begun nor cancelled, and not before now. */
export const isRest = (row: Pick<AppointmentRow, "state" | "startsAt">, now: Date): boolean =>
  (row.state === "booked" || row.state === "confirmed") && row.startsAt > now;

/**
 * The visits that are still to come, each within reach, held for this transaction.
 * @throws refused `no-rest` where none is
 */
export async function takeRest(
  ctx: Context,
  permission: Permission,
  courseId: string,
): Promise<AppointmentRow[]> {
  const rest = (await takeVisits(ctx, courseId)).filter((row) => isRest(row, ctx.clock.now()));
  if (rest.length === 0)
    throw refused(refusal("no-rest", "No visit of this course is still to come. Extend the course instead."));
  for (const row of rest) requireReach(ctx, permission, row.siteId, "appointment");
  return rest;
}

/** Raises the course's version and writes down what was done to it, in the caller's transaction. */
export async function saveCourse(
  ctx: Context,
  before: CourseRecord,
  act: "extended" | "shifted" | "cancelled" | "restored",
  detail: Record<string, unknown>,
  plannedVisits = before.plannedVisits,
): Promise<CourseRecord> {
  const after = { ...before, plannedVisits, version: before.version + 1 };
  const { version } = after;
  const [result] = await ctx.db
    .update(courses)
    .set({ plannedVisits, version })
    .where(
      and(
        eq(courses.practiceId, ctx.practiceId),
        eq(courses.id, before.id),
        eq(courses.version, before.version),
      ),
    );
  if (result.affectedRows !== 1) throw stale("course");
  await recordCourse(ctx, after, act, detail);
  return after;
}

export async function recordCourse(
  ctx: Context,
  course: CourseRecord,
  act: string,
  detail: Record<string, unknown>,
): Promise<void> {
  await recordAudit(ctx, {
    action: `course.${act}`,
    subjectKind: "course",
    subjectId: course.id,
    patientId: course.patientId,
    siteId: course.siteId,
    detail,
  });
}
