import { addDays, type PlainDateText } from "@withy/core/zoned-time";
import {
  type Busy,
  freeIntervals,
  openIntervals,
  withCleanDown,
  workingIntervals,
} from "@withy/diary/availability";
import { type DayClock, dayClock } from "@withy/diary/day-clock";
import type { Interval } from "@withy/diary/interval";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { type Frame, type FrameSite, readFrame } from "./frame";
import { rowsOf, sqlTime, utc } from "./raw-rows";

/** A therapist's days at one site with everything that decides what may be booked there. */
export interface TherapistDays {
  readonly frame: Frame;
  readonly site: FrameSite;
  readonly clocks: readonly DayClock[];
  readonly open: readonly Interval[];
  readonly working: readonly Interval[];
}

export async function readTherapistDays(
  ctx: Context,
  therapistId: string,
  site: { id: string; zone: string },
  day: PlainDateText,
  days = 1,
  exceptId: string | null = null,
): Promise<TherapistDays | null> {
  const dayNames = Array.from({ length: days }, (_, n) => addDays(day, n));
  const frame = await readFrame(ctx, {
    firstDay: day,
    lastDay: addDays(day, days - 1),
    siteIds: [site.id],
    therapistIds: [therapistId],
    awayOf: { therapistId, exceptId },
  });
  const found = frame.sites[0];
  if (!found) return null;
  const clocks = dayNames.map((d) => dayClock(d, site.zone));
  const open = openIntervals(
    { siteId: site.id, hours: found.hours, closedOn: new Set(found.closed.keys()) },
    clocks,
  );
  return {
    frame,
    site: found,
    clocks,
    open,
    working: workingIntervals(site.id, frame.patterns, open, clocks),
  };
}

/** What is claimed of one resource between two instants, as intervals of single slots. */
export async function readClaimed(
  ctx: Context,
  resourceIds: readonly string[],
  from: Date,
  to: Date,
  exceptId: string | null = null,
): Promise<Map<string, Busy[]>> {
  const taken = new Map<string, Busy[]>(resourceIds.map((id) => [id, []]));
  if (resourceIds.length === 0) return taken;
  const rows = await rowsOf<{ resource_id: string; slot_at: string }>(
    ctx.db,
    sql`select c.resource_id, c.slot_at from diary_claims c where c.practice_id = ${ctx.practiceId}
      and c.resource_id in (${sql.join(
        resourceIds.map((id) => sql`${id}`),
        sql`, `,
      )})
      and c.slot_at >= ${sqlTime(from)} and c.slot_at < ${sqlTime(to)}
      ${exceptId === null ? sql`` : sql`and not (c.appointment_id <=> ${exceptId})`}`,
  );
  for (const row of rows) {
    const at = utc(row.slot_at);
    taken.get(row.resource_id)?.push({ from: at, to: at + 300_000 });
  }
  return taken;
}

/** Free time of a therapist, with room for a clean-down at the end of working time. */
export function freeTime(days: TherapistDays, taken: readonly Busy[], cleanDownMinutes: number): Interval[] {
  const absences = days.frame.absences.filter((a) => a.staffMemberId !== null);
  const busy = [...taken, ...absences, ...days.frame.away];
  const working = withCleanDown(days.working, cleanDownMinutes);
  return freeIntervals(days.site.id, working, busy, days.frame.travel);
}
