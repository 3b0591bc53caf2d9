import type { LiveChange } from "@withy/contracts/diary";
import { sql } from "drizzle-orm";
import type { Context } from "../../context";
import { rowsOf, sqlTime } from "../raw-rows";
import { presenceSeconds } from "./live-limits";

type Db = Context["db"];

export interface ChangeRow extends LiveChange {
  /** When its id was made, in milliseconds since the epoch. */
  readonly madeAt: number;
}

/** The earliest id of version 7 that this millisecond can have. */
export function earliestId(ms: number): string {
  const hex = Math.max(0, Math.floor(ms)).toString(16).padStart(12, "0");
  return `${hex.slice(0, 8)}-${hex.slice(8)}-7000-8000-000000000000`;
}

/** The millisecond that an id of version 7 was made in. */
export const madeAt = (id: string): number => Number.parseInt(id.slice(0, 8) + id.slice(9, 13), 16);

/** Every change of the practice whose id was made at or after the millisecond, along the primary key. */
export async function readChanges(db: Db, practiceId: string, fromMs: number): Promise<ChangeRow[]> {
  const rows = await rowsOf<{
    id: string;
    kind: LiveChange["kind"];
    appointment_id: string;
    site_id: string;
    therapist_id: string;
    starts_at: string;
  }>(
    db,
    sql`select c.id, c.kind, c.appointment_id, c.site_id, json_value(c.after, '$.therapistId') as therapist_id,
        json_value(c.after, '$.startsAt') as starts_at
      from appointment_changes c
      where c.practice_id = ${practiceId} and c.id >= ${earliestId(fromMs)} order by c.id`,
  );
  return rows.map((row) => ({
    id: row.id,
    kind: row.kind,
    appointmentId: row.appointment_id,
    siteId: row.site_id,
    therapistId: row.therapist_id,
    startsAt: row.starts_at,
    madeAt: madeAt(row.id),
  }));
}

/** What is held and looked at now, each as one text by place: another text means that something is different. */
export interface Around {
  /** By site. */
  readonly holds: ReadonlyMap<string, string>;
  /** By appointment, with its site. */
  readonly presence: ReadonlyMap<string, { readonly siteId: string; readonly text: string }>;
}

export async function readAround(db: Db, practiceId: string, now: Date): Promise<Around> {
  const seenSince = new Date(now.getTime() - presenceSeconds * 1000);
  const rows = await rowsOf<{ kind: "hold" | "presence"; place: string; site_id: string; text: string }>(
    db,
    sql`select 'hold' as kind, h.site_id as place, h.site_id,
        group_concat(h.held_by, ' ', h.therapist_id, ' ', h.starts_at, ' ', h.ends_at order by h.id) as text
      from diary_holds h where h.practice_id = ${practiceId} and h.expires_at > ${sqlTime(now)} group by h.site_id
      union all select 'presence', p.appointment_id, a.site_id,
        group_concat(p.staff_member_id, ' ', p.is_editing order by p.staff_member_id)
      from diary_presence p join appointments a on a.practice_id = p.practice_id and a.id = p.appointment_id
      where p.practice_id = ${practiceId} and p.seen_at > ${sqlTime(seenSince)} group by p.appointment_id, a.site_id`,
  );
  const of = (kind: string) => rows.filter((row) => row.kind === kind);
  return {
    holds: new Map(of("hold").map((row) => [row.place, row.text])),
    presence: new Map(of("presence").map((row) => [row.place, { siteId: row.site_id, text: row.text }])),
  };
}
