import { holdingStates } from "@withy/diary/appointment-states";
import type { Interval } from "@withy/diary/interval";
import type { Waiting, WaitingWishes } from "@withy/diary/waiting-match";
import type { Urgency } from "@withy/diary/waiting-words";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import type { OfferableTime } from "./freed-time";
import { jsonList, rowsOf, sqlTime, utc } from "./raw-rows";

interface Row {
  id: string;
  patient_id: string;
  patient_name: string;
  phone: string | null;
  email: string | null;
  preferred_channel: "email" | "text" | "phone" | "post";
  wishes: WaitingWishes | string;
  urgency: Urgency;
  waiting_since: string;
  desk_note: string | null;
  service_id: string;
  service_name: string;
  duration_minutes: number;
  clean_down_minutes: number;
  room_kind: string;
  needs_equipment: string | string[];
  gives: number;
  instead_of_id: string | null;
  instead_of_at: string | null;
  has_offer: number;
}

/** Someone who waits, for the rule and for the screen. */
export interface Candidate extends Waiting {
  readonly patientId: string;
  readonly patientName: string;
  readonly phone: string | null;
  readonly email: string | null;
  readonly preferredChannel: Row["preferred_channel"];
  readonly serviceId: string;
  readonly deskNote: string | null;
}

const list = (values: readonly string[]): SQL =>
  sql.join(
    values.map((v) => sql`${v}`),
    sql`, `,
  );

const openStates = ["booked", "confirmed"];

function waitingSql(practiceId: string, therapistId: string, now: Date, only: readonly string[] | null): SQL {
  return sql`
    select e.id, e.patient_id, concat(p.given_name, ' ', p.family_name) as patient_name, p.phone, p.email,
      p.preferred_channel, e.wishes, e.urgency, e.waiting_since, e.desk_note,
      v.id as service_id, v.name as service_name, v.duration_minutes, v.clean_down_minutes, v.room_kind, v.needs_equipment,
      (v.is_active and g.service_id is not null) as gives, i.id as instead_of_id, i.starts_at as instead_of_at,
      exists (select 1 from waiting_offers o join offer_rounds r on r.practice_id = o.practice_id and r.id = o.round_id
        where o.practice_id = e.practice_id and o.entry_id = e.id and o.state = 'open' and r.state = 'open'
          and r.expires_at > ${sqlTime(now)}) as has_offer
    from waiting_entries e
      join patients p on p.practice_id = e.practice_id and p.id = e.patient_id
      join services v on v.practice_id = e.practice_id and v.id = e.service_id
      left join service_therapists g on g.practice_id = e.practice_id and g.service_id = e.service_id
        and g.staff_member_id = ${therapistId}
      left join appointments i on i.practice_id = e.practice_id and i.id = e.instead_of_id
        and i.state in (${list(openStates)}) and i.starts_at > ${sqlTime(now)}
    where e.practice_id = ${practiceId} and e.state = 'waiting'
      ${only === null ? sql`` : sql`and e.id in (${list(only)})`}
    order by e.waiting_since, e.id`;
}

/** The visits that the people have around the time, by patient; no visit lasts a day. */
async function readBusy(
  ctx: Context,
  patientIds: readonly string[],
  time: OfferableTime,
): Promise<Map<string, (Interval & { id: string })[]>> {
  const busy = new Map<string, (Interval & { id: string })[]>();
  if (patientIds.length === 0) return busy;
  const earliest = new Date(time.startsAt.getTime() - 24 * 3_600_000);
  const rows = await rowsOf<{ id: string; patient_id: string; starts_at: string; ends_at: string }>(
    ctx.db,
    sql`select a.id, a.patient_id, a.starts_at, a.ends_at from appointments a
      where a.practice_id = ${ctx.practiceId} and a.patient_id in (${list(patientIds)})
        and a.starts_at > ${sqlTime(earliest)} and a.starts_at < ${sqlTime(time.freeUntil)}
        and a.ends_at > ${sqlTime(time.startsAt)} and a.state in (${list(holdingStates)})`,
  );
  for (const row of rows) {
    const known = busy.get(row.patient_id) ?? [];
    busy.set(row.patient_id, known);
    known.push({ id: row.id, from: utc(row.starts_at), to: utc(row.ends_at) });
  }
  return busy;
}

/** Everyone who waits, or those named, with what the time means for each. */
export async function readWaiting(
  ctx: Context,
  time: OfferableTime,
  only: readonly string[] | null = null,
): Promise<Candidate[]> {
  const query = waitingSql(ctx.practiceId, time.therapist.id, ctx.clock.now(), only);
  const rows = await rowsOf<Row>(ctx.db, query);
  const busy = await readBusy(ctx, [...new Set(rows.map((row) => row.patient_id))], time);
  return rows.map((row) => ({
    entryId: row.id,
    patientId: row.patient_id,
    patientName: row.patient_name,
    phone: row.phone,
    email: row.email,
    preferredChannel: row.preferred_channel,
    serviceId: row.service_id,
    deskNote: row.desk_note,
    wishes: typeof row.wishes === "string" ? (JSON.parse(row.wishes) as WaitingWishes) : row.wishes,
    urgency: row.urgency,
    since: new Date(utc(row.waiting_since)),
    service: {
      name: row.service_name,
      durationMinutes: row.duration_minutes,
      cleanDownMinutes: row.clean_down_minutes,
    },
    isGivenByTherapist: row.gives === 1,
    hasRoom: time.hasRoom(
      { kind: row.room_kind, equipment: jsonList(row.needs_equipment), isStepFree: false },
      row.duration_minutes + row.clean_down_minutes,
    ),
    insteadOfAt: row.instead_of_at === null ? null : new Date(utc(row.instead_of_at)),
    busy: (busy.get(row.patient_id) ?? []).filter((visit) => visit.id !== row.instead_of_id),
    hasOffer: row.has_offer === 1,
  }));
}
