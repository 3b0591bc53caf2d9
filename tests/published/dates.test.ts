import { clockDuration, longDate, proseTime, readDate } from "@withy/core/date-words";
import {
  addMonths,
  ageOn,
  dayBounds,
  dayOf,
  instantAt,
  isPlainDate,
  timeOf,
  weekdayOf,
} from "@withy/core/zoned-time";
import fc from "fast-check";
import { DateTime } from "luxon";
import { describe, expect, test } from "vitest";

const london = "Europe/London";

// Someone born on 29 February has their birthday on 1 March in common years: UK reading, from memory.
describe("age", () => {
  test.each([
    ["2000-02-29", "2026-02-28", 25],
    ["2000-02-29", "2026-03-01", 26],
    ["2000-02-29", "2028-02-29", 28],
    ["2008-12-02", "2026-12-01", 17],
    ["2008-12-02", "2026-12-02", 18],
  ])("born %s, on %s: %i", (born, on, years) => expect(ageOn(born, on)).toBe(years));

  test("agrees with an independent library for every other birthday", () => {
    const day = fc
      .date({ min: new Date("1920-01-01"), max: new Date("2030-12-31"), noInvalidDate: true })
      .map((d) => d.toISOString().slice(0, 10));
    fc.assert(
      fc.property(day, day, (a, b) => {
        const [born, on] = a < b ? [a, b] : [b, a];
        fc.pre(!born.endsWith("-02-29"));
        expect(ageOn(born, on)).toBe(
          Math.floor(DateTime.fromISO(on).diff(DateTime.fromISO(born), "years").years),
        );
      }),
    );
  });
});

// tz database 2025c: clocks go forward on 29 March 2026 and back on 25 October 2026.
describe("the clocks change in London", () => {
  test("half past one does not exist on the day they go forward", () => {
    expect(instantAt("2026-03-29", "01:30", london)).toBeNull();
    expect(instantAt("2026-03-29", "02:00", london)?.toISOString()).toBe("2026-03-29T01:00:00.000Z");
  });

  test("half past one happens twice on the day they go back, and the first is meant", () => {
    expect(instantAt("2026-10-25", "01:30", london)?.toISOString()).toBe("2026-10-25T00:30:00.000Z");
  });

  test.each([
    ["2026-03-29", 23],
    ["2026-10-25", 25],
    ["2026-12-01", 24],
  ])("%s has %i hours", (day, hours) => {
    const { from, to } = dayBounds(day, london);
    expect((to.getTime() - from.getTime()) / 3_600_000).toBe(hours);
  });

  test("day and time of an instant agree with an independent library", () => {
    const instant = fc.date({
      min: new Date("2020-01-01T00:00:00Z"),
      max: new Date("2035-12-31T00:00:00Z"),
      noInvalidDate: true,
    });
    fc.assert(
      fc.property(instant, fc.constantFrom(london, "America/New_York", "Asia/Kathmandu"), (at, zone) => {
        const other = DateTime.fromJSDate(at, { zone });
        expect(`${dayOf(at, zone)} ${timeOf(at, zone)}`).toBe(other.toFormat("yyyy-MM-dd HH:mm"));
      }),
    );
  });
});

// ISO 8601: Monday is 1.
describe("weekdays", () => {
  test.each([
    ["2026-01-01", 4],
    ["2026-12-31", 4],
    ["2027-01-01", 5],
    ["2027-01-04", 1],
  ])("%s is weekday %i", (day, weekday) => expect(weekdayOf(day)).toBe(weekday));
});

// A month on from the last day of a longer month is the last day of the shorter one: ICO guidance on time limits.
describe("a month from a day", () => {
  test.each([
    ["2027-01-31", "2027-02-28"],
    ["2028-01-31", "2028-02-29"],
    ["2026-09-03", "2026-10-03"],
    ["2026-12-01", "2027-01-01"],
  ])("%s gives %s", (from, to) => expect(addMonths(from, 1)).toBe(to));
});

// Forms as people in the United Kingdom type them: day, month, year. Common practice.
describe("dates as they are typed", () => {
  const today = "2026-12-01";
  test.each([
    ["6/5/2026", "2026-05-06"],
    ["6 5 26", "2026-05-06"],
    ["06.05.2026", "2026-05-06"],
    ["06052026", "2026-05-06"],
    ["6 May 2026", "2026-05-06"],
    ["2026-05-06", "2026-05-06"],
    ["tomorrow", "2026-12-02"],
    ["in 2 weeks", "2026-12-15"],
    ["thu", "2026-12-03"],
  ])("%s is %s", (text, expected) => expect(readDate(text, today)).toBe(expected));

  test.each(["31/2/2026", "29/2/2027", "13/13/2026", "soon", ""])("%s is no date", (text) =>
    expect(readDate(text, today)).toBeNull(),
  );

  test("a date of birth is never in the future", () => {
    expect(readDate("22 6 63", today, { past: true })).toBe("1963-06-22");
    expect(readDate("29 2 00", today, { past: true })).toBe("2000-02-29");
  });

  test("only whole dates that exist are plain dates", () => {
    expect(isPlainDate("2028-02-29")).toBe(true);
    expect(isPlainDate("2026-02-29")).toBe(false);
    expect(isPlainDate("2026-2-9")).toBe(false);
  });
});

describe("words for dates and times", () => {
  test("prose", () => {
    expect(longDate("2026-05-06")).toBe("Wednesday 6 May 2026");
    expect(proseTime("17:30")).toBe("5:30pm");
    expect(proseTime("00:15")).toBe("12:15am");
    expect(proseTime("12:00")).toBe("noon");
  });

  test("ten items, two rounds, thirty seconds of work and thirty of rest", () => {
    expect(clockDuration(10 * 2 * (30 + 30))).toBe("20:00");
  });
});
