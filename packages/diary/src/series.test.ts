import { addDays, timeOf } from "@withy/core/zoned-time";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type CourseRhythm, courseDays, dayAfterCourse, seriesOf } from "./series";

const zone = "Europe/London";
const weekly: CourseRhythm = { kind: "interval", days: 7 };

describe("a course of visits", () => {
  it("keeps the clock time through both changes of a year", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 287 }), fc.integer({ min: 1, max: 4 }), (slot, weeks) => {
        const time = `${String(Math.floor(slot / 12)).padStart(2, "0")}:${String((slot % 12) * 5).padStart(2, "0")}`;
        const rhythm: CourseRhythm = { kind: "interval", days: weeks * 7 };
        // Wednesdays: the clocks change on Sundays, so every visit happens.
        for (const v of seriesOf({ firstDay: "2026-01-07", time, zone, visits: 52, rhythm }))
          expect("startsAt" in v && timeOf(v.startsAt, zone)).toBe(time);
      }),
      { numRuns: 30 },
    );
  });

  it("says which visit falls into the hour that does not happen", () => {
    const visits = seriesOf({ firstDay: "2027-03-21", time: "01:30", zone, visits: 3, rhythm: weekly });
    expect(visits.map((v) => ("refusal" in v ? v.refusal.kind : v.startsAt.toISOString()))).toEqual([
      "2027-03-21T01:30:00.000Z",
      "clock-gap",
      "2027-04-04T00:30:00.000Z",
    ]);
  });

  it.each([
    [weekly, 3, ["2026-12-01", "2026-12-08", "2026-12-15"]],
    [{ kind: "interval", days: 10 }, 3, ["2026-12-01", "2026-12-11", "2026-12-21"]],
    [{ kind: "weekdays", weekdays: [2, 4] }, 3, ["2026-12-01", "2026-12-03", "2026-12-08"]],
    [{ kind: "weekdays", weekdays: [1] }, 2, ["2026-12-07", "2026-12-14"]],
    [{ kind: "weekdays", weekdays: [5, 1] }, 3, ["2026-12-04", "2026-12-07", "2026-12-11"]],
  ] as const)("%j, %i visits", (rhythm, visits, days) => {
    expect(courseDays("2026-12-01", visits, rhythm)).toEqual(days);
  });

  it("goes on after its last visit as if it had been that long from the start", () => {
    const anyRhythm: fc.Arbitrary<CourseRhythm> = fc.oneof(
      fc.record({ kind: fc.constant("interval" as const), days: fc.integer({ min: 1, max: 60 }) }),
      fc.record({
        kind: fc.constant("weekdays" as const),
        weekdays: fc.uniqueArray(fc.integer({ min: 1, max: 7 }), { minLength: 1 }),
      }),
    );
    const anyLength = fc.integer({ min: 1, max: 30 });
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 700 }), anyRhythm, anyLength, anyLength, (n, rhythm, a, b) => {
        const first = addDays("2026-01-01", n);
        const whole = courseDays(first, a + b, rhythm);
        const start = courseDays(first, a, rhythm);
        const last = start.at(-1) ?? first;
        expect([...start, ...courseDays(dayAfterCourse(last, rhythm), b, rhythm)]).toEqual(whole);
      }),
      { numRuns: 200 },
    );
  });

  it.each([0, 61, 1.5])("refuses %s visits", (visits) => {
    expect(() => courseDays("2026-12-01", visits, weekly)).toThrow(RangeError);
  });

  it.each([
    { kind: "interval", days: 0 },
    { kind: "weekdays", weekdays: [] },
    { kind: "weekdays", weekdays: [8] },
  ] as const)("refuses the rhythm %j", (rhythm) => {
    expect(() => courseDays("2026-12-01", 3, rhythm)).toThrow(RangeError);
  });
});
