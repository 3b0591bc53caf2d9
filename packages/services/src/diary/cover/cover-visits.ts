import type { AppointmentStateCode } from "@withy/db/schema";
import type { CoverVisit } from "@withy/diary/cover/cover-problem";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../../context";
import { rowsOf, sqlTime, utc } from "../raw-rows";

/** What a plan is made for: a therapist away or a room shut. */
export interface CoverCause {
  readonly therapistId: string | null;
  readonly roomId: string | null;
  readonly from: Date;
  readonly to: Date;
}

/** A visit as the programme takes it, with what applying the plan must know. */
export interface AffectedVisit extends CoverVisit {
  readonly version: number;
  readonly state: AppointmentStateCode;
  readonly patientId: string;
}

interface Row {
  id: string;
  version: number;
  state: AppointmentStateCode;
  patient_id: string;
  site_id: string;
  therapist_id: string;
  room_id: string;
  starts_at: string;
  ends_at: string;
  clean_down_minutes: number;
  course_id: string | null;
  room_kind: string;
  needs_equipment: string[] | string;
  gives: string | null;
  seen_by: string | null;
}

const idsOf = (text: string | null): string[] => (text === null || text === "" ? [] : text.split(","));

function visitOf(row: Row): AffectedVisit {
  const [startsAt, endsAt] = [utc(row.starts_at), utc(row.ends_at)];
  const equipment = row.needs_equipment;
  return {
    id: row.id,
    version: row.version,
    state: row.state,
    patientId: row.patient_id,
    patientIds: [row.patient_id],
    startsAt,
    durationMinutes: (endsAt - startsAt) / 60_000,
    cleanDownMinutes: row.clean_down_minutes,
    siteId: row.site_id,
    therapistId: row.therapist_id,
    roomId: row.room_id,
    therapistIds: idsOf(row.gives),
    roomKind: row.room_kind,
    needsEquipment: typeof equipment === "string" ? (JSON.parse(equipment) as string[]) : equipment,
    seenBy: idsOf(row.seen_by),
    isInCourse: row.course_id !== null,
  };
}

async function readVisits(ctx: Context, where: SQL): Promise<AffectedVisit[]> {
  const rows = await rowsOf<Row>(
    ctx.db,
    sql`select a.id, a.version, a.state, a.patient_id, a.site_id, a.therapist_id, a.room_id, a.starts_at, a.ends_at,
        a.clean_down_minutes, a.course_id, v.room_kind, v.needs_equipment,
        (select group_concat(g.staff_member_id) from service_therapists g join staff_members m
          on m.practice_id = g.practice_id and m.id = g.staff_member_id and m.is_active and m.is_therapist
          where g.practice_id = a.practice_id and g.service_id = a.service_id) as gives,
        (select group_concat(distinct b.therapist_id) from appointments b
          where b.practice_id = a.practice_id and b.patient_id = a.patient_id and b.state = 'fulfilled') as seen_by
      from appointments a join services v on v.practice_id = a.practice_id and v.id = a.service_id
      where a.practice_id = ${ctx.practiceId} and ${where} order by a.starts_at, a.id`,
  );
  return rows.map(visitOf);
}

/** Visits still to come that fall into the absence. What has begun or is over stays as it is. */
export function readAffected(ctx: Context, cause: CoverCause): Promise<AffectedVisit[]> {
  const whose =
    cause.therapistId === null
      ? sql`a.room_id = ${cause.roomId}`
      : sql`a.therapist_id = ${cause.therapistId}`;
  const now = sqlTime(ctx.clock.now());
  return readVisits(
    ctx,
    sql`${whose} and a.state in ('booked', 'confirmed') and a.starts_at < ${sqlTime(cause.to)}
      and a.ends_at > ${sqlTime(cause.from)} and a.starts_at > ${now}`,
  );
}

export async function readVisitsById(ctx: Context, ids: readonly string[]): Promise<AffectedVisit[]> {
  if (ids.length === 0) return [];
  const list = sql.join(
    ids.map((id) => sql`${id}`),
    sql`, `,
  );
  return readVisits(ctx, sql`a.id in (${list})`);
}

/** Classes of the therapist or in the room in that time. */
export async function countClasses(ctx: Context, cause: CoverCause): Promise<number> {
  const whose =
    cause.therapistId === null
      ? sql`k.room_id = ${cause.roomId}`
      : sql`k.therapist_id = ${cause.therapistId}`;
  const [row] = await rowsOf<{ n: number | string }>(
    ctx.db,
    sql`select count(*) as n from class_sessions k where k.practice_id = ${ctx.practiceId} and ${whose}
      and k.state = 'booked' and k.starts_at < ${sqlTime(cause.to)} and k.ends_at > ${sqlTime(cause.from)}`,
  );
  return Number(row?.n ?? 0);
}
