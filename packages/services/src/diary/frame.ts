import { addDays, daysBetween, type PlainDateText, weekdayOf } from "@withy/core/zoned-time";
import type { Busy } from "@withy/diary/availability";
import type { Nation } from "@withy/diary/bank-holidays";
import { closedDays } from "@withy/diary/closed-days";
import { type TravelMinutes, travelBy } from "@withy/diary/free-time";
import type { WorkingPattern } from "@withy/diary/working-pattern";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { laterChange, latestChangesSql } from "./latest-changes";
import { rowsOf, utc } from "./raw-rows";

/** What a stretch of days looks like before anyone is booked: sites, rooms, people's hours, leave and blocks. */
export interface Frame {
  readonly sites: readonly FrameSite[];
  readonly rooms: readonly FrameRoom[];
  readonly patterns: readonly FramePattern[];
  readonly absences: readonly FrameAbsence[];
  /** Visits and classes of `awayOf` at other sites than these, clean-down included. */
  readonly away: readonly FrameAway[];
  readonly travel: TravelMinutes;
  /** The latest change at any of the sites, where it was asked for. */
  readonly pulse: string | null;
}

export interface FrameSite {
  readonly id: string;
  readonly name: string;
  readonly zone: string;
  readonly nation: Nation;
  readonly position: number;
  readonly hours: { weekday: number; opensAt: string; closesAt: string }[];
  /** Closures and bank holidays, by day, with their reason. */
  readonly closed: Map<PlainDateText, string>;
}

export interface FrameRoom {
  readonly id: string;
  readonly siteId: string;
  readonly name: string;
  readonly kind: "treatment" | "gym" | "video";
  readonly equipment: readonly string[];
  readonly isStepFree: boolean;
  readonly position: number;
}

export interface FramePattern extends WorkingPattern {
  readonly therapistName: string;
  readonly position: number;
  readonly breaks: readonly { startsAt: string; endsAt: string; label: string }[];
}

export interface FrameAbsence extends Busy {
  readonly id: string;
  readonly staffMemberId: string | null;
  readonly roomId: string | null;
  readonly kind: "leave" | "blocked";
  readonly reason: string;
}

export interface FrameAway extends Busy {
  readonly therapistId: string;
  readonly siteId: string;
  readonly siteName: string;
}

export interface FrameQuery {
  readonly firstDay: PlainDateText;
  readonly lastDay: PlainDateText;
  readonly siteIds: readonly string[];
  /** Absent: everyone who works at these sites. */
  readonly therapistIds?: readonly string[];
  readonly withPulse?: boolean;
  /** Whose visits at other sites are wanted, and which visit counts as gone. */
  readonly awayOf?: { readonly therapistId: string; readonly exceptId: string | null };
}

const list = (values: readonly (string | number)[]): SQL =>
  sql.join(
    values.map((v) => sql`${v}`),
    sql`, `,
  );

/** All the reference rows in one statement: one journey to the database, and no row that the days do not need. */
function frameSql(practiceId: string, q: FrameQuery): SQL {
  const sites = list(q.siteIds);
  const days = Math.min(7, daysBetween(q.firstDay, q.lastDay) + 1);
  const weekdays = list(Array.from({ length: days }, (_, n) => weekdayOf(addDays(q.firstDay, n))));
  const people =
    q.therapistIds === undefined
      ? sql`select w.staff_member_id from working_patterns w where w.practice_id = ${practiceId} and w.site_id in (${sites})`
      : list(q.therapistIds);
  const until = `${addDays(q.lastDay, 2)} 00:00:00`;
  const from = `${addDays(q.firstDay, -1)} 00:00:00`;
  return sql`
    select 'site' as kind, json_object('id', s.id, 'name', s.name, 'zone', s.zone, 'nation', s.nation, 'position', s.position) as data
      from sites s where s.practice_id = ${practiceId} and s.id in (${sites})
    union all select 'hours', json_object('siteId', h.site_id, 'weekday', h.weekday, 'opensAt', h.opens_at, 'closesAt', h.closes_at)
      from site_hours h where h.practice_id = ${practiceId} and h.site_id in (${sites}) and h.weekday in (${weekdays})
    union all select 'closure', json_object('siteId', c.site_id, 'on', c.closed_on, 'reason', c.reason)
      from site_closures c where c.practice_id = ${practiceId} and c.site_id in (${sites}) and c.closed_on between ${q.firstDay} and ${q.lastDay}
    union all select 'room', json_object('id', r.id, 'siteId', r.site_id, 'name', r.name, 'kind', r.kind, 'equipment', json_compact(r.equipment), 'isStepFree', r.is_step_free, 'position', r.position)
      from rooms r where r.practice_id = ${practiceId} and r.site_id in (${sites})
    union all select 'travel', json_object('fromSiteId', w.from_site_id, 'toSiteId', w.to_site_id, 'minutes', w.minutes)
      from site_travel w where w.practice_id = ${practiceId}
    union all select 'pattern', json_object('staffMemberId', p.staff_member_id, 'siteId', p.site_id, 'weekday', p.weekday,
        'startsAt', p.starts_at, 'endsAt', p.ends_at, 'validFrom', p.valid_from, 'validUntil', p.valid_until,
        'everyWeeks', p.every_weeks, 'breaks', json_compact(p.breaks),
        'therapistName', concat(m.given_name, ' ', m.family_name), 'position', m.position)
      from working_patterns p join staff_members m on m.practice_id = p.practice_id and m.id = p.staff_member_id and m.is_active
      where p.practice_id = ${practiceId} and p.site_id in (${sites}) and p.weekday in (${weekdays})
        and p.valid_from <= ${q.lastDay} and (p.valid_until is null or p.valid_until >= ${q.firstDay})
        ${q.therapistIds === undefined ? sql`` : sql`and p.staff_member_id in (${people})`}
    union all select 'absence', json_object('id', a.id, 'staffMemberId', a.staff_member_id, 'roomId', a.room_id, 'kind', a.kind,
        'reason', a.reason, 'startsAt', a.starts_at, 'endsAt', a.ends_at)
      from absences a where a.practice_id = ${practiceId} and a.staff_member_id in (${people}) and a.ends_at > ${from} and a.starts_at < ${until}
    union all select 'absence', json_object('id', a.id, 'staffMemberId', a.staff_member_id, 'roomId', a.room_id, 'kind', a.kind,
        'reason', a.reason, 'startsAt', a.starts_at, 'endsAt', a.ends_at)
      from absences a where a.practice_id = ${practiceId} and a.ends_at > ${from} and a.starts_at < ${until}
        and a.room_id in (select r.id from rooms r where r.practice_id = ${practiceId} and r.site_id in (${sites}))
    ${q.awayOf ? awaySql(practiceId, q.awayOf, sites, from, until) : sql``}
    ${q.withPulse ? sql`union all select 'pulse', json_object('id', l.id) from (${latestChangesSql(practiceId, q.siteIds)}) l` : sql``}`;
}

/** Where a therapist is booked besides: asked only for one person and a few days. */
function awaySql(
  practiceId: string,
  who: NonNullable<FrameQuery["awayOf"]>,
  sites: SQL,
  from: string,
  until: string,
): SQL {
  const visits = (table: SQL): SQL => sql`
    union all select 'away', json_object('therapistId', x.therapist_id, 'siteId', x.site_id, 'siteName', z.name,
        'startsAt', x.starts_at, 'endsAt', x.ends_at, 'cleanDownMinutes', x.clean_down_minutes)
      from ${table} x join sites z on z.practice_id = x.practice_id and z.id = x.site_id
      where x.practice_id = ${practiceId} and x.therapist_id = ${who.therapistId} and x.site_id not in (${sites})
        and x.state <> 'cancelled' and x.starts_at >= ${from} and x.starts_at < ${until}
        ${who.exceptId === null ? sql`` : sql`and x.id <> ${who.exceptId}`}`;
  return sql`${visits(sql`appointments`)} ${visits(sql`class_sessions`)}`;
}

interface RawRow {
  kind: "travel" | "away" | "site" | "hours" | "closure" | "room" | "pattern" | "absence" | "pulse";
  data: string | object;
}

interface Raw {
  id: string;
  siteId: string;
  name: string;
  zone: string;
  nation: Nation;
  position: number;
  kind: "treatment" | "gym" | "video";
  weekday: number;
  opensAt: string;
  closesAt: string;
  on: string;
  reason: string;
  startsAt: string;
  endsAt: string;
  staffMemberId: string | null;
  roomId: string | null;
  fromSiteId: string;
  toSiteId: string;
  minutes: number;
  therapistId: string;
  siteName: string;
  cleanDownMinutes: number;
}

function absenceOf(data: Raw): FrameAbsence {
  return {
    id: data.id,
    staffMemberId: data.staffMemberId,
    roomId: data.roomId,
    kind: (data.kind as string) === "leave" ? "leave" : "blocked",
    reason: data.reason,
    from: utc(data.startsAt),
    to: utc(data.endsAt),
  };
}

const awayOf = (data: Raw): FrameAway => ({
  ...{ therapistId: data.therapistId, siteId: data.siteId, siteName: data.siteName },
  from: utc(data.startsAt),
  to: utc(data.endsAt) + data.cleanDownMinutes * 60_000,
});

function roomOf(data: Raw): FrameRoom {
  const room = data as unknown as FrameRoom & { isStepFree: number | boolean };
  return { ...room, isStepFree: Boolean(room.isStepFree) };
}

/** Reads the frame of some sites over some days. Nothing in it may be written from. */
export async function readFrame(ctx: Context, q: FrameQuery): Promise<Frame> {
  const sites = new Map<string, FrameSite>();
  const [rooms, patterns, absences]: [FrameRoom[], FramePattern[], FrameAbsence[]] = [[], [], []];
  const [away, ways]: [FrameAway[], Raw[]] = [[], []];
  let pulse: string | null = null;
  if (q.siteIds.length === 0)
    return { sites: [], rooms, patterns, absences, away, travel: travelBy([]), pulse };
  for (const row of await rowsOf<RawRow>(ctx.db, frameSql(ctx.practiceId, q))) {
    const data = (typeof row.data === "string" ? JSON.parse(row.data) : row.data) as Raw;
    if (row.kind === "site") {
      const { id, name, zone, nation, position } = data;
      const closed = closedDays(nation, [], q.firstDay, q.lastDay);
      sites.set(id, { id, name, zone, nation, position, hours: [], closed });
    } else if (row.kind === "hours") sites.get(data.siteId)?.hours.push(data);
    else if (row.kind === "closure") sites.get(data.siteId)?.closed.set(data.on, data.reason);
    else if (row.kind === "room") rooms.push(roomOf(data));
    else if (row.kind === "travel") ways.push(data);
    else if (row.kind === "away") away.push(awayOf(data));
    else if (row.kind === "pattern") patterns.push(data as unknown as FramePattern);
    else if (row.kind === "absence") absences.push(absenceOf(data));
    else pulse = laterChange(pulse, data.id);
  }
  rooms.sort((a, b) => a.position - b.position);
  patterns.sort((a, b) => a.position - b.position);
  const inOrder = [...sites.values()].sort((a, b) => a.position - b.position);
  return { sites: inOrder, rooms, patterns, absences, away, travel: travelBy(ways), pulse };
}
