import { dayBounds, dayOf, type PlainDateText } from "@withy/core/zoned-time";
import { type ScheduleFacts, scheduleResource } from "@withy/documents/fhir/resources";
import { readScheduleId, scheduleId } from "@withy/documents/fhir/schedule-id";
import { sql } from "drizzle-orm";
import { rowsOf } from "../raw-rows";
import type { KeyContext } from "./open-by-key";
import { type FhirQuery, strangePage } from "./read-query";

interface Row {
  readonly therapist_id: string;
  readonly site_id: string;
  readonly therapist_name: string;
  readonly site_name: string;
  readonly zone: string;
  readonly first_day: PlainDateText;
  readonly last_day: PlainDateText | null;
}

export interface PracticeSchedule extends ScheduleFacts {
  readonly zone: string;
}

/** Every therapist at every site where they work now or will, in the diary's own order. */
export async function readSchedules(ctx: KeyContext): Promise<PracticeSchedule[]> {
  const today = dayOf(ctx.clock.now(), ctx.zone);
  const rows = await rowsOf<Row>(
    ctx.db,
    sql`
    select w.staff_member_id as therapist_id, w.site_id, concat(m.given_name, ' ', m.family_name) as therapist_name,
      s.name as site_name, s.zone, date_format(min(w.valid_from), '%Y-%m-%d') as first_day,
      if(count(*) > count(w.valid_until), null, date_format(max(w.valid_until), '%Y-%m-%d')) as last_day
    from working_patterns w
      join staff_members m on m.practice_id = w.practice_id and m.id = w.staff_member_id
      join sites s on s.practice_id = w.practice_id and s.id = w.site_id
    where w.practice_id = ${ctx.practiceId} and m.is_active and m.is_therapist
      and (w.valid_until is null or w.valid_until >= ${today})
    group by w.staff_member_id, w.site_id, m.given_name, m.family_name, m.position, s.name, s.zone, s.position
    order by m.position, s.position, w.staff_member_id, w.site_id`,
  );
  return rows.map((row) => ({
    therapistId: row.therapist_id,
    siteId: row.site_id,
    therapistName: row.therapist_name,
    siteName: row.site_name,
    zone: row.zone,
    from: dayBounds(row.first_day, row.zone).from,
    to: row.last_day === null ? null : dayBounds(row.last_day, row.zone).to,
  }));
}

/** Those that a search names by therapist, site or their own id. */
export function schedulesAsked(all: readonly PracticeSchedule[], q: FhirQuery): PracticeSchedule[] {
  return all.filter(
    (one) =>
      (q.practitioners === null || q.practitioners.includes(one.therapistId)) &&
      (q.locations === null || q.locations.includes(one.siteId)) &&
      (q.schedules === null || q.schedules.includes(scheduleId(one))),
  );
}

/** One page of schedules; a date asks for those whose working time reaches into it. */
export async function searchSchedules(ctx: KeyContext, q: FhirQuery) {
  const skip = q.after === null ? 0 : /^\d{1,6}$/.test(q.after) ? Number(q.after) : -1;
  if (skip < 0) throw strangePage();
  const found = schedulesAsked(await readSchedules(ctx), q).filter(
    ({ from, to }) =>
      (q.to === null || from.getTime() < q.to) && (q.from === null || to === null || to.getTime() > q.from),
  );
  const end = skip + q.count;
  return {
    resources: found.slice(skip, end).map(scheduleResource),
    after: found.length > end ? String(end) : null,
  };
}

/** The schedule of an id, inside the practice. */
export async function findSchedule(ctx: KeyContext, id: string): Promise<PracticeSchedule | null> {
  if (readScheduleId(id) === null) return null;
  return (await readSchedules(ctx)).find((one) => scheduleId(one) === id) ?? null;
}

export async function readScheduleResource(ctx: KeyContext, id: string) {
  const found = await findSchedule(ctx, id);
  return found ? scheduleResource(found) : null;
}
