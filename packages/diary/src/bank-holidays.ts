import type { PlainDateText } from "@withy/core/zoned-time";
import { weekdayOf } from "@withy/core/zoned-time";
import Holidays from "date-holidays";

export const nations = ["england", "wales", "scotland", "northern-ireland"] as const;
export type Nation = (typeof nations)[number];

export interface BankHoliday {
  readonly on: PlainDateText;
  readonly name: string;
}

const regions: Record<Nation, string> = {
  england: "eng",
  wales: "wls",
  scotland: "sct",
  "northern-ireland": "nir",
};

interface Correction {
  readonly nation: Nation;
  readonly on: PlainDateText;
  /** The holiday's name, or null where the calendar library lists one that is none. */
  readonly name: string | null;
  readonly source: string;
}

/** Where the calendar library and the published lists differ. One-off holidays are made by proclamation. */
const corrections: readonly Correction[] = [
  {
    nation: "scotland",
    on: "2026-06-15",
    name: "World Cup bank holiday",
    source: "Royal Proclamation, announced by the Scottish Government in February 2026",
  },
];

const cache = new Map<string, readonly BankHoliday[]>();

function listYear(nation: Nation, year: number): readonly BankHoliday[] {
  const found = new Holidays("GB", regions[nation])
    .getHolidays(year)
    .filter((h) => h.type === "public")
    .map((h) => ({ on: h.date.slice(0, 10), name: h.name.replace(/’/g, "'") }))
    // The published lists leave out a holiday that falls on a weekend and name its substitute instead.
    .filter((h) => weekdayOf(h.on) <= 5);
  const fixes = corrections.filter((c) => c.nation === nation && c.on.startsWith(`${year}-`));
  const kept = found.filter((h) => !fixes.some((c) => c.on === h.on));
  const added = fixes.flatMap((c) => (c.name === null ? [] : [{ on: c.on, name: c.name }]));
  return [...kept, ...added].sort((a, b) => a.on.localeCompare(b.on));
}

/**
 * The bank holidays of one nation of the United Kingdom in a calendar year, as the government publishes them:
 * weekdays only, substitutes in place of holidays on a weekend. Source: date-holidays, put right by the
 * corrections above.
 */
export function bankHolidays(nation: Nation, year: number): readonly BankHoliday[] {
  const key = `${nation}/${year}`;
  const known = cache.get(key);
  if (known) return known;
  const list = listYear(nation, year);
  cache.set(key, list);
  return list;
}

/** The bank holiday on that day, or null. */
export function bankHolidayOn(nation: Nation, day: PlainDateText): BankHoliday | null {
  return bankHolidays(nation, Number(day.slice(0, 4))).find((h) => h.on === day) ?? null;
}
