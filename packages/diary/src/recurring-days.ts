import type { PlainDateText } from "@withy/core/zoned-time";
import { Temporal } from "temporal-polyfill";

/**
 * A rule for days that come round: "every other Tuesday and Thursday", "the first Friday of the month". The terms
 * and their meaning are those of RFC 5545, 3.3.10, for DAILY, WEEKLY and MONTHLY rules.
 */
export interface DayRule {
  readonly every: "day" | "week" | "month";
  /** Every so many days, weeks or months; 1 where absent. */
  readonly interval?: number;
  /** Weekdays, 1 Monday to 7 Sunday; in a month, `nth` picks one of them (1 first, -1 last). */
  readonly weekdays?: readonly (number | { readonly weekday: number; readonly nth: number })[];
  /** Days of the month, from 1, or from the end with -1. */
  readonly monthDays?: readonly number[];
  /** Keeps only these of the days that the rule gives in each month, from 1, or from the end with -1. */
  readonly positions?: readonly number[];
  /** First day of the week, 1 Monday to 7 Sunday; Monday where absent. */
  readonly weekStart?: number;
}

export interface DayRuleEnd {
  /** How many days at most. */
  readonly count?: number;
  /** The last day that may be given. */
  readonly until?: PlainDateText;
}

type Plain = Temporal.PlainDate;

const pick = <T>(list: readonly T[], position: number): T | undefined =>
  list.at(position > 0 ? position - 1 : position);
const weekdayOfRule = (w: number | { readonly weekday: number }): number =>
  typeof w === "number" ? w : w.weekday;

function daysOfWeek(start: Plain, rule: DayRule, first: Plain): Plain[] {
  const wanted = rule.weekdays?.map(weekdayOfRule) ?? [first.dayOfWeek];
  return Array.from({ length: 7 }, (_, i) => start.add({ days: i })).filter((d) =>
    wanted.includes(d.dayOfWeek),
  );
}

function daysOfMonth(start: Plain, rule: DayRule, first: Plain): Plain[] {
  const all = Array.from({ length: start.daysInMonth }, (_, i) => start.add({ days: i }));
  const monthDays = rule.monthDays ?? (rule.weekdays === undefined ? [first.day] : undefined);
  const byDate = all.filter((d) => !monthDays || monthDays.some((n) => pick(all, n)?.day === d.day));
  const kept = byDate.filter(
    (d) =>
      rule.weekdays?.some((w) => {
        if (weekdayOfRule(w) !== d.dayOfWeek) return false;
        return (
          typeof w === "number" ||
          pick(
            all.filter((x) => x.dayOfWeek === w.weekday),
            w.nth,
          )?.day === d.day
        );
      }) ?? true,
  );
  if (rule.positions === undefined) return kept;
  const chosen = rule.positions.map((p) => pick(kept, p)?.day);
  return kept.filter((d) => chosen.includes(d.day));
}

function period(n: number, rule: DayRule, first: Plain): Plain[] {
  const step = n * (rule.interval ?? 1);
  if (rule.every === "day") {
    const day = first.add({ days: step });
    return (rule.weekdays?.map(weekdayOfRule).includes(day.dayOfWeek) ?? true) ? [day] : [];
  }
  if (rule.every === "month") return daysOfMonth(first.with({ day: 1 }).add({ months: step }), rule, first);
  const back = (first.dayOfWeek - (rule.weekStart ?? 1) + 7) % 7;
  return daysOfWeek(first.subtract({ days: back }).add({ weeks: step }), rule, first);
}

/**
 * The days of a rule from its first day on, in order. The first day itself counts only if the rule gives it. A
 * month without the day asked for (the 31st) gives none.
 * @throws RangeError when neither a count nor a last day ends it
 */
export function recurringDays(firstDay: PlainDateText, rule: DayRule, end: DayRuleEnd): PlainDateText[] {
  if (end.count === undefined && end.until === undefined)
    throw new RangeError("Say how many, or until when.");
  const first = Temporal.PlainDate.from(firstDay);
  // Ten years bound a rule that never gives a day.
  const stop = end.until ?? first.add({ years: 10 }).toString();
  const days: PlainDateText[] = [];
  for (let n = 0; ; n += 1) {
    for (const d of period(n, rule, first)) {
      const text = d.toString();
      if (text < firstDay) continue;
      if (text > stop || days.length === end.count) return days;
      days.push(text);
    }
    if (first.add({ days: n * (rule.interval ?? 1) }).toString() > stop) return days;
    if (days.length === end.count) return days;
  }
}
