import {
  type Busy,
  freeIntervals,
  openIntervals,
  type SiteOpening,
  withCleanDown,
  workingIntervals,
} from "./availability";
import { type DayClock, dayClocks } from "./day-clock";
import { type Interval, intersect, subtract, union } from "./interval";
import type { WorkingPattern } from "./working-pattern";

/** A site over some days, reckoned once for everyone who works there. */
export interface OpenSite {
  readonly siteId: string;
  readonly clocks: readonly DayClock[];
  readonly open: readonly Interval[];
}

/** @param zone the site's own: its days begin and end by it */
export function openSite(site: SiteOpening, zone: string, from: Date, to: Date): OpenSite {
  const clocks = dayClocks(from, to, zone);
  return { siteId: site.siteId, clocks, open: openIntervals(site, clocks) };
}

export type TravelMinutes = (fromSiteId: string, toSiteId: string) => number;

/** Minutes from one site to another; a way that nobody entered takes none. */
export function travelBy(
  ways: readonly { readonly fromSiteId: string; readonly toSiteId: string; readonly minutes: number }[],
): TravelMinutes {
  const table = new Map(ways.map((w) => [`${w.fromSiteId} ${w.toSiteId}`, w.minutes] as const));
  return (from, to) => table.get(`${from} ${to}`) ?? 0;
}

/** One therapist, as far as it decides when they can treat. */
export interface TherapistTime {
  /** Patterns of any site. */
  readonly patterns: readonly WorkingPattern[];
  /** Visits and classes with their clean-down, at whatever site, and leave. */
  readonly busy: readonly Busy[];
  readonly givesService: boolean;
  /** What a last visit before a break or the end of the day may run over by. */
  readonly cleanDownMinutes: number;
}

/**
 * The free intervals of a therapist at a site between two instants: working patterns there (dates, alternate weeks,
 * breaks) inside opening hours, closures and bank holidays taken off, then leave, visits and the way to and from
 * other sites. None for a service that the therapist does not give.
 */
export function freeTime(
  site: OpenSite,
  therapist: TherapistTime,
  travelMinutes: TravelMinutes,
  from: Date,
  to: Date,
): Interval[] {
  if (!therapist.givesService) return [];
  const working = workingIntervals(site.siteId, therapist.patterns, site.open, site.clocks);
  const treatable = withCleanDown(working, therapist.cleanDownMinutes);
  const free = freeIntervals(site.siteId, treatable, therapist.busy, travelMinutes);
  return intersect(free, [{ from: from.getTime(), to: to.getTime() }]);
}

/** When a room is not taken, between two instants. */
export function roomTime(busy: readonly Interval[], from: Date, to: Date): Interval[] {
  return subtract([{ from: from.getTime(), to: to.getTime() }], union(busy));
}

const throughout = (set: readonly Interval[], needMs: number): Interval[] =>
  set.filter((i) => i.to - i.from >= needMs).map((i) => ({ from: i.from, to: i.to - needMs + 1 }));

/**
 * The instants at which a visit could begin: the therapist is free for its whole length with the clean-down, and so
 * is one and the same room. Each range holds its last possible start; its end is one millisecond later.
 */
export function possibleStarts(
  free: readonly Interval[],
  rooms: readonly (readonly Interval[])[],
  needMs: number,
): Interval[] {
  return intersect(throughout(free, needMs), union(rooms.flatMap((room) => throughout(room, needMs))));
}
