import { addMinutes, minutesBetween } from "@withy/core/zoned-time";
import type { AppointmentStateCode } from "../schema";
import type { Stage } from "./stage";

export interface Fate {
  readonly state: AppointmentStateCode;
  readonly bookedAt: Date;
  readonly cancelledAt: Date | null;
}

const day = 1_440;

/** What has become of a visit by now, from its time alone and the dice: shares of a well-run clinic (common practice). */
export function fateOf(
  { random, now }: Stage,
  startsAt: Date,
  endsAt: Date,
  { isFirst, isCertain }: { isFirst: boolean; isCertain: boolean },
): Fate {
  const earliest = addMinutes(
    startsAt,
    -random.int(isFirst ? 2 : 5, isFirst ? 10 : 14) * day - random.int(0, 400),
  );
  const bookedAt = earliest < now ? earliest : addMinutes(now, -random.int(30, 6 * day));
  if (!isCertain && random.chance(0.07)) {
    const notice = random.chance(0.35) ? random.int(2, 23) * 60 : random.int(1, 4) * day;
    const wanted = addMinutes(startsAt, -notice);
    const latest = wanted < now ? wanted : addMinutes(now, -random.int(5, 2 * day));
    if (latest > bookedAt) return { state: "cancelled", bookedAt, cancelledAt: latest };
  }
  return { state: stateOf(random, startsAt, endsAt, now, isCertain), bookedAt, cancelledAt: null };
}

function stateOf(
  random: Stage["random"],
  startsAt: Date,
  endsAt: Date,
  now: Date,
  isCertain: boolean,
): AppointmentStateCode {
  if (endsAt <= now) return !isCertain && random.chance(0.05) ? "noshow" : "fulfilled";
  if (startsAt <= now) return random.chance(0.85) ? "in-session" : "arrived";
  const ahead = minutesBetween(now, startsAt);
  if (ahead <= 15) return random.chance(0.6) ? "arrived" : "confirmed";
  const share = ahead < day ? 0.7 : ahead < 3 * day ? 0.4 : 0.05;
  return random.chance(share) ? "confirmed" : "booked";
}

/** How full a day is, from how far ahead it lies. */
export function fillOf(daysAhead: number, busyness: number): number {
  const share = daysAhead <= 0 ? 0.9 : 0.92 * Math.exp(-daysAhead / 24);
  return share * busyness;
}
