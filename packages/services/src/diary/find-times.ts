import { type FoundTimesView, type FoundTimeView, findTimesInput } from "@withy/contracts/diary";
import { notFound } from "@withy/core/errors";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { patients, services, serviceTherapists } from "@withy/db/schema";
import type { FindTimesInput, FoundTime } from "@withy/diary/found-times";
import { and, eq, sql } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { verb } from "../verb";
import { readFindingWeights } from "./finding-weights";
import { rowsOf, utc } from "./raw-rows";
import { type FindTimesQuery, type SeenBy, searchAll, windowOf } from "./search-times";
import { reachableSites } from "./site-reach";

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
async function searchedSites(ctx: Context, input: FindTimesQuery): Promise<string[]> {
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

/** The best times for a visit over therapists, rooms and sites, each with why it ranks there; or why there is none. */
export const findTimes = verb("diary.book", findTimesInput, async (ctx, input): Promise<FoundTimesView> => {
  const began = performance.now();
  const service = await loadRecord(ctx, services, input.serviceId, "service");
  const window = windowOf(ctx, input);
  const [siteIds, seenBy, shortestSellableMinutes, therapistIds, weights] = await Promise.all([
    searchedSites(ctx, input),
    readSeenBy(ctx, input.patientId),
    shortestSellable(ctx),
    therapistsFor(ctx, service.id),
    readFindingWeights(ctx),
  ]);
  const settings = { service, siteIds, therapistIds, shortestSellableMinutes, seenBy, weights };
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
