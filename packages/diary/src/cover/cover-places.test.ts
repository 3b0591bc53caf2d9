import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Interval, overlaps, union } from "../interval";
import { coverPlaces, placeFits } from "./cover-places";
import type { CoverProblem, CoverVisit } from "./cover-problem";

const minute = 60_000;
const at = (time: string, day = "2026-12-08"): number => Date.parse(`${day}T${time}:00Z`);
const span = (from: string, to: string, day?: string): Interval => ({ from: at(from, day), to: at(to, day) });

const visit: CoverVisit = {
  id: "v",
  patientIds: ["p"],
  startsAt: at("10:00"),
  durationMinutes: 30,
  cleanDownMinutes: 5,
  siteId: "a",
  therapistId: "away",
  roomId: "r1",
  therapistIds: ["away", "one"],
  roomKind: "treatment",
  needsEquipment: [],
  seenBy: [],
  isInCourse: false,
};

const room = (id: string, more: object = {}) => ({
  ...{
    id,
    siteId: "a",
    kind: "treatment",
    equipment: [] as string[],
    free: [{ from: 0, to: at("23:00", "2027-01-01") }],
  },
  ...more,
});

function problemOf(more: Partial<CoverProblem> = {}): CoverProblem {
  return {
    now: at("08:00"),
    noticeMinutes: 60,
    daysAfter: 2,
    visits: [visit],
    sites: [{ id: "a", zone: "Europe/London" }],
    lanes: [{ therapistId: "one", siteId: "a", working: [span("09:00", "12:00")], taken: [] }],
    rooms: [room("r1")],
    patientBusy: new Map(),
    ...more,
  };
}

describe("places for a visit", () => {
  test("start with its own time, then the nearest", () => {
    const { places } = coverPlaces(problemOf(), visit, 80);
    expect(places.slice(0, 3).map((p) => [p.startsAt - visit.startsAt, p.cost])).toEqual([
      [0, 40],
      [-15 * minute, 43],
      [15 * minute, 43],
    ]);
    // The last treatment ends with the working day; cleaning may run over.
    expect(Math.max(...places.map((p) => p.startsAt))).toBe(at("11:30"));
  });

  test("keep the clock time of the site on a day after the clocks change", () => {
    const autumn = { ...visit, startsAt: at("09:00", "2026-10-24") };
    const working = [span("10:00", "12:00", "2026-10-25")];
    const problem = problemOf({ now: 0, lanes: [{ therapistId: "one", siteId: "a", working, taken: [] }] });
    // Ten by the clock on Saturday is 9:00Z; on Sunday it is 10:00Z.
    expect(coverPlaces(problem, autumn, 5).places[0]).toMatchObject({
      startsAt: at("10:00", "2026-10-25"),
      cost: 100,
      reasons: ["the day after, same time", "a new therapist"],
    });
  });

  test("give an hour's notice of a new time, but none is needed for the old one", () => {
    const { places } = coverPlaces(problemOf({ now: at("09:50") }), visit, 80);
    expect(places.map((p) => p.startsAt)).toEqual([
      at("10:00"),
      ...places.slice(1).map((p) => Math.max(p.startsAt, at("10:50"))),
    ]);
  });

  test.each<[string, Partial<CoverProblem>, Partial<CoverVisit>, string]>([
    ["nobody gives it", {}, { therapistIds: ["other"] }, "Nobody who gives this service works"],
    ["no room of the kind", {}, { roomKind: "gym" }, "No site within reach has a room"],
    ["nothing long enough", {}, { durationMinutes: 200 }, "has 200 minutes free within 2 days"],
    [
      "equipment that no room has",
      {},
      { needsEquipment: ["parallel-bars"] },
      "No site within reach has a room",
    ],
    ["rooms all taken", { rooms: [room("r1", { free: [] })] }, {}, "Whenever a therapist is free"],
    [
      "the patient elsewhere",
      { patientBusy: new Map([["p", [span("08:00", "13:00")]]]) },
      {},
      "no other visit",
    ],
  ])("say why there is none: %s", (_name, more, who, words) => {
    const found = coverPlaces(problemOf(more), { ...visit, ...who }, 80);
    expect(found.places).toEqual([]);
    expect(found.problem).toContain(words);
  });

  test("never lie over anything that stands, whatever stands, and are the cheapest", () => {
    const gaps = fc
      .array(fc.tuple(fc.integer({ min: 0, max: 60 }), fc.integer({ min: 1, max: 12 })), { maxLength: 6 })
      .map((list) =>
        union(
          list.map(([n, len]) => ({
            from: at("08:00") + n * 5 * minute,
            to: at("08:00") + (n + len) * 5 * minute,
          })),
        ),
      );
    fc.assert(
      fc.property(gaps, gaps, gaps, fc.integer({ min: 1, max: 30 }), (taken, closed, busy, most) => {
        const whole = { from: at("00:00"), to: at("23:00", "2026-12-12") };
        const free = [whole.from, ...closed.flatMap((c) => [c.from, c.to]), whole.to];
        const roomFree = Array.from({ length: free.length / 2 }, (_, n) => ({
          from: free[2 * n] ?? 0,
          to: free[2 * n + 1] ?? 0,
        }));
        const problem = problemOf({
          lanes: [{ therapistId: "one", siteId: "a", working: [span("09:00", "12:00")], taken }],
          rooms: [room("r1", { free: roomFree })],
          patientBusy: new Map([["p", busy]]),
        });
        const all = coverPlaces(problem, visit, 1000);
        for (const place of all.places) {
          const whole = { from: place.startsAt, to: place.startsAt + 35 * minute };
          const treated = { from: place.startsAt, to: place.startsAt + 30 * minute };
          expect([...taken, ...closed].some((t) => overlaps(t, whole))).toBe(false);
          expect(busy.some((t) => overlaps(t, treated))).toBe(false);
          expect(treated.from >= at("09:00") && treated.to <= at("12:00")).toBe(true);
          expect(placeFits(problem, visit, place)).toBe(true);
        }
        const some = coverPlaces(problem, visit, most);
        expect(some.places.map((p) => p.cost)).toEqual(all.places.slice(0, most).map((p) => p.cost));
        expect(all.places.length === 0).toBe(all.problem !== null);
      }),
    );
  });
});
