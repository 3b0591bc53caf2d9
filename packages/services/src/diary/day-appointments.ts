import type { DayAppointment } from "@withy/contracts/diary";
import type { AppointmentState } from "@withy/diary/appointment-states";
import type { DayClock } from "@withy/diary/day-clock";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { rowsOf, sqlTime, utc } from "./raw-rows";

interface DayRow {
  id: string;
  version: number;
  state: AppointmentState;
  starts_at: string;
  ends_at: string;
  clean_down_minutes: number;
  site_id: string;
  therapist_id: string;
  therapist_name: string;
  room_id: string;
  room_name: string;
  patient_id: string;
  patient_name: string;
  service_id: string;
  service_name: string;
  service_kind: "initial" | "follow-up" | "other";
  has_desk_note: number;
}

/** A visit of a day with its instants as numbers, before it is laid on a clock. */
export interface DayVisit extends DayRow {
  readonly from: number;
  readonly to: number;
}

export type DayScope = { readonly siteIds: readonly string[] } | { readonly therapistId: string };

/**
 * The visits that touch a stretch of time, in order of their start. The start is bounded on both sides, so that the
 * index is read for these days alone however long the practice has been open; no visit lasts a day.
 */
export function dayAppointmentsSql(practiceId: string, scope: DayScope, from: Date, to: Date): SQL {
  const where =
    "therapistId" in scope
      ? sql`a.therapist_id = ${scope.therapistId}`
      : sql`a.site_id in (${sql.join(
          scope.siteIds.map((id) => sql`${id}`),
          sql`, `,
        )})`;
  const earliest = sqlTime(new Date(from.getTime() - 24 * 3_600_000));
  return sql`
    select straight_join a.id, a.version, a.state, a.starts_at, a.ends_at, a.clean_down_minutes, a.site_id,
      a.therapist_id, concat(t.given_name, ' ', t.family_name) as therapist_name,
      a.room_id, r.name as room_name,
      a.patient_id, concat(p.given_name, ' ', p.family_name) as patient_name,
      a.service_id, s.name as service_name, s.kind as service_kind,
      (a.desk_note is not null) as has_desk_note
    from appointments a
      join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
      join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
      join rooms r on r.practice_id = a.practice_id and r.id = a.room_id
      join services s on s.practice_id = a.practice_id and s.id = a.service_id
    where a.practice_id = ${practiceId} and ${where}
      and a.starts_at < ${sqlTime(to)} and a.starts_at >= ${earliest} and a.ends_at > ${sqlTime(from)}
    order by a.starts_at, a.id`;
}

export async function readDayVisits(
  ctx: Context,
  scope: DayScope,
  from: Date,
  to: Date,
): Promise<DayVisit[]> {
  const rows = await rowsOf<DayRow>(ctx.db, dayAppointmentsSql(ctx.practiceId, scope, from, to));
  return rows.map((row) => Object.assign(row, { from: utc(row.starts_at), to: utc(row.ends_at) }));
}

/** Lays a visit on the clock of its day. */
export function dayAppointment(row: DayVisit, clock: DayClock): DayAppointment {
  return {
    id: row.id,
    version: row.version,
    state: row.state,
    startsAt: new Date(row.from).toISOString(),
    endsAt: new Date(row.to).toISOString(),
    fromMinute: clock.wallOf(row.from),
    untilMinute: clock.wallOf(row.from) + (row.to - row.from) / 60_000,
    cleanDownMinutes: row.clean_down_minutes,
    siteId: row.site_id,
    therapistId: row.therapist_id,
    therapistName: row.therapist_name,
    roomId: row.room_id,
    roomName: row.room_name,
    patientId: row.patient_id,
    patientName: row.patient_name,
    serviceId: row.service_id,
    serviceName: row.service_name,
    serviceKind: row.service_kind,
    hasDeskNote: row.has_desk_note === 1,
  };
}
