import { timeOf } from "@withy/core/zoned-time";
import fc from "fast-check";
import { Temporal } from "temporal-polyfill";
import { describe, expect, it } from "vitest";
import {
  type Busy,
  freeIntervals,
  openIntervals,
  type SiteOpening,
  within,
  workingIntervals,
} from "./availability";
import { type DayClock, dayClock, dayClocks } from "./day-clock";
import { totalMinutes } from "./interval";
import type { WorkingPattern } from "./working-pattern";

const zone = "Europe/London";
const openAlways: SiteOpening = {
  siteId: "saltgate",
  hours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, opensAt: "00:00", closesAt: "24:00" })),
  closedOn: new Set(),
};
const pattern = (p: Partial<WorkingPattern>): WorkingPattern => ({
  staffMemberId: "nia",
  siteId: "saltgate",
  weekday: 2,
  startsAt: "08:00",
  endsAt: "18:00",
  validFrom: "2026-01-01",
  validUntil: null,
  everyWeeks: 1,
  breaks: [],
  ...p,
});
const daysFrom = (from: string, to: string): DayClock[] => dayClocks(new Date(from), new Date(to), zone);
const words = (set: readonly { from: number; to: number }[]): string[] =>
  set.map(
    (i) => `${new Date(i.from).toISOString().slice(0, 16)}/${new Date(i.to).toISOString().slice(0, 16)}`,
  );

describe("working time", () => {
  it("keeps the clock's hours in summer and in winter", () => {
    const days = daysFrom("2026-10-19T23:00Z", "2026-10-28T00:00Z");
    const worked = workingIntervals("saltgate", [pattern({})], openIntervals(openAlways, days), days);
    expect(words(worked)).toEqual(["2026-10-20T07:00/2026-10-20T17:00", "2026-10-27T08:00/2026-10-27T18:00"]);
  });

  it.each([
    [
      "first week only",
      { everyWeeks: 2, validFrom: "2026-12-01" },
      ["2026-12-01", "2026-12-15", "2026-12-29"],
    ],
    [
      "counts from the week it begins in",
      { everyWeeks: 2, validFrom: "2026-12-04" },
      ["2026-12-15", "2026-12-29"],
    ],
    ["every third", { everyWeeks: 3, validFrom: "2026-11-17" }, ["2026-12-08", "2026-12-29"]],
    ["ends on its last day", { validUntil: "2026-12-08" }, ["2026-12-01", "2026-12-08"]],
    ["begins on its first day", { validFrom: "2026-12-22" }, ["2026-12-22", "2026-12-29"]],
  ])("alternate weeks and dates: %s", (_name, change, expected) => {
    const days = daysFrom("2026-12-01T00:00Z", "2027-01-01T00:00Z");
    const worked = workingIntervals("saltgate", [pattern(change)], openIntervals(openAlways, days), days);
    expect(worked.map((i) => new Date(i.from).toISOString().slice(0, 10))).toEqual(expected);
  });

  it("stays inside opening hours, outside breaks, closed days and other sites' patterns", () => {
    const site: SiteOpening = {
      siteId: "saltgate",
      hours: [{ weekday: 2, opensAt: "09:00", closesAt: "17:00" }],
      closedOn: new Set(["2026-12-08"]),
    };
    const days = daysFrom("2026-12-01T00:00Z", "2026-12-10T00:00Z");
    const patterns = [
      pattern({ breaks: [{ startsAt: "12:30", endsAt: "13:15" }] }),
      pattern({ weekday: 3 }),
      pattern({ siteId: "tollhouse", startsAt: "06:00" }),
    ];
    const worked = workingIntervals("saltgate", patterns, openIntervals(site, days), days);
    expect(words(worked)).toEqual(["2026-12-01T09:00/2026-12-01T12:30", "2026-12-01T13:15/2026-12-01T17:00"]);
  });

  it("takes off what is taken, with the way to another site", () => {
    const at = (t: string): number => Date.parse(`2026-12-01T${t}:00Z`);
    const working = [{ from: at("08:00"), to: at("18:00") }];
    const busy: Busy[] = [
      { from: at("09:00"), to: at("10:00"), siteId: "saltgate" },
      { from: at("13:00"), to: at("14:00"), siteId: "tollhouse" },
      { from: at("17:00"), to: at("23:00") },
    ];
    const travel = (from: string): number => (from === "saltgate" ? 20 : 25);
    expect(words(freeIntervals("saltgate", working, busy, travel))).toEqual([
      "2026-12-01T08:00/2026-12-01T09:00",
      "2026-12-01T10:00/2026-12-01T12:40",
      "2026-12-01T14:25/2026-12-01T17:00",
    ]);
    expect(words(within(working, new Date(at("17:30")), new Date(at("20:00"))))).toEqual([
      "2026-12-01T17:30/2026-12-01T18:00",
    ]);
  });
});

/** What the zone's own clock shows at every minute of the day. */
function wallMap(day: string): Map<number, string> {
  const start = Temporal.PlainDate.from(day).toZonedDateTime(zone).epochMilliseconds;
  const end = Temporal.PlainDate.from(day).add({ days: 1 }).toZonedDateTime(zone).epochMilliseconds;
  const walls = new Map<number, string>();
  for (let m = start; m < end; m += 60_000) walls.set(m, timeOf(new Date(m), zone));
  return walls;
}

/** Walks every minute; shares no code with the rule under test. */
function bruteForce(
  walls: Map<number, string>,
  p: WorkingPattern,
  opens: [string, string],
  busy: readonly Busy[],
): number[] {
  const first = (time: string): number => {
    for (const [m, wall] of walls) if (wall >= time) return m;
    return Number.POSITIVE_INFINITY;
  };
  const span = (a: string, b: string): { from: number; to: number } => ({ from: first(a), to: first(b) });
  const inside = (m: number, s: { from: number; to: number }): boolean => m >= s.from && m < s.to;
  const [work, open] = [span(p.startsAt, p.endsAt), span(opens[0], opens[1])];
  const away = [...p.breaks.map((b) => span(b.startsAt, b.endsAt)), ...busy];
  return [...walls.keys()].filter(
    (m) => inside(m, work) && inside(m, open) && !away.some((s) => inside(m, s)),
  );
}

describe("free time against a map of every minute", () => {
  const time = fc
    .integer({ min: 0, max: 287 })
    .map((n) => `${String(Math.floor(n / 12)).padStart(2, "0")}:${String((n % 12) * 5).padStart(2, "0")}`);
  const range = fc
    .tuple(time, time)
    .map(([a, b]) => (a < b ? { startsAt: a, endsAt: b } : { startsAt: b, endsAt: a }));
  // Half of the ranges lie in the small hours, where the clocks change.
  const night = fc
    .tuple(fc.integer({ min: 0, max: 48 }), fc.integer({ min: 0, max: 48 }))
    .map(([a, b]) =>
      [Math.min(a, b), Math.max(a, b)].map(
        (n) => `0${Math.floor(n / 12)}:${String((n % 12) * 5).padStart(2, "0")}`,
      ),
    )
    .map(([a = "00:00", b = "00:00"]) => ({ startsAt: a, endsAt: b }));
  const either = fc.oneof(range, night);
  const taken = fc.array(fc.tuple(fc.integer({ min: -12, max: 300 }), fc.integer({ min: 1, max: 30 })), {
    maxLength: 5,
  });

  it.each(["2026-03-29", "2026-10-25", "2027-03-28", "2027-10-31", "2026-12-01"])("on %s", (day) => {
    const clock = dayClock(day, zone);
    const walls = wallMap(day);
    fc.assert(
      fc.property(
        either,
        either,
        fc.array(either, { maxLength: 2 }),
        taken,
        (work, opening, breaks, gone) => {
          const p = pattern({ ...work, weekday: clock.weekday, breaks });
          const busy = gone.map(([at, n]) => ({
            from: clock.startsAt + at * 300_000,
            to: clock.startsAt + (at + n) * 300_000,
          }));
          const site: SiteOpening = {
            siteId: "saltgate",
            hours: [{ weekday: clock.weekday, opensAt: opening.startsAt, closesAt: opening.endsAt }],
            closedOn: new Set(),
          };
          const working = workingIntervals("saltgate", [p], openIntervals(site, [clock]), [clock]);
          const free = freeIntervals("saltgate", working, busy);
          const expected = bruteForce(walls, p, [opening.startsAt, opening.endsAt], busy);
          expect(expected.every((m) => free.some((i) => i.from <= m && m < i.to))).toBe(true);
          expect(totalMinutes(free)).toBe(expected.length);
        },
      ),
      { numRuns: 200 },
    );
  });
});

describe("a day's clock", () => {
  it.each([
    ["2026-03-29", 23],
    ["2026-10-25", 25],
    ["2027-03-28", 23],
    ["2027-10-31", 25],
    ["2026-12-01", 24],
  ])("%s has %i hours", (day, hours) => {
    const clock = dayClock(day, zone);
    expect((clock.endsAt - clock.startsAt) / 3_600_000).toBe(hours);
  });

  it.each(["Europe/London", "America/New_York", "Australia/Lord_Howe", "Asia/Beirut", "Pacific/Apia"])(
    "reads the clock as the zone does in %s",
    (name) => {
      for (const clock of dayClocks(new Date("2026-01-01T00:00Z"), new Date("2026-12-31T00:00Z"), name))
        for (let m = clock.startsAt; m < clock.endsAt; m += 30 * 60_000) {
          const wall = clock.wallOf(m);
          const text = `${String(Math.floor(wall / 60)).padStart(2, "0")}:${String(wall % 60).padStart(2, "0")}`;
          if (m === clock.startsAt || wall % 360 === 0) expect(text).toBe(timeOf(new Date(m), name));
          expect(clock.instantOf(wall)).toBeLessThanOrEqual(m);
        }
    },
  );
});
