import { addDays, dayOf } from "@withy/core/zoned-time";
import { openIntervals, workingIntervals } from "@withy/diary/availability";
import type { CoverLane, CoverProblem, CoverRoom, CoverVisit } from "@withy/diary/cover/cover-problem";
import { dayClocks } from "@withy/diary/day-clock";
import { type Interval, subtract, union } from "@withy/diary/interval";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../../context";
import { type Frame, readFrame } from "../frame";
import { rowsOf, sqlTime, utc } from "../raw-rows";
import { reachableSites } from "../site-reach";
import type { CoverCause } from "./cover-visits";

/** A week: whoever cannot be placed in it is better rung. */
const daysAfter = 7;
/** A patient must hear of a new time before setting out. */
const noticeMinutes = 60;

/** Time that somebody takes beside what the diary holds: a place promised to another visit of the same plan. */
export interface Promised extends Interval {
  readonly therapistId: string;
  readonly roomId: string;
  readonly siteId: string;
  readonly patientId: string;
}

export interface CoverQuery {
  readonly cause: CoverCause;
  readonly visits: readonly CoverVisit[];
  /** Visits whose present time counts as free: all of the plan. */
  readonly movingIds: readonly string[];
  readonly promised?: readonly Promised[];
}

interface TakenRow {
  t: string;
  r: string;
  p: string | null;
  s: string;
  a: string;
  b: string;
  c: number;
}

interface Held extends Interval {
  readonly siteId: string;
}

interface Taken {
  readonly byResource: ReadonlyMap<string, readonly Held[]>;
  readonly byPatient: ReadonlyMap<string, readonly Interval[]>;
}

const listOf = (ids: readonly string[]): SQL =>
  sql.join(
    ids.map((id) => sql`${id}`),
    sql`, `,
  );

/** Every visit and class of the practice that stands in the window, but for those to be moved. */
async function readTaken(ctx: Context, q: CoverQuery, from: Date, to: Date): Promise<Taken> {
  const earliest = sqlTime(new Date(from.getTime() - 24 * 3_600_000));
  const moving = q.movingIds.length === 0 ? sql`` : sql`and x.id not in (${listOf(q.movingIds)})`;
  const sites = sql`(select s.id from sites s where s.practice_id = ${ctx.practiceId})`;
  const rows = await rowsOf<TakenRow>(
    ctx.db,
    sql`select x.therapist_id as t, x.room_id as r, x.patient_id as p, x.site_id as s, x.starts_at as a, x.ends_at as b,
        x.clean_down_minutes as c from appointments x where x.practice_id = ${ctx.practiceId} and x.site_id in ${sites}
        and x.state <> 'cancelled' and x.starts_at < ${sqlTime(to)} and x.starts_at >= ${earliest} ${moving}
      union all select k.therapist_id, k.room_id, null, k.site_id, k.starts_at, k.ends_at, k.clean_down_minutes
        from class_sessions k where k.practice_id = ${ctx.practiceId} and k.site_id in ${sites}
        and k.state <> 'cancelled' and k.starts_at < ${sqlTime(to)} and k.starts_at >= ${earliest}`,
  );
  const [byResource, byPatient] = [new Map<string, Held[]>(), new Map<string, Interval[]>()];
  const add = <T>(map: Map<string, T[]>, id: string, one: T): void => {
    const list = map.get(id);
    if (list) list.push(one);
    else map.set(id, [one]);
  };
  for (const row of rows) {
    const busy = { from: utc(row.a), to: utc(row.b) + row.c * 60_000, siteId: row.s };
    add(byResource, row.t, busy);
    add(byResource, row.r, busy);
    if (row.p !== null) add(byPatient, row.p, { from: busy.from, to: utc(row.b) });
  }
  for (const { therapistId, roomId, patientId, ...busy } of q.promised ?? []) {
    add(byResource, therapistId, busy);
    add(byResource, roomId, busy);
    add(byPatient, patientId, busy);
  }
  return { byResource, byPatient };
}

/** Leave, blocks and the absence itself, by therapist or room. */
function absencesOf(frame: Frame, cause: CoverCause): Map<string, Interval[]> {
  const away = new Map<string, Interval[]>();
  const add = (id: string | null, i: Interval): void => {
    if (id !== null) away.set(id, [...(away.get(id) ?? []), i]);
  };
  for (const a of frame.absences) add(a.staffMemberId ?? a.roomId, a);
  add(cause.therapistId ?? cause.roomId, { from: cause.from.getTime(), to: cause.to.getTime() });
  return away;
}

/** What is known of a cover before anything is decided: everyone's hours and what has gone of them. */
export async function readCoverProblem(ctx: Context, q: CoverQuery): Promise<CoverProblem> {
  const starts = q.visits.map((v) => v.startsAt);
  const from = new Date(Math.min(...starts, q.cause.from.getTime()));
  const to = new Date(Math.max(...starts, from.getTime()) + (daysAfter + 1) * 86_400_000);
  const siteIds = await reachableSites(ctx, "diary.book");
  const days = { firstDay: dayOf(from, ctx.zone), lastDay: addDays(dayOf(to, ctx.zone), 1) };
  const [frame, taken] = await Promise.all([
    readFrame(ctx, { ...days, siteIds }),
    readTaken(ctx, q, from, to),
  ]);
  const away = absencesOf(frame, q.cause);
  const lanes: CoverLane[] = [];
  for (const site of frame.sites) {
    const clocks = dayClocks(from, to, site.zone);
    const opening = { siteId: site.id, hours: site.hours, closedOn: new Set(site.closed.keys()) };
    const open = openIntervals(opening, clocks);
    const here = frame.patterns.filter((p) => p.siteId === site.id);
    for (const therapistId of new Set(here.map((p) => p.staffMemberId))) {
      const patterns = here.filter((p) => p.staffMemberId === therapistId);
      const busy = (taken.byResource.get(therapistId) ?? []).map((b) => ({
        from: b.from - frame.travel(site.id, b.siteId) * 60_000,
        to: b.to + frame.travel(b.siteId, site.id) * 60_000,
      }));
      const working = workingIntervals(site.id, patterns, open, clocks);
      lanes.push({
        therapistId,
        siteId: site.id,
        working,
        taken: union([...busy, ...(away.get(therapistId) ?? [])]),
      });
    }
  }
  const whole: Interval[] = [{ from: from.getTime() - 86_400_000, to: to.getTime() }];
  const rooms = frame.rooms.map(
    ({ id, siteId, kind, equipment }): CoverRoom => ({
      ...{ id, siteId, kind, equipment },
      free: subtract(whole, union([...(taken.byResource.get(id) ?? []), ...(away.get(id) ?? [])])),
    }),
  );
  return {
    now: ctx.clock.now().getTime(),
    ...{ noticeMinutes, daysAfter, lanes, rooms },
    visits: q.visits,
    sites: frame.sites.map(({ id, zone }) => ({ id, zone })),
    patientBusy: taken.byPatient,
  };
}
