import { Temporal } from "temporal-polyfill";

/** A calendar date "2026-12-01" with no time and no zone. */
export type PlainDateText = string;
/** A clock time "09:05". */
export type PlainTimeText = string;

export const minutesBetween = (from: Date, to: Date): number =>
  Math.round((to.getTime() - from.getTime()) / 60_000);
export const addMinutes = (at: Date, minutes: number): Date => new Date(at.getTime() + minutes * 60_000);

function zoned(at: Date, zone: string): Temporal.ZonedDateTime {
  return Temporal.Instant.fromEpochMilliseconds(at.getTime()).toZonedDateTimeISO(zone);
}

/** The site's calendar day at that instant. */
export function dayOf(at: Date, zone: string): PlainDateText {
  return zoned(at, zone).toPlainDate().toString();
}

/** The site's wall-clock time "HH:MM" at that instant. */
export function timeOf(at: Date, zone: string): PlainTimeText {
  return zoned(at, zone).toPlainTime().toString({ smallestUnit: "minute" });
}

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

/** ISO weekday of a plain date: 1 Monday to 7 Sunday. */
export function weekdayOf(day: PlainDateText): number {
  return Temporal.PlainDate.from(day).dayOfWeek;
}

export function addDays(day: PlainDateText, days: number): PlainDateText {
  return Temporal.PlainDate.from(day).add({ days }).toString();
}

export function addMonths(day: PlainDateText, months: number): PlainDateText {
  return Temporal.PlainDate.from(day).add({ months }).toString();
}

export function daysBetween(from: PlainDateText, to: PlainDateText): number {
  return Temporal.PlainDate.from(from).until(Temporal.PlainDate.from(to), { largestUnit: "day" }).days;
}

export function monthBounds(month: string): { firstOn: PlainDateText; nextOn: PlainDateText } {
  const first = Temporal.PlainYearMonth.from(month).toPlainDate({ day: 1 });
  return { firstOn: first.toString(), nextOn: first.add({ months: 1 }).toString() };
}

export function isPlainDate(text: string): boolean {
  try {
    return (
      /^\d{4}-\d{2}-\d{2}$/.test(text) &&
      Temporal.PlainDate.from(text, { overflow: "reject" }).toString() === text
    );
  } catch {
    return false;
  }
}

/**
 * Whole years lived on a day. Someone born on 29 February has their birthday on 1 March in common years (the
 * reading taken in UK law; from memory).
 */
export function ageOn(bornOn: PlainDateText, day: PlainDateText): number {
  const born = Temporal.PlainDate.from(bornOn);
  const on = Temporal.PlainDate.from(day);
  const years = on.year - born.year;
  const hadBirthday = on.month > born.month || (on.month === born.month && on.day >= born.day);
  return hadBirthday ? years : years - 1;
}
