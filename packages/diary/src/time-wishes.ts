import type { PlainDateText, PlainTimeText } from "@withy/core/zoned-time";
import { type DayClock, wallMinutes } from "./day-clock";
import { contains, type Interval } from "./interval";

export const partsOfDay = ["morning", "afternoon", "evening"] as const;
export type PartOfDay = (typeof partsOfDay)[number];

/** A visit belongs to the part of the day in which it starts: morning until 12:00, afternoon until 17:00. */
export function partOfDay(wall: number): PartOfDay {
  if (wall < 720) return "morning";
  return wall < 1020 ? "afternoon" : "evening";
}

/** What the caller asks for. An absent or empty wish means any. */
export interface TimeWishes {
  /** 1 Monday to 7 Sunday. */
  readonly weekdays?: readonly number[] | undefined;
  readonly partsOfDay?: readonly PartOfDay[] | undefined;
  /** Not before this clock time, and over by that one. */
  readonly fromTime?: PlainTimeText | undefined;
  readonly untilTime?: PlainTimeText | undefined;
  readonly siteIds?: readonly string[] | undefined;
  readonly therapistIds?: readonly string[] | undefined;
  readonly latestOn?: PlainDateText | undefined;
  /** Exact windows, in milliseconds since the epoch: the visit lies within one of them. */
  readonly windows?: readonly Interval[] | undefined;
  /** Whether the room must be one that meets the patient's needs (`meetsNeeds` of a room). */
  readonly needsRoom?: boolean | undefined;
}

export const wishKinds = ["days", "hours", "site", "therapist", "latest", "windows", "needs"] as const;
export type WishKind = (typeof wishKinds)[number];

/** One bit for each wish, so that a time's broken wishes are one small number. */
export const wishBit: Record<WishKind, number> = {
  ...{ days: 1, hours: 2, site: 4, therapist: 8 },
  ...{ latest: 16, windows: 32, needs: 64 },
};

export const brokenWishes = (bits: number): WishKind[] => wishKinds.filter((k) => (bits & wishBit[k]) !== 0);
export const isAtMostOne = (bits: number): boolean => (bits & (bits - 1)) === 0;

const wants = <T>(list: readonly T[] | undefined, value: T): boolean =>
  list === undefined || list.length === 0 || list.includes(value);

export function siteBits(wishes: TimeWishes, siteId: string): number {
  return wants(wishes.siteIds, siteId) ? 0 : wishBit.site;
}

export function therapistBits(wishes: TimeWishes, therapistId: string): number {
  return wants(wishes.therapistIds, therapistId) ? 0 : wishBit.therapist;
}

export function dayBits(wishes: TimeWishes, clock: DayClock): number {
  const latest = wishes.latestOn !== undefined && clock.day > wishes.latestOn ? wishBit.latest : 0;
  return latest | (wants(wishes.weekdays, clock.weekday) ? 0 : wishBit.days);
}

/** The wished hours in minutes after midnight, read once for a whole search. */
export interface WishedHours {
  readonly from: number;
  readonly until: number;
  readonly parts: readonly PartOfDay[];
}

export function wishedHours(wishes: TimeWishes): WishedHours {
  return {
    from: wishes.fromTime === undefined ? 0 : wallMinutes(wishes.fromTime),
    // A visit that runs past midnight breaks no wish where none was made.
    until: wishes.untilTime === undefined ? Number.POSITIVE_INFINITY : wallMinutes(wishes.untilTime),
    parts: wishes.partsOfDay ?? [],
  };
}

/** Minutes by which a visit misses the wished hours; 0 where it lies within them. A wrong part of day is an hour. */
export function minutesOutside(hours: WishedHours, wall: number, durationMinutes: number): number {
  const early = Math.max(0, hours.from - wall);
  const late = Math.max(0, wall + durationMinutes - hours.until);
  const part = hours.parts.length === 0 || hours.parts.includes(partOfDay(wall)) ? 0 : 60;
  return Math.max(early, late, part);
}

export function windowBits(wishes: TimeWishes, visit: Interval): number {
  const windows = wishes.windows ?? [];
  return windows.length === 0 || windows.some((w) => contains(w, visit)) ? 0 : wishBit.windows;
}
