import { readStart } from "@withy/diary/check-booking";
import { dayClock } from "@withy/diary/day-clock";
import { type DayRule, type DayRuleEnd, recurringDays } from "@withy/diary/recurring-days";
import { seriesOf } from "@withy/diary/series";
import fc from "fast-check";
import ICAL from "ical.js";
import { DateTime } from "luxon";
import { RRule } from "rrule";
import { describe, expect, it } from "vitest";

/** Days of rrule 2.8.1, an independent reading of RFC 5545. Its dates are taken as floating, without a zone. */
function byRrule(start: string, rule: string): string[] {
  const set = new RRule({ ...RRule.parseString(rule), dtstart: new Date(`${start}T09:00:00Z`) });
  return set.all((_, n) => n < 400).map((d) => d.toISOString().slice(0, 10));
}

/** Days of ical.js 2.2.1, a second independent reading. */
function byIcal(start: string, rule: string): string[] {
  const walk = ICAL.Recur.fromString(rule).iterator(ICAL.Time.fromDateTimeString(`${start}T09:00:00`));
  const days: string[] = [];
  for (let next = walk.next(); next && days.length < 400; next = walk.next())
    days.push(next.toString().slice(0, 10));
  return days;
}

const daysAfterNewYear2026 = (n: number): string =>
  new Date(Date.UTC(2026, 0, 1 + n)).toISOString().slice(0, 10);

const weekdays = [1, 2, 3, 4, 5];
type Example = [string, string, DayRule, DayRuleEnd, string[] | { count: number; last: string }];
const y = (year: number, ...days: string[]): string[] => days.map((d) => `${year}-${d}`);

// RFC 5545, 3.8.5.3, the examples for daily, weekly and monthly rules.
const examples: Example[] = [
  ["1997-09-02", "FREQ=DAILY;COUNT=10", { every: "day" }, { count: 10 }, { count: 10, last: "1997-09-11" }],
  [
    "1997-09-02",
    "FREQ=DAILY;UNTIL=19971224T000000Z",
    { every: "day" },
    { until: "1997-12-23" },
    { count: 113, last: "1997-12-23" },
  ],
  [
    "1997-09-02",
    "FREQ=DAILY;INTERVAL=10;COUNT=5",
    { every: "day", interval: 10 },
    { count: 5 },
    y(1997, "09-02", "09-12", "09-22", "10-02", "10-12"),
  ],
  [
    "1997-09-02",
    "FREQ=WEEKLY;COUNT=10",
    { every: "week" },
    { count: 10 },
    y(1997, "09-02", "09-09", "09-16", "09-23", "09-30", "10-07", "10-14", "10-21", "10-28", "11-04"),
  ],
  [
    "1997-09-02",
    "FREQ=WEEKLY;UNTIL=19971224T000000Z",
    { every: "week" },
    { until: "1997-12-23" },
    { count: 17, last: "1997-12-23" },
  ],
  [
    "1997-09-02",
    "FREQ=WEEKLY;INTERVAL=2;COUNT=8;WKST=SU;BYDAY=TU,TH",
    { every: "week", interval: 2, weekdays: [2, 4], weekStart: 7 },
    { count: 8 },
    y(1997, "09-02", "09-04", "09-16", "09-18", "09-30", "10-02", "10-14", "10-16"),
  ],
  [
    "1997-09-01",
    "FREQ=WEEKLY;INTERVAL=2;UNTIL=19971224T000000Z;WKST=SU;BYDAY=MO,WE,FR",
    { every: "week", interval: 2, weekdays: [1, 3, 5], weekStart: 7 },
    { until: "1997-12-23" },
    { count: 25, last: "1997-12-22" },
  ],
  // The pair that shows why the first day of the week matters.
  [
    "1997-08-05",
    "FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=MO",
    { every: "week", interval: 2, weekdays: [2, 7] },
    { count: 4 },
    y(1997, "08-05", "08-10", "08-19", "08-24"),
  ],
  [
    "1997-08-05",
    "FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=SU",
    { every: "week", interval: 2, weekdays: [2, 7], weekStart: 7 },
    { count: 4 },
    y(1997, "08-05", "08-17", "08-19", "08-31"),
  ],
  [
    "1997-09-05",
    "FREQ=MONTHLY;COUNT=10;BYDAY=1FR",
    { every: "month", weekdays: [{ weekday: 5, nth: 1 }] },
    { count: 10 },
    [
      ...y(1997, "09-05", "10-03", "11-07", "12-05"),
      ...y(1998, "01-02", "02-06", "03-06", "04-03", "05-01", "06-05"),
    ],
  ],
  [
    "1997-09-07",
    "FREQ=MONTHLY;INTERVAL=2;COUNT=10;BYDAY=1SU,-1SU",
    {
      every: "month",
      interval: 2,
      weekdays: [
        { weekday: 7, nth: 1 },
        { weekday: 7, nth: -1 },
      ],
    },
    { count: 10 },
    { count: 10, last: "1998-05-31" },
  ],
  [
    "1997-09-28",
    "FREQ=MONTHLY;COUNT=6;BYMONTHDAY=-3",
    { every: "month", monthDays: [-3] },
    { count: 6 },
    [...y(1997, "09-28", "10-29", "11-28", "12-29"), ...y(1998, "01-29", "02-26")],
  ],
  [
    "1997-09-02",
    "FREQ=MONTHLY;COUNT=10;BYMONTHDAY=2,15",
    { every: "month", monthDays: [2, 15] },
    { count: 10 },
    { count: 10, last: "1998-01-15" },
  ],
  [
    "1997-09-13",
    "FREQ=MONTHLY;COUNT=10;BYDAY=SA;BYMONTHDAY=7,8,9,10,11,12,13",
    { every: "month", weekdays: [6], monthDays: [7, 8, 9, 10, 11, 12, 13] },
    { count: 10 },
    { count: 10, last: "1998-06-13" },
  ],
  [
    "1997-09-04",
    "FREQ=MONTHLY;COUNT=3;BYDAY=TU,WE,TH;BYSETPOS=3",
    { every: "month", weekdays: [2, 3, 4], positions: [3] },
    { count: 3 },
    y(1997, "09-04", "10-07", "11-06"),
  ],
  [
    "1997-09-29",
    "FREQ=MONTHLY;COUNT=7;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-2",
    { every: "month", weekdays, positions: [-2] },
    { count: 7 },
    [...y(1997, "09-29", "10-30", "11-27", "12-30"), ...y(1998, "01-29", "02-26", "03-30")],
  ],
];

describe("recurring days, by RFC 5545", () => {
  it.each(examples)("from %s: %s", (start, text, rule, end, expected) => {
    const days = recurringDays(start, rule, end);
    if (Array.isArray(expected)) expect(days).toEqual(expected);
    else expect({ count: days.length, last: days.at(-1) }).toEqual(expected);
    expect(days).toEqual(byRrule(start, text));
    expect(days).toEqual(byIcal(start, text));
  });

  it("agrees with rrule on rules of its own making", () => {
    const codes = ["MO", "TU", "WE", "TH", "FR", "SA", "SU"];
    const days = fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1, maxLength: 4 });
    const start = fc.integer({ min: 0, max: 700 }).map(daysAfterNewYear2026);
    fc.assert(
      fc.property(
        start,
        fc.constantFrom("week" as const, "month" as const),
        fc.integer({ min: 1, max: 4 }),
        days,
        (first, every, interval, list) => {
          const freq = every === "week" ? "WEEKLY" : "MONTHLY";
          const text = `FREQ=${freq};INTERVAL=${interval};COUNT=12;BYDAY=${list.map((d) => codes[d - 1]).join(",")}`;
          expect(recurringDays(first, { every, interval, weekdays: list }, { count: 12 })).toEqual(
            byRrule(first, text),
          );
        },
      ),
    );
  });
});

const zone = "Europe/London";
const iso = (at: Date | object): string => (at instanceof Date ? at.toISOString().slice(0, 16) : "refused");

describe("Europe/London, by the time zone database (luxon 3.7.2 as the second opinion)", () => {
  it.each([
    ["2026-03-29", 23],
    ["2027-03-28", 23],
    ["2028-03-26", 23],
    ["2026-10-25", 25],
    ["2027-10-31", 25],
    ["2028-10-29", 25],
    ["2026-12-01", 24],
  ])("%s has %i hours", (day, hours) => {
    const clock = dayClock(day, zone);
    expect((clock.endsAt - clock.startsAt) / 3_600_000).toBe(hours);
    const start = DateTime.fromISO(day, { zone });
    expect(clock.startsAt).toBe(start.toMillis());
    expect(clock.endsAt).toBe(start.plus({ days: 1 }).toMillis());
  });

  it.each([
    ["2026-10-20", ["2026-10-20T08:00", "2026-10-27T09:00"]],
    ["2027-03-23", ["2027-03-23T09:00", "2027-03-30T08:00"]],
  ])("weekly at 09:00 from %s", (firstDay, expected) => {
    const visits = seriesOf({
      firstDay,
      time: "09:00",
      zone,
      visits: 2,
      rhythm: { kind: "interval", days: 7 },
    });
    expect(visits.map((v) => ("startsAt" in v ? iso(v.startsAt) : "refused"))).toEqual(expected);
  });

  it("refuses 01:30 on 28 March 2027, which does not exist", () => {
    expect(readStart("2027-03-28", "01:30", zone)).toMatchObject({ kind: "clock-gap" });
  });

  it("takes the first of the two half past ones on 25 October 2026", () => {
    const start = readStart("2026-10-25", "01:30", zone);
    expect(iso(start)).toBe("2026-10-25T00:30");
    expect(DateTime.fromISO("2026-10-25T00:30:00Z", { zone }).toFormat("HH:mm ZZ")).toBe("01:30 +01:00");
  });

  it("agrees with luxon on every quarter of an hour that exists, over two years", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 730 }), fc.integer({ min: 0, max: 95 }), (n, quarter) => {
        const day = daysAfterNewYear2026(n);
        const time = `${String(Math.floor(quarter / 4)).padStart(2, "0")}:${String((quarter % 4) * 15).padStart(2, "0")}`;
        const start = readStart(day, time, zone);
        const other = DateTime.fromISO(`${day}T${time}`, { zone });
        if (start instanceof Date)
          expect(DateTime.fromJSDate(start, { zone }).toFormat("yyyy-MM-dd HH:mm")).toBe(`${day} ${time}`);
        else expect(other.toFormat("HH:mm")).not.toBe(time);
      }),
      { numRuns: 500 },
    );
  });
});
