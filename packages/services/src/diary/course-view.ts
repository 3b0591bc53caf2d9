import type { CourseRow, CourseView, CourseVisit } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { notFound } from "@withy/core/errors";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import type { AppointmentState } from "@withy/diary/appointment-states";
import type { CourseRhythm } from "@withy/diary/series";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { requireReach } from "../reach";
import { rowsOf, utc } from "./raw-rows";

interface Head {
  id: string;
  version: number;
  rhythm: CourseRhythm | string;
  start_time: string;
  planned_visits: number;
  patient_id: string;
  patient_name: string;
  service_id: string;
  service_name: string;
  therapist_id: string;
  therapist_name: string;
  site_id: string;
  site_name: string;
  zone: string;
}

interface Visit {
  course_id: string;
  id: string;
  version: number;
  state: AppointmentState;
  site_id: string;
  starts_at: string;
  ends_at: string;
  cancelled_at: string | null;
  therapist_name: string;
  room_name: string;
  zone: string;
}

const readRhythm = (value: CourseRhythm | string): CourseRhythm =>
  typeof value === "string" ? (JSON.parse(value) as CourseRhythm) : value;

function readHeads(ctx: Context, of: "id" | "patient_id", value: string): Promise<Head[]> {
  return rowsOf<Head>(
    ctx.db,
    sql`select c.id, c.version, c.rhythm, c.start_time, c.planned_visits, c.patient_id,
        concat(p.given_name, ' ', p.family_name) as patient_name, c.service_id, v.name as service_name,
        c.therapist_id, concat(t.given_name, ' ', t.family_name) as therapist_name,
        c.site_id, s.name as site_name, s.zone
      from courses c
        join patients p on p.practice_id = c.practice_id and p.id = c.patient_id
        join services v on v.practice_id = c.practice_id and v.id = c.service_id
        join staff_members t on t.practice_id = c.practice_id and t.id = c.therapist_id
        join sites s on s.practice_id = c.practice_id and s.id = c.site_id
      where c.practice_id = ${ctx.practiceId} and ${of === "id" ? sql`c.id` : sql`c.patient_id`} = ${value}
      order by c.created_at desc, c.id desc`,
  );
}

async function readVisits(ctx: Context, courseIds: readonly string[]): Promise<Visit[]> {
  if (courseIds.length === 0) return [];
  const ids = sql.join(
    courseIds.map((id) => sql`${id}`),
    sql`, `,
  );
  return rowsOf<Visit>(
    ctx.db,
    sql`select a.course_id, a.id, a.version, a.state, a.site_id, a.starts_at, a.ends_at, a.cancelled_at, s.zone,
        concat(t.given_name, ' ', t.family_name) as therapist_name, r.name as room_name
      from appointments a
        join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
        join rooms r on r.practice_id = a.practice_id and r.id = a.room_id
        join sites s on s.practice_id = a.practice_id and s.id = a.site_id
      where a.practice_id = ${ctx.practiceId} and a.course_id in (${ids})
      order by a.starts_at, a.id`,
  );
}

const isStillToCome = (row: Visit, now: number): boolean =>
  (row.state === "booked" || row.state === "confirmed") && utc(row.starts_at) > now;

function visitView(row: Visit, now: number): CourseVisit {
  const [start, end] = [new Date(utc(row.starts_at)), new Date(utc(row.ends_at))];
  return {
    ...{ id: row.id, version: row.version, state: row.state },
    ...{ day: dayOf(start, row.zone), startTime: timeOf(start, row.zone), endTime: timeOf(end, row.zone) },
    ...{ therapistName: row.therapist_name, roomName: row.room_name },
    isRest: isStillToCome(row, now),
  };
}

/** How many visits were cancelled in the course's last cancelling: those of one instant. */
function lastCancelled(visits: readonly Visit[]): number {
  const instants = visits.flatMap((v) => (v.state === "cancelled" && v.cancelled_at ? [v.cancelled_at] : []));
  const last = instants.sort().at(-1);
  return instants.filter((at) => at === last).length;
}

/** The course with its visits, or not-found. */
export async function readCourse(ctx: Context, courseId: string): Promise<CourseView> {
  const [head] = await readHeads(ctx, "id", courseId);
  if (!head) throw notFound("course");
  requireReach(ctx, "diary.read", head.site_id, "course");
  const visits = await readVisits(ctx, [head.id]);
  const now = ctx.clock.now().getTime();
  const mayCancel = can(ctx.roles, "diary.cancel", head.site_id);
  return {
    ...{ id: head.id, version: head.version },
    patient: { id: head.patient_id, name: head.patient_name },
    service: { id: head.service_id, name: head.service_name },
    therapist: { id: head.therapist_id, name: head.therapist_name },
    site: { id: head.site_id, name: head.site_name, zone: head.zone },
    rhythm: readRhythm(head.rhythm),
    startTime: head.start_time.slice(0, 5),
    plannedVisits: head.planned_visits,
    visits: visits.map((row) => visitView(row, now)),
    undoableVisits: mayCancel ? lastCancelled(visits) : 0,
    may: { book: can(ctx.roles, "diary.book", head.site_id), cancel: mayCancel },
  };
}

/** The patient's courses at sites within reach, newest first. */
export async function readCoursesOf(ctx: Context, patientId: string): Promise<CourseRow[]> {
  const heads = (await readHeads(ctx, "patient_id", patientId)).filter((h) =>
    can(ctx.roles, "diary.read", h.site_id),
  );
  const visits = await readVisits(
    ctx,
    heads.map((h) => h.id),
  );
  const now = ctx.clock.now().getTime();
  return heads.map((h) => {
    const own = visits.filter((v) => v.course_id === h.id && v.state !== "cancelled");
    const dayAt = (row: Visit | undefined): string | null =>
      row ? dayOf(new Date(utc(row.starts_at)), row.zone) : null;
    return {
      ...{ id: h.id, serviceName: h.service_name, therapistName: h.therapist_name },
      ...{
        rhythm: readRhythm(h.rhythm),
        startTime: h.start_time.slice(0, 5),
        plannedVisits: h.planned_visits,
      },
      ...{ firstDay: dayAt(own[0]), lastDay: dayAt(own.at(-1)) },
      restVisits: own.filter((v) => isStillToCome(v, now)).length,
    };
  });
}
