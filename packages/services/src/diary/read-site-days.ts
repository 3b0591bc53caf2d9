import { notFound } from "@withy/core/errors";
import type { PlainDateText } from "@withy/core/zoned-time";
import { type DayClock, dayClock } from "@withy/diary/day-clock";
import type { Context } from "../context";
import { type DayVisit, readDayVisits } from "./day-appointments";
import { type SiteDay, siteDays } from "./day-columns";
import { type Frame, readFrame } from "./frame";

/** A site in a zone of its own has another day than the practice; then, and only then, the visits are read again. */
async function coverEverySite(
  ctx: Context,
  frame: Frame,
  day: PlainDateText,
  read: DayClock,
  visits: DayVisit[],
): Promise<DayVisit[]> {
  const clocks = frame.sites.map((site) => dayClock(day, site.zone));
  if (clocks.every((c) => c.startsAt >= read.startsAt && c.endsAt <= read.endsAt)) return visits;
  const from = new Date(Math.min(...clocks.map((c) => c.startsAt)));
  const to = new Date(Math.max(...clocks.map((c) => c.endsAt)));
  return readDayVisits(ctx, { siteIds: frame.sites.map((s) => s.id) }, from, to);
}

/** One day of some sites, from two statements at once. @throws not-found for a site that is not the practice's */
export async function readSiteDays(
  ctx: Context,
  siteIds: readonly string[],
  day: PlainDateText,
): Promise<{ frame: Frame; days: SiteDay[] }> {
  const own = dayClock(day, ctx.zone);
  const [frame, inWindow] = await Promise.all([
    readFrame(ctx, { firstDay: day, lastDay: day, siteIds, withPulse: true }),
    siteIds.length === 0 ? [] : readDayVisits(ctx, { siteIds }, new Date(own.startsAt), new Date(own.endsAt)),
  ]);
  if (frame.sites.length < siteIds.length) throw notFound("site");
  const visits = await coverEverySite(ctx, frame, day, own, inWindow);
  return { frame, days: siteDays(frame, visits, day, ctx.clock.now()) };
}
