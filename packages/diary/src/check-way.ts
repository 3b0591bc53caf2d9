import { type Refusal, refusal } from "@withy/core/refusal";
import { timeOf } from "@withy/core/zoned-time";
import { type Interval, overlaps } from "./interval";

/** A therapist's visit at another site, its clean-down included, with the way there and back in minutes. */
export interface AwayVisit extends Interval {
  readonly siteName: string;
  readonly minutesThere: number;
  readonly minutesBack: number;
}

export interface WayFacts {
  readonly startsAt: Date;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
  readonly site: { readonly name: string; readonly zone: string };
  readonly therapist: { readonly name: string };
  readonly away?: readonly AwayVisit[];
  readonly overrideReason?: string | undefined;
}

const minuteMs = 60_000;
const gridMs = 5 * minuteMs;
const minutesWords = (n: number): string => (n === 1 ? "1 minute" : `${n} minutes`);

/**
 * Whether a visit leaves its therapist the way from and to visits at other sites. A visit that overlaps one is not
 * told here: that time is simply taken. Gives way to a reason.
 */
export function checkWay(f: WayFacts): Refusal | null {
  if ((f.overrideReason ?? "").trim() !== "") return null;
  const from = f.startsAt.getTime();
  const visit = { from, to: from + (f.durationMinutes + f.cleanDownMinutes) * minuteMs };
  const clock = (at: number): string => timeOf(new Date(at), f.site.zone);
  for (const a of f.away ?? []) {
    if (overlaps(a, visit)) continue;
    const arrives = a.to + a.minutesBack * minuteMs;
    if (a.to <= visit.from && arrives > visit.from) {
      const earliest = clock(Math.ceil(arrives / gridMs) * gridMs);
      const message = `${f.therapist.name} is at ${a.siteName} until ${clock(a.to)}, and the way to ${f.site.name} takes ${minutesWords(a.minutesBack)}. Choose ${earliest} or later, or say why it is booked all the same.`;
      return refusal("too-far-apart", message, "startsAt");
    }
    if (a.from >= visit.to && visit.to + a.minutesThere * minuteMs > a.from) {
      const message = `${f.therapist.name} has to be at ${a.siteName} at ${clock(a.from)}, and the way from ${f.site.name} takes ${minutesWords(a.minutesThere)}. Choose an earlier time, or say why it is booked all the same.`;
      return refusal("too-far-apart", message, "startsAt");
    }
  }
  return null;
}
