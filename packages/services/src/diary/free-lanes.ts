import { sitesWith } from "@withy/core/access/can";
import { dayOf } from "@withy/core/zoned-time";
import type { Busy } from "@withy/diary/availability";
import type { FindTimesInput } from "@withy/diary/found-times";
import { freeTime, openSite, roomTime } from "@withy/diary/free-time";
import { type RoomNeeds, roomSuits } from "@withy/diary/room-suits";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { type Frame, type FramePattern, readFrame } from "./frame";
import { rowsOf, sqlTime, utc } from "./raw-rows";

export interface LanesQuery {
  readonly from: Date;
  readonly to: Date;
  readonly siteIds: readonly string[];
  readonly therapistIds: readonly string[];
  /** What the service asks of every room. */
  readonly room: RoomNeeds;
  /** What the patient needs besides. */
  readonly patientNeeds: Omit<RoomNeeds, "kind">;
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

function grouped(
  patterns: readonly FramePattern[],
  key: (pattern: FramePattern) => string,
): Map<string, FramePattern[]> {
  const groups = new Map<string, FramePattern[]>();
  for (const pattern of patterns) {
    const group = groups.get(key(pattern));
    if (group) group.push(pattern);
    else groups.set(key(pattern), [pattern]);
  }
  return groups;
}

/** A visit that began before the window may reach into it by this much at most. */
const longestMs = 10 * 3_600_000;

/** Visits and classes that hold time; also the therapists' own out of the reader's reach. Part of the bench. */
export function takenSql(
  ctx: Pick<Context, "practiceId" | "roles">,
  q: Pick<LanesQuery, "siteIds" | "therapistIds" | "movingId">,
  from: Date,
  to: Date,
): SQL {
  const ids = listOf(q.siteIds);
  const select = (table: SQL, where: SQL): SQL => sql`
    select x.therapist_id as t, x.room_id as r, x.site_id as s, x.starts_at as a, x.ends_at as b, x.clean_down_minutes as c
    from ${table} x where x.practice_id = ${ctx.practiceId} and ${where} and x.state <> 'cancelled'
      and x.starts_at < ${sqlTime(to)} and x.starts_at >= ${sqlTime(from)}
      ${q.movingId === null ? sql`` : sql`and x.id <> ${q.movingId}`}`;
  const here = sql`x.site_id in (${ids})`;
  const away = sql`x.therapist_id in (${listOf(q.therapistIds)}) and x.site_id not in (${ids})`;
  const places = sitesWith(ctx.roles, "diary.book") === "all" ? [here] : [here, away];
  const tables = [sql`appointments`, sql`class_sessions`];
  return sql.join(
    places.flatMap((where) => tables.map((table) => select(table, where))),
    sql` union all `,
  );
}

/**
 * Free time of every therapist and room that a search may use. The frame of the whole window is read once; what is
 * taken is read as far as the search has to look, and no day twice.
 */
export class FreeLanes {
  private readonly taken = new Map<string, Busy[]>();
  private readUntil: number;

  private constructor(
    private readonly ctx: Context,
    private readonly q: LanesQuery,
    private readonly frame: Frame,
  ) {
    this.readUntil = q.from.getTime() - longestMs;
    for (const a of frame.absences) this.add(a.staffMemberId ?? a.roomId ?? "", a);
  }

  /** Reads the frame, and at the same time what is taken up to `until`. */
  static async read(ctx: Context, q: LanesQuery, until: Date): Promise<FreeLanes> {
    const { siteIds, therapistIds } = q;
    const days = { firstDay: dayOf(q.from, ctx.zone), lastDay: dayOf(q.to, ctx.zone) };
    const isEmpty = siteIds.length === 0 || therapistIds.length === 0;
    const first = new Date(q.from.getTime() - longestMs);
    const [frame, rows] = await Promise.all([
      readFrame(ctx, { ...days, siteIds: isEmpty ? [] : siteIds, therapistIds }),
      isEmpty ? [] : rowsOf<TakenRow>(ctx.db, takenSql(ctx, q, first, until)),
    ]);
    const lanes = new FreeLanes(ctx, q, frame);
    lanes.keep(rows, until);
    return lanes;
  }

  private add(id: string, busy: Busy): void {
    const list = this.taken.get(id);
    if (list) list.push(busy);
    else this.taken.set(id, [busy]);
  }

  private keep(rows: readonly TakenRow[], until: Date): void {
    for (const row of rows) {
      const busy = { from: utc(row.a), to: utc(row.b) + row.c * 60_000, siteId: row.s };
      this.add(row.t, busy);
      this.add(row.r, busy);
    }
    this.readUntil = until.getTime();
  }

  private async readTaken(until: Date): Promise<void> {
    if (until.getTime() <= this.readUntil || this.frame.sites.length === 0) return;
    this.keep(await rowsOf(this.ctx.db, takenSql(this.ctx, this.q, new Date(this.readUntil), until)), until);
  }

  /** Free time from the start of the window up to an instant in it. */
  async upTo(until: Date): Promise<Lanes> {
    await this.readTaken(until);
    const { q, frame } = this;
    const free: Lanes["free"][number][] = [];
    const bySite = grouped(frame.patterns, (p) => p.siteId);
    for (const site of frame.sites) {
      const opening = { siteId: site.id, hours: site.hours, closedOn: new Set(site.closed.keys()) };
      const open = openSite(opening, site.zone, q.from, until);
      const people = grouped(bySite.get(site.id) ?? [], (p) => p.staffMemberId);
      for (const [therapistId, patterns] of people) {
        const busy = this.taken.get(therapistId) ?? [];
        const who = { patterns, busy, givesService: true, cleanDownMinutes: q.cleanDownMinutes };
        const intervals = freeTime(open, who, frame.travel, q.from, until);
        free.push({ therapistId, siteId: site.id, intervals });
      }
    }
    const names = new Map(frame.patterns.map((p) => [p.staffMemberId, p.therapistName] as const));
    const therapists = [...names].map(([id, name]) => ({ id, name }));
    return { sites: frame.sites, therapists, free, rooms: this.rooms(until) };
  }

  private rooms(until: Date): Lanes["rooms"] {
    const { q, frame, taken } = this;
    const all = { ...q.patientNeeds, kind: q.room.kind };
    return frame.rooms
      .filter((room) => roomSuits(room, q.room))
      .map(({ id, name, siteId, ...facts }) => ({
        ...{ id, name, siteId },
        free: roomTime(taken.get(id) ?? [], q.from, until),
        meetsNeeds: roomSuits(facts, all),
      }));
  }
}
