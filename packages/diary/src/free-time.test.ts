import { addDays, instantAt, timeOf, weekdayOf } from "@withy/core/zoned-time";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Busy } from "./availability";
import type { Nation } from "./bank-holidays";
import { closedDays } from "./closed-days";
import { freeTime, openSite, possibleStarts, roomTime, travelBy } from "./free-time";
import { totalMinutes } from "./interval";
import { roomSuits } from "./room-suits";
import type { WorkingPattern } from "./working-pattern";

const zone = "Europe/London";
const minute = 60_000;

/** Bank holidays as published for the days tried here, typed in by hand. */
const published: Record<"england" | "scotland", readonly string[]> = {
  england: ["2026-04-03", "2026-04-06", "2026-12-25", "2026-12-28", "2027-03-26", "2027-03-29"],
  scotland: ["2026-04-03", "2026-06-15", "2026-11-30", "2026-12-25", "2026-12-28", "2027-03-26"],
};

type Case = ReturnType<typeof caseFor> extends fc.Arbitrary<infer C> ? C : never;

const time = fc
  .oneof(fc.integer({ min: 0, max: 40 }), fc.integer({ min: 0, max: 287 }))
  .map((n) => `${String(Math.floor(n / 12)).padStart(2, "0")}:${String((n % 12) * 5).padStart(2, "0")}`);
const range = fc
  .tuple(time, time)
  .filter(([a, b]) => a !== b)
  .map((ends) => [...ends].sort())
  .map(([startsAt = "", endsAt = ""]) => ({ startsAt, endsAt }));
const week = fc.constantFrom(-21, -14, -7, -1, 0, 1);
const patternFor = (firstDay: string): fc.Arbitrary<WorkingPattern> =>
  fc
    .record({
      hours: range,
      offset: fc.integer({ min: 0, max: 1 }),
      begins: week,
      ends: fc.option(fc.integer({ min: -1, max: 2 })),
      everyWeeks: fc.constantFrom(1, 1, 2, 3),
      breaks: fc.array(range, { maxLength: 2 }),
      siteId: fc.constantFrom("saltgate", "saltgate", "tollhouse"),
    })
    .map(({ hours, offset, begins, ends, everyWeeks, breaks, siteId }) => ({
      ...{ staffMemberId: "nia", siteId, everyWeeks, breaks, ...hours },
      weekday: weekdayOf(addDays(firstDay, offset)),
      validFrom: addDays(firstDay, begins),
      validUntil: ends === null ? null : addDays(firstDay, ends),
    }));

const caseFor = (firstDay: string) =>
  fc.record({
    firstDay: fc.constant(firstDay),
    nation: fc.constantFrom("england", "scotland"),
    opens: fc.constantFrom("00:00", "00:30", "01:30", "08:00"),
    closes: fc.constantFrom("02:30", "12:00", "19:00", "24:00"),
    closure: fc.option(fc.integer({ min: 0, max: 1 }), { freq: 4 }),
    patterns: fc.array(patternFor(firstDay), { minLength: 1, maxLength: 4 }),
    busy: fc.array(
      fc.record({
        at: fc.integer({ min: -12, max: 580 }).map((n) => n * 5),
        minutes: fc.integer({ min: 1, max: 24 }).map((n) => n * 5),
        siteId: fc.constantFrom("saltgate", "tollhouse", null),
      }),
      { maxLength: 5 },
    ),
    there: fc.integer({ min: 0, max: 40 }),
    back: fc.integer({ min: 0, max: 40 }),
    gives: fc.constant(true),
    cleanDown: fc.constantFrom(0, 5, 10),
    rooms: fc.array(
      fc.record({
        kind: fc.constantFrom("treatment", "gym"),
        equipment: fc.subarray(["bars", "traction"]),
        isStepFree: fc.boolean(),
        taken: fc.array(
          fc.tuple(
            fc.integer({ min: 0, max: 560 }).map((n) => n * 5),
            fc.integer({ min: 1, max: 60 }).map((n) => n * 5),
          ),
          { maxLength: 3 },
        ),
      }),
      { maxLength: 3 },
    ),
  });

/** Every minute of the two days with the day and the clock time that stands on the wall. */
function wallMap(firstDay: string): { at: number; day: string; wall: string }[] {
  const start = instantAt(firstDay, "00:00", zone)?.getTime() ?? 0;
  const end = instantAt(addDays(firstDay, 2), "00:00", zone)?.getTime() ?? 0;
  const middle = instantAt(addDays(firstDay, 1), "00:00", zone)?.getTime() ?? 0;
  const map = [];
  for (let at = start; at < end; at += minute)
    map.push({ at, day: at < middle ? firstDay : addDays(firstDay, 1), wall: timeOf(new Date(at), zone) });
  return map;
}

/** The Monday of a day's week, found by walking back. */
function monday(day: string): string {
  let at = day;
  while (new Date(`${at}T12:00:00Z`).getUTCDay() !== 1) at = addDays(at, -1);
  return at;
}

function isWorked(p: WorkingPattern, day: string): boolean {
  if ((new Date(`${day}T12:00:00Z`).getUTCDay() || 7) !== p.weekday) return false;
  if (day < p.validFrom || (p.validUntil !== null && day > p.validUntil)) return false;
  let weeks = 0;
  for (let at = monday(p.validFrom); at < monday(day); at = addDays(at, 7)) weeks += 1;
  return weeks % p.everyWeeks === 0;
}

/** Whether each minute is free, looked at one by one with none of the rule's arithmetic. */
function bruteForce(c: Case, map: ReturnType<typeof wallMap>): Set<number> {
  const days = [c.firstDay, addDays(c.firstDay, 1)];
  // The first minute of the day that shows the time or later; the next midnight where none does.
  const first = (day: string, wall: string): number =>
    map.find((m) => m.day === day && m.wall >= wall)?.at ??
    (map.filter((m) => m.day === day).at(-1)?.at ?? 0) + minute;
  const spans = (list: readonly { startsAt: string; endsAt: string }[], day: string) =>
    list.map((r) => [first(day, r.startsAt), first(day, r.endsAt)] as const);
  const paint = new Map<number, "worked" | "break">();
  for (const day of days) {
    if (published[c.nation].includes(day) || (c.closure !== null && day === days[c.closure])) continue;
    const [opens, closes] = [first(day, c.opens), first(day, c.closes)];
    const here = c.patterns.filter((p) => p.siteId === "saltgate" && isWorked(p, day));
    for (const { at } of map) {
      if (at < opens || at >= closes) continue;
      for (const [from, to] of spans(here, day)) if (at >= from && at < to) paint.set(at, "worked");
    }
  }
  for (const day of days)
    for (const p of c.patterns.filter((x) => x.siteId === "saltgate" && isWorked(x, day)))
      for (const [from, to] of spans(p.breaks, day))
        for (let at = from; at < to; at += minute) paint.set(at, "break");
  const open = new Set([...paint].filter(([, what]) => what === "worked").map(([at]) => at));
  // Cleaning may follow the last worked minute of a stretch, up to the next stretch.
  const cleaning: number[] = [];
  for (const at of open)
    if (!open.has(at + minute))
      for (let n = 1; n <= c.cleanDown && !open.has(at + n * minute); n += 1) cleaning.push(at + n * minute);
  for (const at of cleaning) open.add(at);
  const start = map[0]?.at ?? 0;
  for (const b of c.busy) {
    const away = b.siteId === "tollhouse";
    const from = start + (b.at - (away ? c.there : 0)) * minute;
    const to = start + (b.at + b.minutes + (away ? c.back : 0)) * minute;
    for (let at = from; at < to; at += minute) open.delete(at);
  }
  const end = (map.at(-1)?.at ?? 0) + minute;
  return new Set([...open].filter((at) => at >= start && at < end));
}

function ask(c: Case, gives: boolean = c.gives) {
  const from = instantAt(c.firstDay, "00:00", zone) ?? new Date(0);
  const to = instantAt(addDays(c.firstDay, 2), "00:00", zone) ?? new Date(0);
  const second = addDays(c.firstDay, 1);
  const closures = c.closure === null ? [] : [{ on: addDays(c.firstDay, c.closure), reason: "Repairs" }];
  const weekdays = [1, 2, 3, 4, 5, 6, 7];
  const site = openSite(
    {
      siteId: "saltgate",
      hours: weekdays.map((weekday) => ({ weekday, opensAt: c.opens, closesAt: c.closes })),
      closedOn: new Set(closedDays(c.nation as Nation, closures, c.firstDay, second).keys()),
    },
    zone,
    from,
    to,
  );
  const busy: Busy[] = c.busy.map((b) => ({
    from: from.getTime() + b.at * minute,
    to: from.getTime() + (b.at + b.minutes) * minute,
    ...(b.siteId === null ? {} : { siteId: b.siteId }),
  }));
  const travel = travelBy([
    { fromSiteId: "saltgate", toSiteId: "tollhouse", minutes: c.there },
    { fromSiteId: "tollhouse", toSiteId: "saltgate", minutes: c.back },
  ]);
  const who = { patterns: c.patterns, busy, givesService: gives, cleanDownMinutes: c.cleanDown };
  return { from, to, free: freeTime(site, who, travel, from, to) };
}

const changeDays = ["2026-03-28", "2026-03-29", "2026-10-24", "2026-10-25"];
const nextChangeDays = ["2027-03-27", "2027-03-28", "2027-10-30", "2027-10-31"];
const holidays = ["2026-04-05", "2026-06-14", "2026-11-30", "2026-12-27", "2027-03-28"];

describe("free time against a map of every minute", () => {
  it.each([...changeDays, ...nextChangeDays, ...holidays, "2026-12-01"])("from %s", (firstDay) => {
    const map = wallMap(firstDay);
    fc.assert(
      fc.property(caseFor(firstDay), (c) => {
        const expected = bruteForce(c, map);
        const { free } = ask(c);
        expect(totalMinutes(free)).toBe(expected.size);
        for (const i of free)
          for (let at = i.from; at < i.to; at += minute) expect(expected.has(at)).toBe(true);
      }),
      { numRuns: 40 },
    );
  });

  it("starts a visit only where therapist and one suitable room are free throughout", () => {
    const needs = { kind: "treatment", equipment: ["bars"], isStepFree: true };
    for (const firstDay of ["2026-12-01", "2026-10-24", "2027-03-27"]) {
      const map = wallMap(firstDay);
      fc.assert(
        fc.property(caseFor(firstDay), fc.constantFrom(15, 30, 45), (c, minutes) => {
          const { free, from, to } = ask(c);
          const start = from.getTime();
          const need = (minutes + c.cleanDown) * minute;
          const suitable = c.rooms.filter((r) => roomSuits(r, needs));
          const taken = suitable.map((r) =>
            r.taken.map(([at, n]) => ({ from: start + at * minute, to: start + (at + n) * minute })),
          );
          const starts = possibleStarts(
            free,
            taken.map((t) => roomTime(t, from, to)),
            need,
          );
          const byMinute = bruteForce(c, map);
          const fits = (at: number): boolean => {
            for (let m = at; m < at + need; m += minute) if (!byMinute.has(m)) return false;
            return c.rooms.some((r) => {
              const isRight = r.kind === "treatment" && r.equipment.includes("bars") && r.isStepFree;
              const last = at + need - start;
              return (
                isRight && r.taken.every(([a, n]) => last <= a * minute || at - start >= (a + n) * minute)
              );
            });
          };
          for (const { at } of map)
            expect(starts.some((i) => i.from <= at && at < i.to)).toBe(at + need <= to.getTime() && fits(at));
        }),
        { numRuns: 25 },
      );
    }
  });

  it("has none for a service that the therapist does not give", () => {
    fc.assert(fc.property(caseFor("2026-12-01"), (c) => ask(c, false).free.length === 0));
  });
});
