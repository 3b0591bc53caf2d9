import fc from "fast-check";
import { Temporal } from "temporal-polyfill";
import { describe, expect, it } from "vitest";
import { addDays } from "./plain-date";
import { addMinutes, dayBounds, instantAt, minutesBetween } from "./zoned-time";

const london = "Europe/London";
// Clock changes from the tz database, release 2025c: all at 01:00 UTC.
const changes = [
  { day: "2026-03-29", hours: 23, moved: "forward" },
  { day: "2026-10-25", hours: 25, moved: "back" },
  { day: "2027-03-28", hours: 23, moved: "forward" },
  { day: "2027-10-31", hours: 25, moved: "back" },
] as const;
const minuteMs = 60_000;

/** The wall clock of every minute around a day, read off by Temporal from the instant: the way not taken here. */
function wallMinutes(day: string, zone: string): Map<string, number[]> {
  const noon = Date.parse(`${day}T12:00:00Z`);
  const seen = new Map<string, number[]>();
  for (let at = noon - 36 * 60 * minuteMs; at < noon + 36 * 60 * minuteMs; at += minuteMs) {
    const there = Temporal.Instant.fromEpochMilliseconds(at).toZonedDateTimeISO(zone);
    const wall = there.toPlainDateTime().toString({ smallestUnit: "minute" });
    seen.set(wall, [...(seen.get(wall) ?? []), at]);
  }
  return seen;
}

const allDay = Array.from({ length: 1440 }, (_, n) =>
  Temporal.PlainTime.from("00:00").add({ minutes: n }).toString({ smallestUnit: "minute" }),
);

describe.each(changes)("$day, when the clocks go $moved", ({ day, hours, moved }) => {
  const seen = wallMinutes(day, london);
  const instantsOf = (time: string) => seen.get(`${day}T${time}`) ?? [];

  it("every minute on the clock is its first instant, or none", () => {
    const given = allDay.map((time) => instantAt(day, time, london)?.getTime() ?? null);
    expect(given).toEqual(allDay.map((time) => instantsOf(time).at(0) ?? null));
  });

  it("the hour from one o'clock is the odd one, and no other", () => {
    const odd = allDay.filter((time) => instantsOf(time).length === (moved === "back" ? 2 : 0));
    expect(odd).toHaveLength(60);
    expect([odd.at(0), odd.at(-1)]).toEqual(["01:00", "01:59"]);
    const given = odd.map((time) => instantAt(day, time, london));
    // Summer time goes on in the first of the two hours.
    const first = odd.map((_, n) => new Date(Date.parse(`${day}T00:00:00Z`) + n * minuteMs));
    expect(given).toEqual(moved === "back" ? first : odd.map(() => null));
  });

  it("the day runs from midnight to midnight and is as long as it is", () => {
    const { from, to } = dayBounds(day, london);
    expect((to.getTime() - from.getTime()) / (60 * minuteMs)).toBe(hours);
    expect(seen.get(`${day}T00:00`)).toEqual([from.getTime()]);
    expect(seen.get(`${addDays(day, 1)}T00:00`)).toEqual([to.getTime()]);
  });
});

describe("other days and places", () => {
  const days = fc.integer({ min: 0, max: 730 }).map((n) => addDays("2026-01-01", n));
  const zones = fc.constantFrom(
    london,
    "America/New_York",
    "Asia/Kathmandu",
    "Pacific/Chatham",
    "Asia/Beirut",
  );

  it("a time that exists is read off the clock again", () => {
    fc.assert(
      fc.property(days, fc.constantFrom(...allDay), zones, (day, time, zone) => {
        const at = instantAt(day, time, zone);
        fc.pre(at !== null);
        const there = Temporal.Instant.fromEpochMilliseconds(at.getTime()).toZonedDateTimeISO(zone);
        expect(there.toPlainDateTime().toString({ smallestUnit: "minute" })).toBe(`${day}T${time}`);
      }),
    );
  });

  it("days follow one another without a gap", () => {
    fc.assert(
      fc.property(days, zones, (day, zone) => {
        expect(dayBounds(day, zone).to).toEqual(dayBounds(addDays(day, 1), zone).from);
      }),
    );
  });

  // In Lebanon the clocks go forward at midnight on the last Sunday of March (tz database).
  it("a day whose midnight does not exist begins at one o'clock", () => {
    expect(instantAt("2026-03-29", "00:00", "Asia/Beirut")).toBeNull();
    expect(dayBounds("2026-03-29", "Asia/Beirut").from).toEqual(
      instantAt("2026-03-29", "01:00", "Asia/Beirut"),
    );
  });

  it("says what is wrong with what is no day, no time or no zone", () => {
    expect(() => instantAt("2026-02-30", "09:00", london)).toThrow(RangeError);
    expect(() => instantAt("2026-02-28", "24:30", london)).toThrow(RangeError);
    expect(() => dayBounds("2026-02-28", "Europe/Nowhere")).toThrow(RangeError);
  });
});

describe("minutes", () => {
  it("pass as they do on a watch, whatever the clock on the wall shows", () => {
    const before = instantAt("2026-10-25", "00:30", london) ?? new Date(Number.NaN);
    const after = instantAt("2026-10-25", "02:30", london) ?? new Date(Number.NaN);
    expect(minutesBetween(before, after)).toBe(180);
    expect(addMinutes(before, 180)).toEqual(after);
  });

  it("added and counted agree", () => {
    const instants = fc.date({
      min: new Date("2000-01-01T00:00:00Z"),
      max: new Date("2100-01-01T00:00:00Z"),
      noInvalidDate: true,
    });
    fc.assert(
      fc.property(instants, fc.integer({ min: -100_000, max: 100_000 }), (at, minutes) => {
        expect(minutesBetween(at, addMinutes(at, minutes)) - minutes).toBe(0);
      }),
    );
  });
});
