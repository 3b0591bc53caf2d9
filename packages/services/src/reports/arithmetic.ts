import { divideRounded } from "@withy/core/money";

/**
 * The share of a whole, in basis points (7833 is 78.33 %), rounded to the nearest; null where the whole is zero,
 * which is "no data" and neither 0 % nor 100 %.
 */
export function proportion(part: number, whole: number): number | null {
  return whole === 0 ? null : divideRounded(part * 10_000, whole);
}

/** How many of one thing for each of another, in hundredths (557 is 5.57); null where there is none of the other. */
export function perEach(things: number, each: number): number | null {
  return each === 0 ? null : divideRounded(things * 100, each);
}

/** Pence for each hour of so many minutes, rounded to the nearest penny; null without a minute. */
export function pencePerHour(pence: number, minutes: number): number | null {
  return minutes === 0 ? null : divideRounded(pence * 60, minutes);
}

export interface Rota {
  readonly rotaMinutes: number;
  readonly breakMinutes: number;
  readonly leaveMinutes: number;
  readonly adminMinutes: number;
  readonly closedMinutes: number;
}

/** Minutes on offer: the rota less breaks, leave, admin and closed days; never below zero. */
export function minutesOnOffer(r: Rota): number {
  return Math.max(0, r.rotaMinutes - r.breakMinutes - r.leaveMinutes - r.adminMinutes - r.closedMinutes);
}
