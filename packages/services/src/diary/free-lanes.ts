import { sitesWith } from "@withy/core/access/can";
import { dayOf } from "@withy/core/zoned-time";
import {
  type Busy,
  freeIntervals,
  openIntervals,
  withCleanDown,
  workingIntervals,
} from "@withy/diary/availability";
import { dayClocks } from "@withy/diary/day-clock";
import type { FindTimesInput } from "@withy/diary/found-times";
import { type Interval, intersect, subtract, union } from "@withy/diary/interval";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { type Frame, readFrame } from "./frame";
import { rowsOf, sqlTime, utc } from "./raw-rows";

interface LanesQuery {
  readonly from: Date;
  readonly to: Date;
  readonly siteIds: readonly string[];
  readonly therapistIds: readonly string[];
  readonly roomKind: string;
  readonly cleanDownMinutes: number;
  readonly movingId: string | null;
}

interface TakenRow {
  t: string;
  r: string;
  s: string;
  a: string;
  b: string;
  c: number;
}

const listOf = (ids: readonly string[]): SQL =>
  sql.join(
    ids.map((id) => sql`${id}`),
    sql`, `,
  );

type Lanes = Pick<FindTimesInput, "sites" | "therapists" | "free" | "rooms">;

/** Visits that hold time in the window, by therapist and by room; also the therapists' visits out of the reader's reach. */
async function readTaken(ctx: Context, q: LanesQuery): Promise<Map<string, Busy[]>> {
  const taken = new Map<string, Busy[]>();
  const add = (id: string, busy: Busy): void => {
    const list = taken.get(id);
    if (list) list.push(busy);
    else taken.set(id, [busy]);
  };
  const ids = listOf(q.siteIds);
  const earliest = sqlTime(new Date(q.from.getTime() - 24 * 3_600_000));
  const select = (where: SQL): SQL => sql`
    select x.therapist_id as t, x.room_id as r, x.site_id as s, x.starts_at as a, x.ends_at as b, x.clean_down_minutes as c
    from appointments x where x.practice_id = ${ctx.practiceId} and ${where} and x.state <> 'cancelled'
      and x.starts_at < ${sqlTime(q.to)} and x.starts_at >= ${earliest}
      ${q.movingId === null ? sql`` : sql`and x.id <> ${q.movingId}`}`;
  const here = select(sql`x.site_id in (${ids})`);
  const away = (): SQL =>
    select(sql`x.therapist_id in (${listOf(q.therapistIds)}) and x.site_id not in (${ids})`);
  const reachesAll = sitesWith(ctx.roles, "diary.book") === "all";
  const rows = await rowsOf<TakenRow>(ctx.db, reachesAll ? here : sql`${here} union all ${away()}`);
  for (const row of rows) {
    const busy = { from: utc(row.a), to: utc(row.b) + row.c * 60_000, siteId: row.s };
    add(row.t, busy);
    add(row.r, busy);
  }
  return taken;
}

function addAbsences(taken: Map<string, Busy[]>, frame: Frame): void {
  for (const a of frame.absences) {
    const id = a.staffMemberId ?? a.roomId ?? "";
    taken.set(id, [...(taken.get(id) ?? []), a]);
  }
}

/** Free time of every therapist and room that a search may use, from two reads. */
export async function readFreeLanes(ctx: Context, q: LanesQuery): Promise<Lanes> {
  if (q.siteIds.length === 0 || q.therapistIds.length === 0)
    return { sites: [], therapists: [], free: [], rooms: [] };
  const days = { firstDay: dayOf(q.from, ctx.zone), lastDay: dayOf(q.to, ctx.zone) };
  const [frame, taken] = await Promise.all([
    readFrame(ctx, { ...days, siteIds: q.siteIds, therapistIds: q.therapistIds }),
    readTaken(ctx, q),
  ]);
  addAbsences(taken, frame);
  const window: Interval[] = [{ from: q.from.getTime(), to: q.to.getTime() }];
  const names = new Map(frame.patterns.map((p) => [p.staffMemberId, p.therapistName] as const));
  const free: Lanes["free"][number][] = [];
  const rooms: Lanes["rooms"][number][] = [];
  for (const site of frame.sites) {
    const clocks = dayClocks(q.from, q.to, site.zone);
    const open = openIntervals(
      { siteId: site.id, hours: site.hours, closedOn: new Set(site.closed.keys()) },
      clocks,
    );
    const here = frame.patterns.filter((p) => p.siteId === site.id);
    for (const therapistId of new Set(here.map((p) => p.staffMemberId))) {
      const patterns = here.filter((p) => p.staffMemberId === therapistId);
      const working = withCleanDown(workingIntervals(site.id, patterns, open, clocks), q.cleanDownMinutes);
      const intervals = intersect(freeIntervals(site.id, working, taken.get(therapistId) ?? []), window);
      free.push({ therapistId, siteId: site.id, intervals });
    }
    for (const room of frame.rooms)
      if (room.siteId === site.id && room.kind === q.roomKind)
        rooms.push({ ...room, free: subtract(window, union(taken.get(room.id) ?? [])) });
  }
  return { sites: frame.sites, therapists: [...names].map(([id, name]) => ({ id, name })), free, rooms };
}
