import { Temporal } from "temporal-polyfill";
import type { PlainDateText } from "./plain-date";
import type { PlainTimeText } from "./wall-clock";

// What needs no change of the clocks lives apart, so that a page can have it without Temporal.
export type { PlainDateText } from "./plain-date";
export {
  addDays,
  addMonths,
  ageOn,
  daysBetween,
  isPlainDate,
  monthBounds,
  weekdayOf,
} from "./plain-date";
export type { PlainTimeText } from "./wall-clock";
export { dayOf, timeOf } from "./wall-clock";

export const minutesBetween = (from: Date, to: Date): number =>
  Math.round((to.getTime() - from.getTime()) / 60_000);
export const addMinutes = (at: Date, minutes: number): Date => new Date(at.getTime() + minutes * 60_000);

/** From the first instant of the site's day to the first of the next: 23, 24 or 25 hours. */
export function dayBounds(day: PlainDateText, zone: string): { from: Date; to: Date } {
  const date = Temporal.PlainDate.from(day);
  const from = date.toZonedDateTime(zone);
  const to = date.add({ days: 1 }).toZonedDateTime(zone);
  return { from: new Date(from.epochMilliseconds), to: new Date(to.epochMilliseconds) };
}

/**
 * The instant of a wall-clock time at the site, or null where that time does not exist (clocks go forward).
 * Where it happens twice (clocks go back) the first is meant, as people do who say "half past one".
 */
export function instantAt(day: PlainDateText, time: PlainTimeText, zone: string): Date | null {
  const wall = Temporal.PlainDate.from(day).toPlainDateTime(Temporal.PlainTime.from(time));
  const at = wall.toZonedDateTime(zone, { disambiguation: "earlier" });
  if (!at.toPlainDateTime().equals(wall)) return null;
  return new Date(at.epochMilliseconds);
}
