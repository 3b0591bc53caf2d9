import { type FreedTimeRow, listFreedTimesInput } from "@withy/contracts/diary";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { sql } from "drizzle-orm";
import { verb } from "../verb";
import { isoOf, rowsOf, sqlTime, utc } from "./raw-rows";
import { reachableSites, readableSites } from "./site-reach";

/** What was freed longer ago has been seen, or found other use. */
const sinceDays = 7;
const most = 8;

interface Row {
  appointment_id: string;
  kind: "cancelled" | "moved";
  site_id: string;
  site_name: string;
  zone: string;
  therapist_id: string;
  therapist_name: string;
  starts_at: string;
  ends_at: string;
}

/**
 * Times to come that a visit gave back when it was cancelled or moved away, soonest first: only while the therapist is
 * still free then and the time is not on offer.
 */
export const listFreedTimes = verb(
  "diary.read",
  listFreedTimesInput,
  async (ctx, { siteIds }): Promise<FreedTimeRow[]> => {
    const sites =
      siteIds.length > 0 ? await readableSites(ctx, siteIds) : await reachableSites(ctx, "diary.read");
    if (sites.length === 0) return [];
    const now = ctx.clock.now();
    const since = new Date(now.getTime() - sinceDays * 86_400_000);
    const at = sql`cast(replace(replace(json_value(c.before, '$.startsAt'), 'T', ' '), 'Z', '') as datetime(3))`;
    const until = sql`cast(replace(replace(json_value(c.before, '$.endsAt'), 'T', ' '), 'Z', '') as datetime(3))`;
    const ids = sql.join(
      sites.map((id) => sql`${id}`),
      sql`, `,
    );
    const rows = await rowsOf<Row>(
      ctx.db,
      sql`select f.appointment_id, f.kind, f.site_id, s.name as site_name, s.zone, f.therapist_id,
          concat(t.given_name, ' ', t.family_name) as therapist_name, f.starts_at, f.ends_at
        from (select c.appointment_id, c.kind, json_value(c.before, '$.siteId') as site_id,
            json_value(c.before, '$.therapistId') as therapist_id, ${at} as starts_at, ${until} as ends_at, c.id
          from appointment_changes c
          where c.practice_id = ${ctx.practiceId} and c.site_id in (${ids}) and c.changed_at > ${sqlTime(since)}
            and c.kind in ('cancelled', 'moved') and c.undone_at is null) f
          join sites s on s.practice_id = ${ctx.practiceId} and s.id = f.site_id and s.id in (${ids})
          join staff_members t on t.practice_id = ${ctx.practiceId} and t.id = f.therapist_id and t.is_active
        where f.starts_at > ${sqlTime(now)}
          and not exists (select 1 from diary_claims k where k.practice_id = ${ctx.practiceId}
            and k.resource_id = f.therapist_id and k.slot_at = f.starts_at)
          and not exists (select 1 from absences b where b.practice_id = ${ctx.practiceId}
            and b.staff_member_id = f.therapist_id and b.starts_at <= f.starts_at and b.ends_at > f.starts_at)
          and not exists (select 1 from offer_rounds r where r.practice_id = ${ctx.practiceId} and r.state = 'open'
            and r.therapist_id = f.therapist_id and r.starts_at = f.starts_at)
        order by f.starts_at, f.id desc limit ${most * 4}`,
    );
    const isLatest = (row: Row, n: number): boolean =>
      rows.findIndex((r) => r.starts_at === row.starts_at && r.therapist_id === row.therapist_id) === n;
    return rows
      .filter(isLatest)
      .slice(0, most)
      .map((row) => ({
        appointmentId: row.appointment_id,
        how: row.kind,
        siteId: row.site_id,
        siteName: row.site_name,
        therapistId: row.therapist_id,
        therapistName: row.therapist_name,
        startsAt: isoOf(row.starts_at),
        day: dayOf(new Date(utc(row.starts_at)), row.zone),
        startTime: timeOf(new Date(utc(row.starts_at)), row.zone),
        minutes: (utc(row.ends_at) - utc(row.starts_at)) / 60_000,
      }));
  },
);
