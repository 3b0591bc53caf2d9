import { notFound } from "@withy/core/errors";
import type { appointments } from "@withy/db/schema";
import type { AppointmentState } from "@withy/diary/appointment-states";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { rowsOf, sqlTime } from "./raw-rows";

/** One visit with the names that stand beside it, as the database gives it. */
export interface VisitRow {
  readonly id: string;
  readonly version: number;
  readonly state: AppointmentState;
  readonly site_id: string;
  readonly site_name: string;
  readonly zone: string;
  readonly address_lines: string[] | string;
  readonly site_postcode: string;
  readonly site_phone: string;
  readonly therapist_id: string;
  readonly therapist_name: string;
  readonly job_title: string;
  readonly room_id: string;
  readonly room_name: string;
  readonly service_id: string;
  readonly service_name: string;
  readonly service_kind: "initial" | "follow-up" | "other";
  readonly room_kind: string;
  readonly patient_id: string;
  readonly patient_name: string;
  readonly given_name: string;
  readonly preferred_name: string | null;
  readonly born_on: string;
  readonly phone: string | null;
  readonly email: string | null;
  readonly communication_needs: string | null;
  readonly episode_id: string | null;
  readonly course_id: string | null;
  readonly starts_at: string;
  readonly ends_at: string;
  readonly clean_down_minutes: number;
  readonly desk_note: string | null;
  readonly override_reason: string | null;
  readonly arrived_at: string | null;
  readonly session_started_at: string | null;
  readonly session_ended_at: string | null;
  readonly cancelled_at: string | null;
  readonly cancelled_by: "patient" | "clinic" | null;
  readonly cancel_reason: string | null;
  readonly is_late_cancellation: number;
  readonly notice_hours: number;
  readonly practice_name: string;
  readonly practice_email: string;
  readonly practice_phone: string;
}

/** What stands beside a visit's own columns: names, addresses, the practice's words. */
export type VisitNames = Omit<VisitRow, OwnColumn>;

type OwnColumn =
  | "id"
  | "version"
  | "state"
  | "site_id"
  | "therapist_id"
  | "room_id"
  | "service_id"
  | "patient_id"
  | "episode_id"
  | "course_id"
  | "starts_at"
  | "ends_at"
  | "clean_down_minutes"
  | "desk_note"
  | "override_reason"
  | "arrived_at"
  | "session_started_at"
  | "session_ended_at"
  | "cancelled_at"
  | "cancelled_by"
  | "cancel_reason"
  | "is_late_cancellation";

/** A visit that is just being booked, put together from what was read for it rather than read again. */
export function newVisitRow(row: typeof appointments.$inferSelect, names: VisitNames): VisitRow {
  return {
    ...names,
    id: row.id,
    version: row.version,
    state: row.state,
    site_id: row.siteId,
    therapist_id: row.therapistId,
    room_id: row.roomId,
    service_id: row.serviceId,
    patient_id: row.patientId,
    episode_id: row.episodeId,
    course_id: row.courseId,
    starts_at: sqlTime(row.startsAt),
    ends_at: sqlTime(row.endsAt),
    clean_down_minutes: row.cleanDownMinutes,
    desk_note: row.deskNote,
    override_reason: row.overrideReason,
    ...{ arrived_at: null, session_started_at: null, session_ended_at: null },
    ...{ cancelled_at: null, cancelled_by: null, cancel_reason: null, is_late_cancellation: 0 },
  };
}

/** A visit of the practice with its names, or not-found. */
export async function readVisitRow(
  ctx: Pick<Context, "db" | "practiceId">,
  appointmentId: string,
): Promise<VisitRow> {
  const [row] = await rowsOf<VisitRow>(
    ctx.db,
    sql`
    select a.id, a.version, a.state, a.site_id, s.name as site_name, s.zone, s.address_lines,
      s.postcode as site_postcode, s.phone as site_phone,
      a.therapist_id, concat(t.given_name, ' ', t.family_name) as therapist_name, t.job_title,
      a.room_id, r.name as room_name,
      a.service_id, v.name as service_name, v.kind as service_kind, v.room_kind,
      a.patient_id, concat(p.given_name, ' ', p.family_name) as patient_name, p.given_name, p.preferred_name,
      p.born_on, p.phone, p.email, p.communication_needs, a.episode_id, a.course_id,
      a.starts_at, a.ends_at, a.clean_down_minutes, a.desk_note, a.override_reason,
      a.arrived_at, a.session_started_at, a.session_ended_at,
      a.cancelled_at, a.cancelled_by, a.cancel_reason, a.is_late_cancellation,
      x.notice_hours, x.name as practice_name, x.email as practice_email, x.phone as practice_phone
    from appointments a
      join practices x on x.id = a.practice_id
      join sites s on s.practice_id = a.practice_id and s.id = a.site_id
      join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
      join rooms r on r.practice_id = a.practice_id and r.id = a.room_id
      join services v on v.practice_id = a.practice_id and v.id = a.service_id
      join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
    where a.practice_id = ${ctx.practiceId} and a.id = ${appointmentId}`,
  );
  if (!row) throw notFound("appointment");
  return row;
}
