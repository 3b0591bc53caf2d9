import { listTodayInput, type TodayArrival, type TodayGap, type TodayView } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { stateFacts } from "@withy/diary/appointment-states";
import { verb } from "../verb";
import { type SiteDay, therapistColumns } from "./day-columns";
import { readSiteDays } from "./read-site-days";
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
  const day = dayOf(ctx.clock.now(), ctx.zone);
  const { frame, days } = await readSiteDays(ctx, siteIds, day);
  const visits = days.flatMap((d) => d.visits.filter((v) => v.site_id === d.site.id));
  const lines = await readArrivals(
    ctx,
    frame,
    visits.sort((a, b) => a.from - b.from),
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
