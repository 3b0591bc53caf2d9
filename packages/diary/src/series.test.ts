import { timeOf } from "@withy/core/zoned-time";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { seriesOf } from "./series";

const zone = "Europe/London";

describe("a course of weekly visits", () => {
  it("keeps the clock time through both changes of a year", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 287 }), fc.integer({ min: 1, max: 4 }), (slot, everyWeeks) => {
        const time = `${String(Math.floor(slot / 12)).padStart(2, "0")}:${String((slot % 12) * 5).padStart(2, "0")}`;
        // Wednesdays: the clocks change on Sundays, so every visit happens.
        for (const v of seriesOf({ firstDay: "2026-01-07", time, zone, visits: 52, everyWeeks }))
          expect("startsAt" in v && timeOf(v.startsAt, zone)).toBe(time);
      }),
      { numRuns: 30 },
    );
  });

  it("says which visit falls into the hour that does not happen", () => {
    const visits = seriesOf({ firstDay: "2027-03-21", time: "01:30", zone, visits: 3, everyWeeks: 1 });
    expect(visits.map((v) => ("refusal" in v ? v.refusal.kind : v.startsAt.toISOString()))).toEqual([
      "2027-03-21T01:30:00.000Z",
      "clock-gap",
      "2027-04-04T00:30:00.000Z",
    ]);
  });

  it.each([0, 53, 1.5])("refuses %s visits", (visits) => {
    expect(() => seriesOf({ firstDay: "2026-12-01", time: "09:00", zone, visits, everyWeeks: 1 })).toThrow(
      RangeError,
    );
  });
});
