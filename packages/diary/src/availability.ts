import type { PlainDateText } from "@withy/core/zoned-time";
import { type DayClock, wallMinutes } from "./day-clock";
import { type Interval, intersect, subtract, union } from "./interval";
import { type ClockRange, isWorkedOn, type WorkingPattern } from "./working-pattern";

/** What decides when a site can treat anyone. */
export interface SiteOpening {
  readonly siteId: string;
  /** Opening hours by ISO weekday; a weekday without a row is closed. */
  readonly hours: readonly {
    readonly weekday: number;
    readonly opensAt: string;
    readonly closesAt: string;
  }[];
  /** Days shut although the hours say open: closures and the nation's bank holidays. */
  readonly closedOn: ReadonlySet<PlainDateText>;
}

/** Time that is gone: an appointment with its clean-down, leave, a block. */
export interface Busy extends Interval {
  /** Where it is, so that the way to another site can be added; absent for leave. */
  readonly siteId?: string;
}

function onDay(clock: DayClock, range: ClockRange): Interval {
  return {
    from: clock.instantOf(wallMinutes(range.startsAt)),
    to: clock.instantOf(wallMinutes(range.endsAt)),
  };
}

/** When the site is open, as sorted disjoint intervals, over the days given. */
export function openIntervals(site: SiteOpening, days: readonly DayClock[]): Interval[] {
  const open: Interval[] = [];
  for (const clock of days) {
    if (site.closedOn.has(clock.day)) continue;
    for (const h of site.hours)
      if (h.weekday === clock.weekday) open.push(onDay(clock, { startsAt: h.opensAt, endsAt: h.closesAt }));
  }
  return union(open);
}

/**
 * When a therapist works at a site: their patterns there, less the breaks, within the site's opening hours. Leave
 * and appointments are not taken off. A clock time that a change of the clocks jumps over means the instant of
 * the jump; one shown twice means the first.
 * @param patterns the therapist's patterns, of any site
 */
export function workingIntervals(
  siteId: string,
  patterns: readonly WorkingPattern[],
  open: readonly Interval[],
  days: readonly DayClock[],
): Interval[] {
  const worked: Interval[] = [];
  const breaks: Interval[] = [];
  const here = patterns.filter((p) => p.siteId === siteId);
  for (const clock of days)
    for (const p of here) {
      if (!isWorkedOn(p, clock.day, clock.weekday)) continue;
      worked.push(onDay(clock, p));
      for (const b of p.breaks) breaks.push(onDay(clock, b));
    }
  return subtract(intersect(union(worked), open), union(breaks));
}

/**
 * What is left of working time at a site once everything already in the therapist's day is taken off. What lies
 * at another site takes the journey there and back too.
 * @param travelMinutes minutes from one site to another; none where it is not given
 */
export function freeIntervals(
  siteId: string,
  working: readonly Interval[],
  busy: readonly Busy[],
  travelMinutes: (from: string, to: string) => number = () => 0,
): Interval[] {
  const taken = busy.map((b) => {
    if (b.siteId === undefined || b.siteId === siteId) return b;
    return {
      from: b.from - travelMinutes(siteId, b.siteId) * 60_000,
      to: b.to + travelMinutes(b.siteId, siteId) * 60_000,
    };
  });
  return subtract(working, union(taken));
}

/**
 * Working time with room for the clean-down after a last visit: each interval is drawn out by so many minutes, but
 * never into the next. Cleaning may run into a break or the end of the day; treating may not.
 */
export function withCleanDown(working: readonly Interval[], cleanDownMinutes: number): Interval[] {
  return working.map((w, n) => {
    const next = working[n + 1]?.from ?? Number.POSITIVE_INFINITY;
    return { from: w.from, to: Math.min(w.to + cleanDownMinutes * 60_000, next) };
  });
}

/** Free intervals between two instants only. */
export function within(set: readonly Interval[], from: Date, to: Date): Interval[] {
  return intersect(set, [{ from: from.getTime(), to: to.getTime() }]);
}
