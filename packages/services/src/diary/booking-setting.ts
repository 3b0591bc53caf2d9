import { notFound } from "@withy/core/errors";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { jsonList, rowsOf } from "./raw-rows";
import type { VisitNames } from "./visit-row";

/** Who, what and where of a visit, all of the caller's practice. */
export interface BookingSetting {
  readonly site: { readonly id: string; readonly name: string; readonly zone: string };
  readonly therapist: {
    readonly id: string;
    readonly name: string;
    readonly isActive: boolean;
    readonly givesService: boolean;
  };
  readonly service: {
    readonly id: string;
    readonly name: string;
    readonly durationMinutes: number;
    readonly cleanDownMinutes: number;
    readonly roomKind: string;
    readonly needsEquipment: readonly string[];
    readonly isActive: boolean;
  };
  readonly room: {
    readonly id: string;
    readonly name: string;
    readonly siteId: string;
    readonly kind: string;
    readonly equipment: readonly string[];
    readonly isStepFree: boolean;
  } | null;
  readonly patient: { readonly id: string; readonly name: string };
  /** What stands beside the visit once it is booked; the room's name is the chosen room's. */
  readonly names: Omit<VisitNames, "room_name">;
}

export interface BookingIds {
  readonly siteId: string;
  readonly therapistId: string;
  readonly serviceId: string;
  readonly roomId: string | null;
  readonly patientId: string;
  readonly episodeId: string | null;
}

interface Row extends VisitNames {
  site_id: string | null;
  therapist_id: string | null;
  therapist_active: number;
  gives: number;
  service_id: string | null;
  duration_minutes: number;
  clean_down_minutes: number;
  room_kind: string;
  needs_equipment: string | string[];
  service_active: number;
  room_id: string | null;
  room_site: string;
  kind: string;
  equipment: string | string[];
  is_step_free: number;
  patient_id: string | null;
  episode_id: string | null;
}

/** Everything that a booking names, in one statement; whatever is not in the practice is not there. */
async function readRow(ctx: Context, ids: BookingIds): Promise<Row | undefined> {
  const p = ctx.practiceId;
  const rows = await rowsOf<Row>(
    ctx.db,
    sql`
    select s.id as site_id, s.name as site_name, s.zone, s.address_lines, s.postcode as site_postcode,
      s.phone as site_phone, x.notice_hours, x.name as practice_name, x.email as practice_email,
      x.phone as practice_phone, t.job_title, v.kind as service_kind,
      c.given_name, c.preferred_name, c.born_on, c.phone, c.email, c.communication_needs,
      t.id as therapist_id, concat(t.given_name, ' ', t.family_name) as therapist_name,
      (t.is_active and t.is_therapist) as therapist_active, (g.service_id is not null) as gives,
      v.id as service_id, v.name as service_name, v.duration_minutes, v.clean_down_minutes, v.room_kind, v.needs_equipment,
      v.is_active as service_active,
      r.id as room_id, r.name as room_name, r.site_id as room_site, r.kind, r.equipment, r.is_step_free,
      c.id as patient_id, concat(c.given_name, ' ', c.family_name) as patient_name,
      e.id as episode_id
    from practices x
      left join sites s on s.practice_id = x.id and s.id = ${ids.siteId}
      left join staff_members t on t.practice_id = x.id and t.id = ${ids.therapistId}
      left join services v on v.practice_id = x.id and v.id = ${ids.serviceId}
      left join service_therapists g on g.practice_id = x.id and g.service_id = v.id and g.staff_member_id = t.id
      left join rooms r on r.practice_id = x.id and r.id = ${ids.roomId}
      left join patients c on c.practice_id = x.id and c.id = ${ids.patientId}
      left join episodes e on e.practice_id = x.id and e.id = ${ids.episodeId} and e.patient_id = c.id
    where x.id = ${p}`,
  );
  return rows[0];
}

function namesIn(row: Row): BookingSetting["names"] {
  const { site_name, zone, address_lines, site_postcode, site_phone, therapist_name, job_title } = row;
  const { service_name, service_kind, room_kind, patient_name, given_name, preferred_name } = row;
  const { born_on, phone, email, communication_needs } = row;
  const { notice_hours, practice_name, practice_email, practice_phone } = row;
  return {
    ...{ site_name, zone, address_lines, site_postcode, site_phone, therapist_name, job_title },
    ...{ service_name, service_kind, room_kind, patient_name, given_name, preferred_name },
    ...{ born_on, phone, email, communication_needs },
    ...{ notice_hours, practice_name, practice_email, practice_phone },
  };
}

/** @throws not-found for the first of the ids that is not the practice's */
export async function loadBookingSetting(ctx: Context, ids: BookingIds): Promise<BookingSetting> {
  const row = await readRow(ctx, ids);
  if (!row?.site_id) throw notFound("site");
  if (!row.patient_id) throw notFound("patient");
  if (!row.service_id) throw notFound("service");
  if (!row.therapist_id) throw notFound("therapist");
  if (ids.roomId !== null && !row.room_id) throw notFound("room");
  if (ids.episodeId !== null && !row.episode_id) throw notFound("episode of care");
  return {
    site: { id: row.site_id, name: row.site_name, zone: row.zone },
    therapist: {
      id: row.therapist_id,
      name: row.therapist_name,
      isActive: row.therapist_active === 1,
      givesService: row.gives === 1,
    },
    service: {
      id: row.service_id,
      name: row.service_name,
      durationMinutes: row.duration_minutes,
      cleanDownMinutes: row.clean_down_minutes,
      roomKind: row.room_kind,
      needsEquipment: jsonList(row.needs_equipment),
      isActive: row.service_active === 1,
    },
    room: row.room_id
      ? {
          ...{ id: row.room_id, name: row.room_name, siteId: row.room_site, kind: row.kind },
          ...{ equipment: jsonList(row.equipment), isStepFree: row.is_step_free === 1 },
        }
      : null,
    patient: { id: row.patient_id, name: row.patient_name },
    names: namesIn(row),
  };
}
