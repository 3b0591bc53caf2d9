import { listTodayInput, type TodayArrival, type TodayGap, type TodayView } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { notFound } from "@withy/core/errors";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { stateFacts } from "@withy/diary/appointment-states";
import { verb } from "../verb";
import { readDayVisits } from "./day-appointments";
import { type SiteDay, siteDays, therapistColumns } from "./day-columns";
import { readFrame } from "./frame";
import { readableSites } from "./site-reach";
import { readArrivals, toCollect } from "./today-arrivals";

/** Shorter gaps are too short for any visit and are not offered. */
const shortestGapMinutes = 30;

function gapsOf(days: readonly SiteDay[]): TodayGap[] {
  const gaps = days.flatMap((day) =>
    therapistColumns(day).flatMap((column) =>
      column.free
        .filter((f) => f.untilMinute - f.fromMinute >= shortestGapMinutes)
        .map((f) => {
          const at = new Date(Math.ceil(day.clock.instantOf(f.fromMinute) / 300_000) * 300_000);
          return {
            therapistId: column.id,
            therapistName: column.name,
            siteId: column.siteId,
            startsAt: at.toISOString(),
            startTime: timeOf(at, day.site.zone),
            minutes: Math.floor((f.untilMinute - f.fromMinute) / 5) * 5,
          };
        }),
    ),
  );
  return gaps.sort((a, b) => a.startsAt.localeCompare(b.startsAt));
}

function countsOf(lines: readonly TodayArrival[]): TodayView["counts"] {
  const toCome = lines.filter((l) => l.state === "booked" || l.state === "confirmed");
  const waits = lines.flatMap((l) => (l.waitingMinutes === null ? [] : [l.waitingMinutes]));
  const count = (state: string): number => lines.filter((l) => l.state === state).length;
  return {
    toCome: toCome.length,
    seen: count("fulfilled"),
    didNotAttend: count("noshow"),
    cancelled: count("cancelled"),
    waiting: waits.length,
    longestWaitMinutes: waits.length === 0 ? null : Math.max(...waits),
    lastTime: toCome.at(-1)?.startTime ?? null,
  };
}

/** The desk's day: who comes, who waits, which gaps are left and what is to be collected. */
export const listToday = verb("diary.read", listTodayInput, async (ctx, input): Promise<TodayView> => {
  const siteIds = await readableSites(ctx, input.siteIds);
  const now = ctx.clock.now();
  const day = dayOf(now, ctx.zone);
  const wide = {
    from: new Date(now.getTime() - 36 * 3_600_000),
    to: new Date(now.getTime() + 36 * 3_600_000),
  };
  const [frame, visits] = await Promise.all([
    readFrame(ctx, { firstDay: day, lastDay: day, siteIds, withPulse: true }),
    readDayVisits(ctx, { siteIds }, wide.from, wide.to),
  ]);
  if (frame.sites.length < siteIds.length) throw notFound("site");
  const days = siteDays(frame, visits, day, now);
  const ids = new Set(days.flatMap((d) => d.visits.map((v) => v.id)));
  const lines = await readArrivals(
    ctx,
    frame,
    visits.filter((v) => ids.has(v.id)),
  );
  const gaps = gapsOf(days);
  const seesMoney = siteIds.every((id) => can(ctx.roles, "billing.read", id));
  return {
    day,
    sites: frame.sites.map(({ id, name }) => ({ id, name })),
    arrivals: lines.filter((l) => stateFacts[l.state].isOpen),
    done: lines.filter((l) => !stateFacts[l.state].isOpen),
    gaps,
    gapMinutes: gaps.reduce((sum, g) => sum + g.minutes, 0),
    toCollect: seesMoney ? await toCollect(ctx, lines) : null,
    counts: countsOf(lines),
    pulse: frame.pulse,
  };
});
