import type { PlainDateText } from "./plain-date";

/** A clock time "09:05". */
export type PlainTimeText = string;

const clocks = new Map<string, Intl.DateTimeFormat>();

function clockOf(zone: string): Intl.DateTimeFormat {
  const known = clocks.get(zone);
  if (known) return known;
  const clock = new Intl.DateTimeFormat("sv-SE", {
    timeZone: zone,
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
    hour: "2-digit",
    minute: "2-digit",
    hourCycle: "h23",
  });
  clocks.set(zone, clock);
  return clock;
}

/** The Swedish form "2026-12-01 09:05" is the ISO one. */
const wallOf = (at: Date, zone: string): string => clockOf(zone).format(at);

/** The site's calendar day at that instant. */
export const dayOf = (at: Date, zone: string): PlainDateText => wallOf(at, zone).slice(0, 10);

/** The site's wall-clock time "HH:MM" at that instant. */
export const timeOf = (at: Date, zone: string): PlainTimeText => wallOf(at, zone).slice(11, 16);
