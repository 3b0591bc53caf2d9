import type { HeatView } from "@withy/contracts/reports";
import { dayOf } from "@withy/core/zoned-time";
import { type DayClock, dayClock } from "@withy/diary/day-clock";
import { type Interval, interval, totalMinutes, union } from "@withy/diary/interval";
import type { Offered } from "./load-hours";
import type { MonthVisit } from "./load-visits";
import { counts } from "./visit-figures";

/** Minutes on offer, booked and delivered of one therapist at one site. */
export interface UtilisationCell {
  readonly therapistId: string;
  readonly siteId: string;
  readonly onOfferMinutes: number;
  readonly bookedMinutes: number;
  readonly deliveredMinutes: number;
}

/** Time is counted once however many visits share it, so that a class does not count as many hours. */
export function reckonUtilisation(
  offered: readonly Offered[],
  visits: readonly MonthVisit[],
): UtilisationCell[] {
  const keyOf = (row: { therapistId: string; siteId: string }) => `${row.therapistId} ${row.siteId}`;
  const byKey = new Map<string, MonthVisit[]>();
  for (const visit of visits) byKey.set(keyOf(visit), [...(byKey.get(keyOf(visit)) ?? []), visit]);
  const onOffer = new Map(offered.map((o) => [keyOf(o), totalMinutes(o.intervals)]));
  return [...new Set([...onOffer.keys(), ...byKey.keys()])].map((key) => {
    const [therapistId = "", siteId = ""] = key.split(" ");
    const theirs = byKey.get(key) ?? [];
    return {
      therapistId,
      siteId,
      onOfferMinutes: onOffer.get(key) ?? 0,
      bookedMinutes: minutesOf(theirs.filter((v) => counts("booked", v.state))),
      deliveredMinutes: minutesOf(theirs.filter((v) => counts("delivered", v.state))),
    };
  });
}

function minutesOf(visits: readonly MonthVisit[]): number {
  return totalMinutes(union(visits.map((v) => interval(v.startsAt, v.endsAt))));
}

/** Percent booked in each hour of each weekday, by each site's own clock. */
export function reckonHeat(
  offered: readonly Offered[],
  visits: readonly MonthVisit[],
  zoneOf: (siteId: string) => string,
): HeatView {
  const onOffer = new Map<string, number>();
  const booked = new Map<string, number>();
  for (const { intervals, zone } of offered) for (const i of intervals) addByHour(onOffer, i, zone);
  for (const visit of visits)
    if (counts("booked", visit.state))
      addByHour(booked, interval(visit.startsAt, visit.endsAt), zoneOf(visit.siteId));
  const slots = [...onOffer.keys()].map((key) => key.split(" ").map(Number));
  const hours = range(slots.map(([, hour = 0]) => hour));
  const weekdays = range(slots.map(([weekday = 1]) => weekday));
  return {
    hours,
    rows: weekdays.map((weekday) => ({
      weekday,
      percent: hours.map((hour) => {
        const whole = onOffer.get(`${weekday} ${hour}`) ?? 0;
        return whole === 0 ? null : Math.round(((booked.get(`${weekday} ${hour}`) ?? 0) / whole) * 100);
      }),
    })),
  };
}

function range(values: readonly number[]): number[] {
  if (values.length === 0) return [];
  const [least, most] = [Math.min(...values), Math.max(...values)];
  return Array.from({ length: most - least + 1 }, (_, i) => least + i);
}

/** Adds an interval's minutes to the hours of the weekday that it touches. */
function addByHour(sums: Map<string, number>, whole: Interval, zone: string): void {
  for (let from = whole.from; from < whole.to; ) {
    const clock: DayClock = dayClock(dayOf(new Date(from), zone), zone);
    const hour = Math.floor(clock.wallOf(from) / 60);
    const to = Math.min(whole.to, nextHour(clock, hour, from));
    const key = `${clock.weekday} ${hour}`;
    sums.set(key, (sums.get(key) ?? 0) + (to - from) / 60_000);
    from = to;
  }
}

/** The end of the hour, or of the day; always ahead, also on a day whose clock goes back. */
function nextHour(clock: DayClock, hour: number, from: number): number {
  const end = clock.instantOf((hour + 1) * 60);
  return end > from ? end : Math.min(clock.endsAt, from + 3_600_000);
}
