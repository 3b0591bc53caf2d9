import { type FoundTimesView, type FoundTimeView, findTimesInput } from "@withy/contracts/diary";
import { notFound, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addDays, dayBounds, dayOf, minutesBetween, timeOf } from "@withy/core/zoned-time";
import { patients, services, serviceTherapists } from "@withy/db/schema";
import { findTimes as rankTimes } from "@withy/diary/find-times";
import type { FindTimesInput, FoundTime } from "@withy/diary/found-times";
import { bestScoreAfter } from "@withy/diary/rank-time";
import { and, eq, sql } from "drizzle-orm";
import type { z } from "zod";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { verb } from "../verb";
import { readFreeLanes } from "./free-lanes";
import { rowsOf, utc } from "./raw-rows";
import { reachableSites } from "./site-reach";

type Input = z.output<typeof findTimesInput>;
type SeenBy = { therapistId: string; name: string; visits: number; lastOn: string }[];

const daysAhead = 56;
const nearDays = 14;
/** Looked at beyond the latest date asked for, so that a later date can be proposed. */
const daysBeyond = 14;

async function readSeenBy(ctx: Context, patientId: string | undefined): Promise<SeenBy> {
  if (patientId === undefined) return [];
  await loadRecord(ctx, patients, patientId, "patient");
  const rows = await rowsOf<{ id: string; name: string; visits: number; last_at: string }>(
    ctx.db,
    sql`select a.therapist_id as id, concat(t.given_name, ' ', t.family_name) as name, count(*) as visits, max(a.starts_at) as last_at
      from appointments a join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
      where a.practice_id = ${ctx.practiceId} and a.patient_id = ${patientId} and a.state = 'fulfilled'
      group by a.therapist_id, t.given_name, t.family_name order by last_at desc`,
  );
  return rows.map((r) => ({
    therapistId: r.id,
    name: r.name,
    visits: Number(r.visits),
    lastOn: dayOf(new Date(utc(r.last_at)), ctx.zone),
  }));
}

interface Window {
  readonly from: Date;
  readonly to: Date;
}

/** @throws refused `in-the-past` or `dates-reversed` where the dates leave nothing to search */
function windowOf(ctx: Context, input: Input): Window {
  const now = ctx.clock.now();
  const today = dayOf(now, ctx.zone);
  const first = input.earliestOn !== undefined && input.earliestOn > today ? input.earliestOn : today;
  if (input.latestOn !== undefined && input.latestOn < today)
    throw refused(refusal("in-the-past", "The latest date has passed. Choose a later one.", "latestOn"));
  if (input.latestOn !== undefined && input.latestOn < first)
    throw refused(
      refusal("dates-reversed", "The latest date is before the earliest. Change one of them.", "latestOn"),
    );
  const last = input.latestOn ?? addDays(first, daysAhead);
  if (last > addDays(first, 370))
    throw refused(refusal("too-far", "Choose a latest date within a year of the earliest.", "latestOn"));
  const from = first === today ? now : dayBounds(first, ctx.zone).from;
  return { from, to: dayBounds(addDays(last, input.latestOn === undefined ? 0 : daysBeyond), ctx.zone).to };
}

function wishesOf(input: Input): FindTimesInput["wishes"] {
  const { weekdays, partsOfDay, fromTime, untilTime, siteIds, therapistIds, latestOn } = input;
  return { weekdays, partsOfDay, fromTime, untilTime, siteIds, therapistIds, latestOn };
}

function viewOf(search: FindTimesInput, t: FoundTime): FoundTimeView {
  const pick = (list: readonly { id: string; name: string }[], id: string): { id: string; name: string } => ({
    id,
    name: list.find((x) => x.id === id)?.name ?? "",
  });
  const zone = search.sites.find((s) => s.id === t.siteId)?.zone ?? "Europe/London";
  const { meetsEveryWish, marks, reasons, drawbacks } = t;
  return {
    startsAt: t.startsAt.toISOString(),
    endsAt: t.endsAt.toISOString(),
    day: dayOf(t.startsAt, zone),
    startTime: timeOf(t.startsAt, zone),
    endTime: timeOf(t.endsAt, zone),
    site: pick(search.sites, t.siteId),
    therapist: pick(search.therapists, t.therapistId),
    room: pick(search.rooms, t.roomId),
    ...{ meetsEveryWish, marks, reasons, drawbacks },
  };
}

/** Only sites where the person may book are searched; a site outside reach is not there. */
async function searchedSites(ctx: Context, input: Input): Promise<string[]> {
  const reach = await reachableSites(ctx, "diary.book");
  for (const id of input.siteIds) if (!reach.includes(id)) throw notFound("site");
  return reach;
}

async function therapistsFor(ctx: Context, serviceId: string): Promise<string[]> {
  const rows = await ctx.db
    .select({ id: serviceTherapists.staffMemberId })
    .from(serviceTherapists)
    .where(and(eq(serviceTherapists.practiceId, ctx.practiceId), eq(serviceTherapists.serviceId, serviceId)));
  return rows.map((r) => r.id);
}

/** The length of the shortest service on sale: a gap below it is lost. */
async function shortestSellable(ctx: Context): Promise<number> {
  const rows = await ctx.db
    .select({ length: services.durationMinutes, after: services.cleanDownMinutes })
    .from(services)
    .where(and(eq(services.practiceId, ctx.practiceId), eq(services.isActive, true)));
  return Math.min(...rows.map((r) => r.length + r.after), 480);
}

interface Search {
  readonly service: typeof services.$inferSelect;
  readonly siteIds: readonly string[];
  readonly therapistIds: readonly string[];
  readonly shortestSellableMinutes: number;
  readonly seenBy: SeenBy;
}

async function searchWindow(ctx: Context, input: Input, s: Search, window: Window) {
  const { durationMinutes, cleanDownMinutes, roomKind } = s.service;
  const { siteIds, therapistIds, shortestSellableMinutes } = s;
  const movingId = input.movingId ?? null;
  const lanes = await readFreeLanes(ctx, {
    ...window,
    siteIds,
    therapistIds,
    roomKind,
    cleanDownMinutes,
    movingId,
  });
  const search: FindTimesInput = {
    ...{
      now: ctx.clock.now(),
      ...window,
      durationMinutes,
      cleanDownMinutes,
      shortestSellableMinutes,
      ...lanes,
    },
    wishes: wishesOf(input),
    seenBy: s.seenBy.map(({ therapistId, visits }, n) => ({ therapistId, visits, isLast: n === 0 })),
    order: input.order,
    limit: input.limit,
  };
  return { search, found: rankTimes(search) };
}

/**
 * Searches the first fortnight and stops there when nothing later could come among the best; else the whole window.
 * The answer is the same, since a later time's best possible score is known.
 */
async function searchAll(ctx: Context, input: Input, s: Search, window: Window) {
  const near = dayBounds(addDays(dayOf(window.from, ctx.zone), nearDays), ctx.zone).from;
  if (near < window.to) {
    const first = await searchWindow(ctx, input, s, { from: window.from, to: near });
    const worst = first.found.times[input.limit - 1];
    const isSettled = first.found.meetingEveryWish > 0 && worst !== undefined;
    const later = bestScoreAfter(minutesBetween(window.from, near), input.order);
    if (isSettled && worst.score >= later) return first;
  }
  return searchWindow(ctx, input, s, window);
}

/** The best times for a visit over therapists, rooms and sites, each with why it ranks there; or why there is none. */
export const findTimes = verb("diary.book", findTimesInput, async (ctx, input): Promise<FoundTimesView> => {
  const began = performance.now();
  const service = await loadRecord(ctx, services, input.serviceId, "service");
  const window = windowOf(ctx, input);
  const [siteIds, seenBy, shortestSellableMinutes, therapistIds] = await Promise.all([
    searchedSites(ctx, input),
    readSeenBy(ctx, input.patientId),
    shortestSellable(ctx),
    therapistsFor(ctx, service.id),
  ]);
  const settings = { service, siteIds, therapistIds, shortestSellableMinutes, seenBy };
  const { search, found } = await searchAll(ctx, input, settings, window);
  const { lookedAt, meetingEveryWish, none } = found;
  const tookMs = Math.round(performance.now() - began);
  return {
    times: found.times.map((t) => viewOf(search, t)),
    lookedAt,
    meetingEveryWish,
    tookMs,
    none,
    seenBy,
  };
});
