import type { PlainDateText, PlainTimeText } from "@withy/core/zoned-time";
import { Temporal } from "temporal-polyfill";

/**
 * One calendar day of a zone with its clock, so that thousands of wall-clock times can be reckoned without asking
 * the zone each time. All instants are milliseconds since the epoch; wall times are minutes after midnight.
 */
export interface DayClock {
  readonly day: PlainDateText;
  /** 1 Monday to 7 Sunday. */
  readonly weekday: number;
  readonly startsAt: number;
  readonly endsAt: number;
  /**
   * The first instant of the day at which the clock shows that time or later. A time that the clocks jump over
   * gives the instant of the jump; a time shown twice gives the first. 1440 is the end of the day.
   */
  instantOf(wallMinutes: number): number;
  /** What the clock shows, in minutes after midnight, at an instant of this day. */
  wallOf(instant: number): number;
}

/** @throws RangeError when the text is not "HH:MM" from "00:00" to "24:00" */
export function wallMinutes(time: PlainTimeText): number {
  const match = /^(\d{2}):(\d{2})(?::00)?$/.exec(time);
  const minutes = match ? Number(match[1]) * 60 + Number(match[2]) : Number.NaN;
  if (!(minutes >= 0 && minutes <= 1440) || Number(match?.[2]) > 59) throw new RangeError("A time is HH:MM.");
  return minutes;
}

function nextChange(from: Temporal.ZonedDateTime, to: Temporal.ZonedDateTime): Temporal.ZonedDateTime | null {
  const change = from.getTimeZoneTransition("next");
  return change !== null && change.epochMilliseconds < to.epochMilliseconds ? change : null;
}

const made = new Map<string, DayClock>();

/** The clock of a day; remembered, since a zone's rules do not change while the program runs. */
export function dayClock(day: PlainDateText, zone: string): DayClock {
  const key = `${day}${zone}`;
  const known = made.get(key);
  if (known) return known;
  const clock = makeClock(day, zone);
  if (made.size > 5000) made.clear();
  made.set(key, clock);
  return clock;
}

function makeClock(day: PlainDateText, zone: string): DayClock {
  const date = Temporal.PlainDate.from(day);
  const start = date.toZonedDateTime(zone);
  const end = date.add({ days: 1 }).toZonedDateTime(zone);
  const change = nextChange(start, end);
  const startsAt = start.epochMilliseconds;
  const endsAt = end.epochMilliseconds;
  const startWall = start.hour * 60 + start.minute;
  const changeAt = change?.epochMilliseconds ?? endsAt;
  const wallAfter = change ? change.hour * 60 + change.minute : 1440;
  const wallBefore = startWall + (changeAt - startsAt) / 60_000;
  return {
    day,
    weekday: date.dayOfWeek,
    startsAt,
    endsAt,
    instantOf(minutes) {
      if (minutes <= startWall) return startsAt;
      if (minutes < wallBefore) return startsAt + (minutes - startWall) * 60_000;
      return Math.min(changeAt + Math.max(0, minutes - wallAfter) * 60_000, endsAt);
    },
    wallOf(instant) {
      return instant < changeAt
        ? startWall + (instant - startsAt) / 60_000
        : wallAfter + (instant - changeAt) / 60_000;
    },
  };
}

/** The days that an interval touches, each with its clock; from the day of `from` to the day before or of `to`. */
export function dayClocks(from: Date, to: Date, zone: string): DayClock[] {
  const days: DayClock[] = [];
  let date = Temporal.Instant.fromEpochMilliseconds(from.getTime()).toZonedDateTimeISO(zone).toPlainDate();
  for (let clock = dayClock(date.toString(), zone); clock.startsAt < to.getTime(); ) {
    days.push(clock);
    date = date.add({ days: 1 });
    clock = dayClock(date.toString(), zone);
  }
  return days;
}
