import type { PlainDateText, PlainTimeText } from "@withy/core/zoned-time";
import { daysBetween } from "@withy/core/zoned-time";

/** A stretch of a day by the site's clock, "HH:MM"; "24:00" is the end of the day. */
export interface ClockRange {
  readonly startsAt: PlainTimeText;
  readonly endsAt: PlainTimeText;
}

/** When a therapist works at a site: one weekday's hours, between two dates, every so many weeks. */
export interface WorkingPattern extends ClockRange {
  readonly staffMemberId: string;
  readonly siteId: string;
  /** 1 Monday to 7 Sunday. */
  readonly weekday: number;
  readonly validFrom: PlainDateText;
  /** The last day on which it holds; null while it has no end. */
  readonly validUntil: PlainDateText | null;
  /** 1 every week; 2 alternate weeks, and so on, counted from the week of `validFrom`. */
  readonly everyWeeks: number;
  readonly breaks: readonly ClockRange[];
}

/** 1970-01-05 was a Monday; weeks run from Monday as in ISO 8601. */
const weekNumber = (day: PlainDateText): number => Math.floor(daysBetween("1970-01-05", day) / 7);

/** Whether the pattern is worked on that day, whose ISO weekday the caller already knows. */
export function isWorkedOn(pattern: WorkingPattern, day: PlainDateText, weekday: number): boolean {
  if (pattern.weekday !== weekday || day < pattern.validFrom) return false;
  if (pattern.validUntil !== null && day > pattern.validUntil) return false;
  if (pattern.everyWeeks <= 1) return true;
  return (weekNumber(day) - weekNumber(pattern.validFrom)) % pattern.everyWeeks === 0;
}
