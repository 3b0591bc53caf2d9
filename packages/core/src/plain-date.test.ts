import fc from "fast-check";
import { Temporal } from "temporal-polyfill";
import { describe, expect, it } from "vitest";
import {
  addDays,
  addMonths,
  daysBetween,
  isPlainDate,
  monthBounds,
  plainDateOf,
  weekdayOf,
} from "./plain-date";

// The reference is the polyfill of TC39's Temporal proposal.
const dates = fc
  .integer({ min: -135_140, max: 2_900_000 })
  .map((n) => Temporal.PlainDate.from("1970-01-01").add({ days: n }));
const texts = dates.map(String);

describe("plain dates reckon as Temporal does", () => {
  it("weekday, days on, months on", () => {
    fc.assert(
      fc.property(dates, fc.integer({ min: -9000, max: 9000 }), (date, n) => {
        expect(weekdayOf(date.toString())).toBe(date.dayOfWeek);
        const on = date.add({ days: n });
        if (on.year <= 9999) expect(addDays(date.toString(), n)).toBe(on.toString());
        const months = date.add({ months: n % 500 });
        if (months.year <= 9999) expect(addMonths(date.toString(), n % 500)).toBe(months.toString());
      }),
    );
  });

  it("days between two dates", () => {
    fc.assert(
      fc.property(texts, texts, (a, b) => {
        const until = Temporal.PlainDate.from(a).until(b, { largestUnit: "day" });
        expect(daysBetween(a, b)).toBe(until.days);
      }),
    );
  });

  it("which texts and parts are dates", () => {
    const parts = fc.record({
      year: fc.integer({ min: 1600, max: 9999 }),
      month: fc.integer({ min: 0, max: 14 }),
      day: fc.integer({ min: 0, max: 33 }),
    });
    fc.assert(
      fc.property(parts, ({ year, month, day }) => {
        let expected: string | null = null;
        try {
          expected = Temporal.PlainDate.from({ year, month, day }, { overflow: "reject" }).toString();
        } catch {
          // Not a day of the calendar.
        }
        expect(plainDateOf(year, month, day)).toBe(expected);
      }),
    );
    expect(["2026-02-29", "2026-1-1", "", "2026-02-28T00:00"].map(isPlainDate)).toEqual([
      false,
      false,
      false,
      false,
    ]);
  });

  it("a month's first day and the next one's, over a year's end", () => {
    expect(monthBounds("2026-12")).toEqual({ firstOn: "2026-12-01", nextOn: "2027-01-01" });
  });

  it("says what is wrong with what is no date", () => {
    expect(() => addDays("2026-02-30", 1)).toThrow(RangeError);
    expect(() => weekdayOf("tomorrow")).toThrow(RangeError);
  });
});
